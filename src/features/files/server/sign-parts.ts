import { Invalid } from '../../../server/errors.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { verb } from '../../../server/verb.ts';
import { partCountFor, partLength } from '../file.ts';
import { type FileAddress, loadUpload } from './load-file.ts';

/**
 * Addresses for a browser to PUT parts to, each for exactly as many bytes as that part has.
 * @throws NotFound when the upload is over; Invalid for a part that the file does not have
 */
export const signParts = verb(
  { may: 'footage.change' },
  async (context, input: FileAddress & { numbers: readonly number[] }) => {
    const { id, bytes, uploadId } = await loadUpload(context, input);
    if (input.numbers.some((number) => number > partCountFor(bytes)))
      throw new Invalid({ numbers: 'The file has fewer parts than that.' });
    const key = incomingKey(context.workshop.id, id);
    const { uploads } = context.services.storage;
    const parts = await Promise.all(
      input.numbers.map(async (number) => ({
        number,
        url: await uploads.signPart(key, uploadId, number, partLength(bytes, number)),
      })),
    );
    return { parts };
  },
);
