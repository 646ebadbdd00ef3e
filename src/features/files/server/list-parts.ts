import { NotFound } from '../../../server/errors.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { read } from '../../../server/verb.ts';
import { partLength } from '../file.ts';
import { type FileAddress, loadUpload } from './load-file.ts';

/** The parts of an upload that are there whole. @throws NotFound when the upload is over */
export const listParts = read({ may: 'footage.change' }, async (context, input: FileAddress) => {
  const { id, bytes, uploadId } = await loadUpload(context, input);
  const parts = await context.services.storage.uploads.listParts(
    incomingKey(context.workshop.id, id),
    uploadId,
  );
  if (parts === null) throw new NotFound('This upload was given up. It');
  return { parts: parts.filter(({ number, bytes: there }) => there === partLength(bytes, number)) };
});
