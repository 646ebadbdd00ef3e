import { and, asc, eq, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { type Appearance, positionOf } from '../note.ts';

/** The parts in view of an episode that were set by hand, in its order. */
export async function loadAppearances(
  db: Database,
  workshopId: string,
  episodeId: string,
): Promise<Appearance[]> {
  const rows = await db
    .select({ appearance: appearances, anchor: anchors })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .where(
      and(
        eq(anchors.episodeId, episodeId),
        eq(appearances.workshopId, workshopId),
        isNull(appearances.deletedAt),
      ),
    )
    .orderBy(asc(anchors.frame), asc(appearances.id));
  return rows.map(({ appearance, anchor }) => ({
    id: appearance.id,
    version: appearance.version,
    partId: appearance.partId,
    position: positionOf(anchor),
  }));
}
