import { and, eq, isNull, sql } from 'drizzle-orm';
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { workshops } from '../../../db/schema/workshops.ts';
import { RefusedFile } from '../../../server/media/refused-file.ts';
import { type Services } from '../../../server/services.ts';
import { incomingKey, keyOf } from '../../../server/storage/storage.ts';

/** A file that the worker is to look at. */
export type CheckedFile = typeof files.$inferSelect & { readonly timeZone: string };

/** What has broken the worker so often is not tried again. */
const MOST_TRIES = 5;

/**
 * Looks at an uploaded file: whatever is wrong with the file itself is told to its owner and ends there; whatever
 * is wrong here is thrown, to be tried again.
 * @param look is given the file and an empty folder of its own
 */
export async function checkFile(
  services: Services,
  fileId: string,
  look: (file: CheckedFile, folder: string) => Promise<void>,
): Promise<void> {
  const file = await beginCheck(services, fileId);
  if (!file) return;
  const folder = join(services.settings.DATA_DIR, 'checking', fileId);
  try {
    // A worker that was killed has left its own behind.
    await rm(folder, { recursive: true, force: true });
    await mkdir(folder, { recursive: true, mode: 0o700 });
    if (file.checkTries > MOST_TRIES) {
      throw new RefusedFile(
        'Looking at the file broke off five times. Export it again, in another form if there is one, and send that.',
      );
    }
    await look(file, folder);
  } catch (error) {
    if (!(error instanceof RefusedFile)) throw error;
    await refuse(services, file, error.message);
  } finally {
    await rm(folder, { recursive: true, force: true });
    // Counted is what broke the worker itself; whoever comes here lives.
    await services.db.update(files).set({ checkTries: 0 }).where(eq(files.id, fileId));
  }
}

async function beginCheck({ db, storage }: Services, fileId: string): Promise<CheckedFile | null> {
  const [row] = await db
    .update(files)
    .set({ checkTries: sql`${files.checkTries} + 1` })
    .where(and(eq(files.id, fileId), eq(files.state, 'checking'), isNull(files.deletedAt)))
    .returning();
  if (!row) {
    await forgetIncoming({ db, storage }, fileId);
    return null;
  }
  const [workshop] = await db
    .select({ timeZone: workshops.timeZone })
    .from(workshops)
    .where(eq(workshops.id, row.workshopId));
  return { ...row, timeZone: workshop?.timeZone ?? 'UTC' };
}

/** Killed between accepting a file and clearing up, a job clears up when it is run again. */
async function forgetIncoming(
  { db, storage }: Pick<Services, 'db' | 'storage'>,
  fileId: string,
): Promise<void> {
  const [row] = await db
    .select({ workshopId: files.workshopId, state: files.state })
    .from(files)
    .where(eq(files.id, fileId));
  if (row?.state === 'ready' || row?.state === 'failed')
    await storage.remove(incomingKey(row.workshopId, fileId));
}

async function refuse({ db, storage }: Services, file: CheckedFile, sentence: string): Promise<void> {
  await db.transaction(async (transaction) => {
    await transaction.delete(fileVariants).where(eq(fileVariants.fileId, file.id));
    await transaction
      .update(files)
      .set({ state: 'failed', failure: sentence, progress: null, updatedAt: new Date() })
      .where(eq(files.id, file.id));
  });
  await storage.removeAll(keyOf(file.workshopId, file.id, ''));
  await storage.remove(incomingKey(file.workshopId, file.id));
}
