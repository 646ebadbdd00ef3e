import { and, eq, isNull, type SQL } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { type Appearance } from '../note.ts';
import { type EpisodeView, inEpisodeOrder, mainPlace, sayPlaces, standsAt } from './episode-view.ts';

/**
 * Parts in view that were set by hand, in the order of the episode.
 * @param which `shownIn` or `toldIn` of the view
 */
export async function loadAppearances(
  db: Database,
  workshopId: string,
  view: EpisodeView,
  which: SQL | undefined,
): Promise<Appearance[]> {
  const rows = await db
    .select({ appearance: appearances, anchor: anchors, place: places })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .leftJoin(places, mainPlace(view))
    .where(and(which, eq(appearances.workshopId, workshopId), isNull(appearances.deletedAt)));
  const placeOf = await sayPlaces(db, view, rows);
  const loaded = rows.map(({ appearance, anchor, place }) => ({
    id: appearance.id,
    version: appearance.version,
    partId: appearance.partId,
    position: standsAt(view, anchor, place),
    place: placeOf(anchor.id),
  }));
  return inEpisodeOrder(loaded);
}
