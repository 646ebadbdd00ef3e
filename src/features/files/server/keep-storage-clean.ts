import { and, eq, isNull, lt } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { type Services } from '../../../server/services.ts';
import { INCOMING, incomingKey } from '../../../server/storage/storage.ts';
import { DELETED_DAYS, UNFINISHED_DAYS } from '../file.ts';
import { eraseDeletedFiles } from './erase-deleted-files.ts';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
/** Longer than any job waits between its tries. */
const FORGOTTEN_MS = HOUR_MS;

/**
 * Gives up uploads that nobody has finished in seven days, erases what was deleted thirty days ago, and takes up
 * files whose check was lost.
 */
export const keepStorageClean: JobHandler = async (services) => {
  const now = Date.now();
  await giveUpUploads(services, new Date(now - UNFINISHED_DAYS * DAY_MS));
  await eraseDeletedFiles(services, new Date(now - DELETED_DAYS * DAY_MS));
  await checkForgotten(services, new Date(now - FORGOTTEN_MS));
};

async function giveUpUploads({ db, storage }: Services, before: Date): Promise<void> {
  const given = await db
    .delete(files)
    .where(and(eq(files.state, 'uploading'), lt(files.createdAt, before)))
    .returning({ id: files.id, workshopId: files.workshopId, uploadId: files.uploadId });
  for (const { id, workshopId, uploadId } of given) {
    if (uploadId !== null) await storage.uploads.abort(incomingKey(workshopId, id), uploadId);
  }
  // Begun for a request that failed afterwards, or given up by a worker that was killed here.
  for (const { key, uploadId, begun } of await storage.uploads.listUnfinished(INCOMING)) {
    if (begun < before) await storage.uploads.abort(key, uploadId);
  }
}

async function checkForgotten({ db, jobs }: Services, before: Date): Promise<void> {
  await db.transaction(async (transaction) => {
    const forgotten = await transaction
      .update(files)
      .set({ updatedAt: new Date() })
      .where(and(eq(files.state, 'checking'), isNull(files.deletedAt), lt(files.updatedAt, before)))
      .returning({ id: files.id });
    for (const { id } of forgotten) await jobs.enqueue(transaction, 'upload-completed', { fileId: id });
  });
}
