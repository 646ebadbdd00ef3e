import { and, eq, inArray, isNull, max, or, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { editClips, editions, edits, episodes } from '../../../db/schema/episodes.ts';
import { builds } from '../../../db/schema/builds.ts';
import { anchors } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { rateOf, type Segment } from '../../../domain/edit/edit.ts';
import { type AnchorPlaces, placeAnchors } from '../../../domain/place/place-anchors.ts';
import { type StoredPlaceStatus } from '../../../domain/place/place-statuses.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { convertEndFrame, convertFrame } from '../../../domain/time/frames.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { anchorOf, type AnchorRow, editByIds, type Footage, loadFootage } from './footage-of-edits.ts';
import { findEditBefore, findEditById, type StoredEdit } from './load-edits.ts';

/** A row of `places`, but for its tenant and its edit. */
export type PlaceRow = Omit<typeof places.$inferSelect, 'workshopId' | 'editId'>;

/** Rows written in one statement. */
const CHUNK = 2000;

/**
 * Holds the places of a build for this transaction: one at a time computes them, and whoever moves an anchor or takes
 * an edit does that under the same lock, so that none is missed. Take it before the rows that are to change.
 */
export async function lockPlaces(db: Database, buildId: string): Promise<void> {
  await db.select({ id: builds.id }).from(builds).where(eq(builds.id, buildId)).for('no key update');
}

/**
 * Computes and stores where everything that an edit can hold comes in it: the build's shop and clip times, and the
 * episode times of its episode. Replaces what was there.
 * @returns how many anchors have a place
 */
export async function placeEdit(db: Database, editId: string): Promise<number> {
  const [found] = await db
    .select({ buildId: episodes.buildId, workshopId: episodes.workshopId })
    .from(edits)
    .innerJoin(episodes, eq(episodes.id, edits.episodeId))
    .where(eq(edits.id, editId));
  if (!found) return 0;
  const { buildId, workshopId } = found;
  await lockPlaces(db, buildId);
  const stored = await findEditById(db, editId);
  if (!stored) return 0;
  const rows = await placeIn(db, stored, await loadFootage(db, buildId), await loadHeld(db, stored, buildId));
  await db.delete(places).where(eq(places.editId, editId));
  await writePlaces(db, { workshopId, editId }, rows);
  return rows.filter(({ position, frame }) => position === 0 && frame !== null).length;
}

/**
 * Computes and stores the places of some anchors of a build in every edit that a page reads: the newest of each
 * episode, and that of its edition on show. Tells the pages of what is on show.
 */
export async function placeAgain(db: Database, buildId: string, anchorIds: readonly string[]): Promise<void> {
  if (anchorIds.length === 0) return;
  await lockPlaces(db, buildId);
  const rows = await db
    .select()
    .from(anchors)
    .where(and(inArray(anchors.id, [...anchorIds]), eq(anchors.buildId, buildId)));
  const read = await listReadEdits(db, buildId, rows);
  if (read.length === 0) return;
  const footage = await loadFootage(db, buildId);
  for (const { id: editId, workshopId, episodeId, shown } of read) {
    const stored = await findEditById(db, editId);
    if (!stored) continue;
    const own = rows.filter((row) => row.clock !== 'episode' || row.episodeId === episodeId);
    const placed = await placeIn(db, stored, footage, own);
    await db.delete(places).where(and(eq(places.editId, editId), inArray(places.anchorId, [...anchorIds])));
    await writePlaces(db, { workshopId, editId }, placed);
    if (shown) await announcePageChanges(db, [`episode:${episodeId}`]);
  }
}

/** The edits of a build that pages read, in the order of their ids; with `rows`, those that may hold one of them. */
export async function listReadEdits(db: Database, buildId: string, rows?: readonly AnchorRow[]) {
  const newest = db
    .select({ number: max(edits.number) })
    .from(edits)
    .where(eq(edits.episodeId, episodes.id));
  const read = await db
    .select({
      id: edits.id,
      workshopId: edits.workshopId,
      episodeId: edits.episodeId,
      shown: sql<boolean>`${editions.id} is not null`,
    })
    .from(edits)
    .innerJoin(episodes, and(eq(episodes.id, edits.episodeId), isNull(episodes.deletedAt)))
    .leftJoin(
      editions,
      and(eq(editions.editId, edits.id), isNull(editions.replacedAt), isNull(editions.withdrawnAt)),
    )
    .where(
      and(
        eq(episodes.buildId, buildId),
        or(sql`${edits.number} = (${newest})`, sql`${editions.id} is not null`),
      ),
    )
    .orderBy(edits.id);
  if (rows === undefined || read.length === 0 || rows.some(({ clock }) => clock === 'shop')) return read;
  const ids = read.map(({ id }) => id);
  const clipIds = rows.flatMap(({ clipId }) => clipId ?? []);
  const using = await db
    .selectDistinct({ id: editClips.editId })
    .from(editClips)
    .where(and(inArray(editClips.editId, ids), inArray(editClips.clipId, clipIds)));
  const holding = await db
    .selectDistinct({ id: places.editId })
    .from(places)
    .where(
      and(
        inArray(places.editId, ids),
        inArray(
          places.anchorId,
          rows.map(({ id }) => id),
        ),
      ),
    );
  const wanted = new Set([...using, ...holding].map(({ id }) => id));
  const at = new Set(rows.map(({ episodeId }) => episodeId));
  return read.filter(({ id, episodeId }) => wanted.has(id) || at.has(episodeId));
}

/** The anchors that an edit may hold, and those that the edit before it held. */
export function loadHeld(
  db: Database,
  { episodeId, number, clipIds }: Pick<StoredEdit, 'episodeId' | 'number' | 'clipIds'>,
  buildId: string,
): Promise<AnchorRow[]> {
  const clips = [...new Set([...clipIds.values()].filter((clip) => clip !== null))];
  const before = db
    .select({ id: places.anchorId })
    .from(places)
    .innerJoin(edits, eq(edits.id, places.editId))
    .where(
      and(
        eq(edits.episodeId, episodeId),
        sql`${edits.number} = (select max(b.number) from edits b where b.episode_id = ${episodeId} and b.number < ${number})`,
      ),
    );
  return db
    .select()
    .from(anchors)
    .where(
      and(
        eq(anchors.buildId, buildId),
        or(
          eq(anchors.clock, 'shop'),
          eq(anchors.episodeId, episodeId),
          clips.length === 0 ? undefined : inArray(anchors.clipId, clips),
          inArray(anchors.id, before),
        ),
      ),
    );
}

const STATUSES: Readonly<Record<AnchorPlaces['status'], StoredPlaceStatus>> = {
  placed: 'placed',
  snapped: 'snapped',
  lost: 'lost',
  fixed: 'fixed',
  'no footage': 'no-footage',
};

/**
 * The places of anchors in an edit, as they are stored: of those that are not in it only the ones that the desk of
 * its episode tells of, which were typed there, were in the edit before, or were noted near one of its clips.
 */
export async function placeIn(
  db: Database,
  of: Pick<StoredEdit, 'episodeId' | 'number' | 'edit' | 'clipIds'>,
  footage: Footage,
  rows: readonly AnchorRow[],
): Promise<PlaceRow[]> {
  const edit = editByIds(of);
  const placed = placeAnchors(
    edit,
    footage.clips,
    rows.map((row) => anchorOf(row, footage, edit.rate)),
  );
  const used = new Set([...of.clipIds.values()].filter((id) => id !== null));
  const stored = rows.map((row, index) => rowsOf(row, placed[index], footage, { rate: edit.rate, used }));
  const absent = rows.filter((_row, index) => stored[index]?.[0]?.frame === null);
  const dropped = await findDropped(db, of, footage, absent);
  return stored.flatMap((own, index): PlaceRow[] => {
    const row = rows[index];
    if (row === undefined || own[0]?.frame !== null) return own;
    const segment = dropped.get(row.id);
    const isNear = own[0].status === 'no-footage' && own[0].clipId !== null;
    if (segment === undefined && row.episodeId !== of.episodeId && !isNear) return [];
    return own.map((one) => ({ ...one, dropped: segment ?? null }));
  });
}

function rowsOf(
  row: AnchorRow,
  found: AnchorPlaces | undefined,
  footage: Footage,
  { rate, used }: { readonly rate: Rate; readonly used: ReadonlySet<string> },
): PlaceRow[] {
  if (found === undefined) return [];
  const { status, places: at, end, toEdge, byPicture } = found;
  const base = {
    anchorId: row.id,
    position: 0,
    status: STATUSES[status],
    endFrame: null,
    byPicture,
    toEdge,
    dropped: null,
  };
  if (status === 'fixed') return [{ ...base, ...fixedAt(row, rate), clipId: null, clipFrame: null }];
  const on = (clipId: string | undefined) => {
    const moment = found.clips.find(({ id }) => id === clipId);
    const clip = moment && footage.loaded.get(moment.id);
    if (moment === undefined || clip === undefined) return { clipId: null, clipFrame: null };
    return { clipId: clip.id, clipFrame: Number(moment.at.mul(rateOf(clip.rate)).floor().valueOf()) };
  };
  if (at.length === 0) {
    const offered = found.clips.find(({ id }) => status === 'lost' || used.has(id));
    return [{ ...base, frame: null, ...on(offered?.id) }];
  }
  return at.map((place, position) => {
    const frame = Number(place.at.floor().valueOf());
    const endFrame = end === null || position > 0 ? null : Number(end.ceil().valueOf());
    return {
      ...base,
      position,
      frame,
      endFrame: endFrame === null ? null : Math.max(endFrame, frame + 1),
      ...on(place.segment.clip),
    };
  });
}

function fixedAt(row: AnchorRow, to: Rate) {
  const { frame, endFrame, rateNum, rateDen } = row;
  const from = { num: rateNum ?? 1, den: rateDen ?? 1 };
  return {
    frame: convertFrame(frame ?? 0, from, to),
    endFrame: endFrame === null ? null : convertEndFrame(endFrame, from, to),
  };
}

/** The segments that the edit before used anchors in that are not in this one, as a person reads them. */
async function findDropped(
  db: Database,
  of: Pick<StoredEdit, 'episodeId' | 'number'>,
  footage: Footage,
  absent: readonly AnchorRow[],
): Promise<Map<string, string>> {
  const dropped = new Map<string, string>();
  const before = absent.length === 0 ? null : await findEditBefore(db, of);
  if (before === null) return dropped;
  const known = await db
    .select({ id: places.anchorId, dropped: places.dropped })
    .from(places)
    .where(and(eq(places.editId, before.id), eq(places.position, 0)));
  for (const { id, dropped: said } of known) if (said !== null) dropped.set(id, said);
  const edit = editByIds(before);
  const placed = placeAnchors(
    edit,
    footage.clips,
    absent.map((row) => anchorOf(row, footage, edit.rate)),
  );
  for (const [index, { places: at }] of placed.entries()) {
    const row = absent[index];
    if (row !== undefined && at[0] !== undefined) dropped.set(row.id, saySegment(at[0].segment, footage));
  }
  return dropped;
}

/** A segment as a person reads it, on the clip's own time. */
function saySegment({ clip, source, clipRate }: Segment, footage: Footage): string {
  const known = footage.loaded.get(clip);
  const clock = (frames: Segment['source']['in']) =>
    formatClock(
      Math.max(
        0,
        frames
          .div(rateOf(clipRate))
          .sub(known?.label ?? 0)
          .valueOf(),
      ),
    );
  return `${known?.name ?? 'a clip'} from ${clock(source.in)} to ${clock(source.out)}`;
}

async function writePlaces(
  db: Database,
  { workshopId, editId }: { readonly workshopId: string; readonly editId: string },
  rows: readonly PlaceRow[],
): Promise<void> {
  for (let start = 0; start < rows.length; start += CHUNK) {
    const chunk = rows.slice(start, start + CHUNK);
    const column = (key: keyof PlaceRow) => sql.param(chunk.map((row) => row[key]));
    await db.execute(sql`
      insert into ${places} (workshop_id, edit_id, anchor_id, position, status, frame, end_frame, clip_id, clip_frame,
        by_picture, to_edge, dropped)
      select ${workshopId}::uuid, ${editId}::uuid, * from unnest(
        ${column('anchorId')}::uuid[], ${column('position')}::smallint[], ${column('status')}::place_status[],
        ${column('frame')}::bigint[], ${column('endFrame')}::bigint[], ${column('clipId')}::uuid[],
        ${column('clipFrame')}::bigint[], ${column('byPicture')}::boolean[], ${column('toEdge')}::boolean[],
        ${column('dropped')}::text[])`);
  }
  await db
    .update(edits)
    .set({ placesVersion: sql`${edits.placesVersion} + 1` })
    .where(eq(edits.id, editId));
}
