import { and, desc, eq, inArray, isNotNull, isNull, or, type SQL, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { editions, edits, episodes } from '../../../db/schema/episodes.ts';
import { clips } from '../../../db/schema/footage.ts';
import { anchors } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { type Position } from '../../../domain/positions.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { type Place } from '../note.ts';

/** An episode as somebody sees it: through an edit, or without one by the times that were typed. */
export interface EpisodeView {
  readonly episodeId: string;
  readonly edit: { readonly id: string; readonly rate: Rate } | null;
}

/** An episode as its desk sees it: through its newest edit. */
export async function findDraftView(db: Database, episodeId: string): Promise<EpisodeView> {
  const [row] = await db
    .select({ id: edits.id, num: edits.rateNum, den: edits.rateDen })
    .from(edits)
    .where(eq(edits.episodeId, episodeId))
    .orderBy(desc(edits.number))
    .limit(1);
  return { episodeId, edit: row ? { id: row.id, rate: { num: row.num, den: row.den } } : null };
}

/** Episodes as viewers see them: through the edits of their editions on show. */
export async function findShownViews(
  db: Database,
  episodeIds: readonly string[],
): Promise<Map<string, EpisodeView>> {
  const views = new Map<string, EpisodeView>(episodeIds.map((id) => [id, { episodeId: id, edit: null }]));
  if (episodeIds.length === 0) return views;
  const rows = await db
    .select({ episodeId: edits.episodeId, id: edits.id, num: edits.rateNum, den: edits.rateDen })
    .from(editions)
    .innerJoin(edits, eq(edits.id, editions.editId))
    .where(
      and(
        inArray(editions.episodeId, [...episodeIds]),
        isNull(editions.replacedAt),
        isNull(editions.withdrawnAt),
      ),
    );
  for (const { episodeId, id, num, den } of rows)
    views.set(episodeId, { episodeId, edit: { id, rate: { num, den } } });
  return views;
}

export async function findShownView(db: Database, episodeId: string): Promise<EpisodeView> {
  const views = await findShownViews(db, [episodeId]);
  return views.get(episodeId) ?? { episodeId, edit: null };
}

/** What joins an anchor to its main place in a view. */
export function mainPlace(view: EpisodeView): SQL | undefined {
  const { edit } = view;
  if (edit === null) return sql`false`;
  return and(eq(places.anchorId, anchors.id), eq(places.editId, edit.id), eq(places.position, 0));
}

/** Of anchors joined to their main place: those that the view shows. */
export function shownIn({ episodeId, edit }: EpisodeView): SQL | undefined {
  if (edit !== null) return isNotNull(places.frame);
  return and(
    eq(anchors.episodeId, episodeId),
    or(eq(anchors.clock, 'episode'), isNotNull(anchors.typedFrame)),
  );
}

/** The same, but for what belongs to an episode that viewers do not see yet. */
export function shownToViewers(view: EpisodeView): SQL | undefined {
  const isOut = sql`exists (select 1 from ${episodes} where ${episodes.id} = ${anchors.episodeId}
    and ${episodes.state} = 'published' and ${episodes.deletedAt} is null)`;
  return and(shownIn(view), or(isNull(anchors.episodeId), eq(anchors.episodeId, view.episodeId), isOut));
}

/** Of anchors joined to their main place: those that the desk tells of, the ones not in this edit included. */
export function toldIn({ episodeId, edit }: EpisodeView): SQL | undefined {
  return edit === null ? eq(anchors.episodeId, episodeId) : isNotNull(places.anchorId);
}

/** Of anchors joined to their main place: those that may be written at the episode's desk. */
export function writtenAt({ episodeId }: EpisodeView): SQL | undefined {
  return or(eq(anchors.episodeId, episodeId), isNotNull(places.anchorId));
}

type AnchorRow = typeof anchors.$inferSelect;
type PlaceRow = typeof places.$inferSelect;

/**
 * Where an anchor stands in a view: the frames of its place, of an episode time those that were typed. What is not in
 * this edit stands at its beginning; `isInEdit` tells it apart.
 */
export function standsAt({ edit }: EpisodeView, anchor: AnchorRow, place: PlaceRow | null): Position {
  const { frame, endFrame, rateNum, rateDen } = anchor;
  if (edit !== null && anchor.clock !== 'episode')
    return { frame: place?.frame ?? 0, endFrame: place?.endFrame ?? null, rate: edit.rate };
  if (anchor.clock === 'episode' && frame !== null && rateNum !== null && rateDen !== null)
    return { frame, endFrame, rate: { num: rateNum, den: rateDen } };
  const { typedFrame, typedEndFrame, typedRateNum, typedRateDen } = anchor;
  const rate = { num: typedRateNum ?? 1000, den: typedRateDen ?? 1 };
  return { frame: typedFrame ?? 0, endFrame: typedEndFrame, rate };
}

/** In the order of the episode. */
export function inEpisodeOrder<One extends { readonly id: string; readonly position: Position }>(
  items: readonly One[],
): One[] {
  const at = ({ position: { frame, rate } }: One) => (frame * rate.den) / rate.num;
  return [...items].sort((a, b) => at(a) - at(b) || (a.id < b.id ? -1 : 1));
}

/** Of what has nothing to do with the episode any more. */
const NOT_HERE: Place = {
  status: 'lost',
  also: [],
  byPicture: false,
  toEdge: false,
  dropped: null,
  on: null,
};

/** What a desk says of the places of anchors: null without an edit. */
export async function sayPlaces(
  db: Database,
  { edit }: EpisodeView,
  rows: readonly { readonly anchor: AnchorRow; readonly place: PlaceRow | null }[],
): Promise<(anchorId: string) => Place | null> {
  if (edit === null) return () => null;
  const told = new Map(rows.map(({ anchor, place }) => [anchor.id, place]));
  const others = await db
    .select({ anchorId: places.anchorId, frame: places.frame })
    .from(places)
    .where(and(eq(places.editId, edit.id), sql`${places.position} > 0`))
    .orderBy(places.position);
  const also = new Map<string, number[]>();
  const seconds = (frame: number) => (frame * edit.rate.den) / edit.rate.num;
  for (const { anchorId, frame } of others)
    if (frame !== null) also.set(anchorId, [...(also.get(anchorId) ?? []), seconds(frame)]);
  const clipIds = [...new Set(rows.flatMap(({ place }) => place?.clipId ?? []))];
  const named =
    clipIds.length === 0
      ? []
      : await db
          .select({ id: clips.id, name: clips.name, num: clips.rateNum, den: clips.rateDen })
          .from(clips)
          .where(inArray(clips.id, clipIds));
  const clipOf = new Map(named.map((clip) => [clip.id, clip]));
  return (anchorId) => {
    const place = told.get(anchorId) ?? null;
    if (place === null) return NOT_HERE;
    const clip = clipOf.get(place.clipId ?? '');
    const at = clip && place.clipFrame !== null ? (place.clipFrame * clip.den) / clip.num : null;
    const { status, byPicture, toEdge, dropped } = place;
    return {
      status,
      also: also.get(anchorId) ?? [],
      byPicture,
      toEdge,
      dropped,
      on: clip === undefined || at === null ? null : { id: clip.id, clip: clip.name, at },
    };
  };
}
