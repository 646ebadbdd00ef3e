import { eq } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { verb } from '../../../server/verb.ts';
import { type FileAddress, loadFile } from './load-file.ts';

/** Brings a deleted file back. @throws NotFound once it is erased */
export const restoreFile = verb({ may: 'footage.change' }, async (context, input: FileAddress) => {
  const { id } = await loadFile(context, input, { lock: true, deleted: true });
  await context.db.update(files).set({ deletedAt: null, updatedAt: context.now }).where(eq(files.id, id));
  return { id };
});
