import { eq } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { verb } from '../../../server/verb.ts';
import { type FileAddress, loadUpload } from './load-file.ts';

/** Gives up an unfinished upload: what was sent of it is thrown away. @throws NotFound when it is over */
export const abandonUpload = verb({ may: 'footage.change' }, async (context, input: FileAddress) => {
  const { id, uploadId } = await loadUpload(context, input, { lock: true });
  await context.db.delete(files).where(eq(files.id, id));
  await context.services.storage.uploads.abort(incomingKey(context.workshop.id, id), uploadId);
  return { id };
});
