import { and, eq, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { anchors } from '../../../db/schema/notes.ts';
import { keepOnClip } from '../../../domain/place/keep-on-clip.ts';
import { editByIds, loadFootage, positionOf } from '../../notes/server/footage-of-edits.ts';
import { findEditById, type StoredEdit } from '../../notes/server/load-edits.ts';
import { lockPlaces, placeEdit } from '../../notes/server/place-edit.ts';

/** Anchors written in one statement. */
const CHUNK = 2000;

/**
 * Gives everything its place in an edit that was just taken, in the transaction that takes it. What was typed in an
 * episode that had no edit is kept at the clip time beneath it from now on, with what was typed beside it.
 */
export async function placeTakenEdit(db: Database, editId: string): Promise<void> {
  const stored = await findEditById(db, editId);
  if (!stored) return;
  const [episode] = await db
    .select({ id: episodes.id, buildId: episodes.buildId })
    .from(episodes)
    .where(eq(episodes.id, stored.episodeId));
  if (!episode) return;
  await lockPlaces(db, episode.buildId);
  if (stored.number === 1) await keepTypedOnClips(db, stored, episode);
  await placeEdit(db, editId);
}

async function keepTypedOnClips(
  db: Database,
  stored: StoredEdit,
  episode: { readonly id: string; readonly buildId: string },
): Promise<void> {
  const { counted } = await loadFootage(db, episode.buildId);
  const edit = editByIds(stored);
  const rows = await db
    .select()
    .from(anchors)
    .where(and(eq(anchors.episodeId, episode.id), eq(anchors.clock, 'episode')));
  const kept = rows.flatMap((row) => {
    const on = keepOnClip(edit, counted, positionOf(row), row.of);
    return on === null ? [] : [{ id: row.id, ...on }];
  });
  for (let start = 0; start < kept.length; start += CHUNK) {
    const chunk = kept.slice(start, start + CHUNK);
    const column = <Value>(pick: (one: (typeof kept)[number]) => Value) => sql.param(chunk.map(pick));
    await db.execute(sql`
      update ${anchors} a set clock = 'clip', clip_id = k.clip_id, end_clip_id = k.end_clip_id,
        typed_frame = a.frame, typed_end_frame = a.end_frame, typed_rate_num = a.rate_num, typed_rate_den = a.rate_den,
        frame = k.frame, end_frame = k.end_frame, rate_num = k.rate_num, rate_den = k.rate_den
      from unnest(
        ${column(({ id }) => id)}::uuid[], ${column(({ clip }) => clip)}::uuid[],
        ${column(({ endClip }) => endClip)}::uuid[], ${column(({ frame }) => frame)}::bigint[],
        ${column(({ endFrame }) => endFrame)}::bigint[], ${column(({ rate }) => rate.num)}::integer[],
        ${column(({ rate }) => rate.den)}::integer[]
      ) as k (id, clip_id, end_clip_id, frame, end_frame, rate_num, rate_den)
      where a.id = k.id`);
  }
}
