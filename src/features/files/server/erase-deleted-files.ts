import { and, eq, isNotNull, lt } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { type Services } from '../../../server/services.ts';
import { incomingKey, keyOf } from '../../../server/storage/storage.ts';

/** Erases the files that were deleted before an instant, with every object kept of them; one still in use stays. */
export async function eraseDeletedFiles({ db, storage, log }: Services, before: Date): Promise<void> {
  const old = await db
    .select({ id: files.id, workshopId: files.workshopId })
    .from(files)
    .where(and(isNotNull(files.deletedAt), lt(files.deletedAt, before)));
  for (const { id, workshopId } of old) {
    try {
      // The row first: what still refers to it keeps it, objects and all.
      await db.delete(files).where(eq(files.id, id));
    } catch {
      log.info({ fileId: id }, 'A deleted file is still referred to and stays.');
      continue;
    }
    await storage.removeAll(keyOf(workshopId, id, ''));
    await storage.remove(incomingKey(workshopId, id));
  }
}
