import { and, eq, inArray, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { workshops } from '../../../db/schema/workshops.ts';

/** Held until the transaction ends: two announcements at once are added up one after the other. */
export async function lockQuota(db: Database, workshopId: string): Promise<void> {
  await db
    .select({ id: workshops.id })
    .from(workshops)
    .where(eq(workshops.id, workshopId))
    .for('no key update');
}

/** What a workshop keeps, and what it has announced and not finished, in bytes. */
export async function measureStorage(
  db: Database,
  workshopId: string,
): Promise<{ kept: number; announced: number }> {
  const [kept] = await db
    .select({ bytes: sql<string>`coalesce(sum(${fileVariants.bytes}), 0)` })
    .from(fileVariants)
    .where(eq(fileVariants.workshopId, workshopId));
  const [announced] = await db
    .select({ bytes: sql<string>`coalesce(sum(${files.bytes}), 0)` })
    .from(files)
    .where(and(eq(files.workshopId, workshopId), inArray(files.state, ['uploading', 'checking'])));
  return { kept: Number(kept?.bytes ?? 0), announced: Number(announced?.bytes ?? 0) };
}
