import { eq } from 'drizzle-orm';
import { clips } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { announceFootage } from './announce-footage.ts';
import { type StoredClip } from './load-clip.ts';

/** Sets columns of a clip as its next version, and tells that the footage has changed. */
export async function setClip(
  context: WorkshopContext,
  row: StoredClip,
  columns: Partial<typeof clips.$inferInsert>,
): Promise<{ id: string; version: number }> {
  const version = row.version + 1;
  await context.db
    .update(clips)
    .set({ ...columns, version, updatedAt: context.now })
    .where(eq(clips.id, row.id));
  await announceFootage(context, row.buildId);
  return { id: row.id, version };
}
