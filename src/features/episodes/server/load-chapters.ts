import { and, eq, isNull, type SQL } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { anchors, chapters } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import {
  type EpisodeView,
  findDraftView,
  inEpisodeOrder,
  mainPlace,
  sayPlaces,
  shownIn,
  standsAt,
  toldIn,
} from '../../notes/server/episode-view.ts';
import { type Chapter } from '../episode.ts';

/** The chapters of an episode that a view of it shows, in its order. */
export function loadChapters(db: Database, view: EpisodeView): Promise<Chapter[]> {
  return loadChaptersWhere(
    db,
    view,
    and(eq(chapters.episodeId, view.episodeId), isNull(chapters.deletedAt), shownIn(view)),
  );
}

/** The chapters of an episode's draft, with those that are not in its edit. */
export async function loadDraftChapters(db: Database, episodeId: string): Promise<Chapter[]> {
  const view = await findDraftView(db, episodeId);
  return loadChaptersWhere(
    db,
    view,
    and(eq(chapters.episodeId, episodeId), isNull(chapters.deletedAt), toldIn(view)),
  );
}

/** Chapters by any condition; deleted ones too, unless it says otherwise. */
export async function loadChaptersWhere(
  db: Database,
  view: EpisodeView,
  where: SQL | undefined,
): Promise<Chapter[]> {
  const rows = await db
    .select({ chapter: chapters, anchor: anchors, place: places })
    .from(chapters)
    .innerJoin(anchors, eq(anchors.id, chapters.anchorId))
    .leftJoin(places, mainPlace(view))
    .where(where);
  const placeOf = await sayPlaces(db, view, rows);
  const loaded = rows.map(({ chapter, anchor, place }) => ({
    id: chapter.id,
    version: chapter.version,
    title: chapter.title,
    position: standsAt(view, anchor, place),
    place: placeOf(anchor.id),
  }));
  return inEpisodeOrder(loaded);
}
