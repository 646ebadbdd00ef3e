import { and, eq } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { keyOf } from '../../../server/storage/storage.ts';

/** Erases an original that its owner let go. */
export const eraseOriginal: JobHandler = async ({ db, storage }, ids) => {
  const fileId = ids['fileId'] ?? '';
  const [file] = await db
    .select({ workshopId: files.workshopId })
    .from(files)
    .where(and(eq(files.id, fileId), eq(files.originalKept, false)));
  if (file) await storage.remove(keyOf(file.workshopId, fileId, 'original'));
};
