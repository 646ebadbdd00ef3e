import { and, eq, isNull } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { clips } from '../../../db/schema/footage.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Note, type PlacedAnchor } from '../note.ts';
import { type AnchorRow } from './footage-of-edits.ts';
import { announceNotes, requireMayChange } from './guard-published.ts';
import { findDraftEdit } from './load-edits.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { keepVersion, loadStandingNoteAt } from './load-note.ts';
import { loadNotes } from './load-notes.ts';
import { lockPlaces, placeAgain } from './place-edit.ts';
import { atEpisodeTime, columnsAt } from './write-anchor.ts';

type Input = EpisodeRef & {
  readonly note: string;
  readonly version: number;
  readonly anchor: PlacedAnchor;
};

/**
 * Says by hand where a note was made: at a moment of this or another episode of the build, on a clip, or in the shop.
 * @returns the note, and what brings it back to where it was
 * @throws NotFound for an episode or a clip that is not the build's, Conflict as for a change
 */
export const placeNote = verb(
  { may: 'draft-note.change' },
  async (context, input: Input): Promise<{ note: Note; before: PlacedAnchor | null }> => {
    const { db, now } = context;
    const episode = await loadEpisodeOfNotes(context, input);
    const { row, shown, view } = await loadStandingNoteAt(context, episode, input);
    if (!row.proposed) requireMayChange(context, episode, [row.kind]);
    await lockPlaces(db, episode.buildId);
    const [anchor] = await db.select().from(anchors).where(eq(anchors.id, row.anchorId));
    if (!anchor) throw new NotFound('This note');
    await keepVersion(context, shown);
    await db
      .update(anchors)
      .set(await columnsOf(context, episode.buildId, input.anchor, anchor))
      .where(eq(anchors.id, anchor.id));
    await db
      .update(notes)
      .set({ version: row.version + 1, updatedAt: now })
      .where(eq(notes.id, row.id));
    await announceNotes(context, episode, anchor.id);
    await placeAgain(db, episode.buildId, [anchor.id]);
    const [note] = await loadNotes(db, view, eq(notes.id, row.id));
    return { note: note ?? shown, before: placedAnchor(anchor) };
  },
);

async function columnsOf(
  { db }: WorkshopContext,
  buildId: string,
  to: PlacedAnchor,
  before: AnchorRow,
): Promise<Partial<AnchorRow>> {
  if (to.clock === 'episode') {
    const [episode] = await db
      .select({ id: episodes.id, buildId: episodes.buildId })
      .from(episodes)
      .where(and(eq(episodes.id, to.episode), eq(episodes.buildId, buildId), isNull(episodes.deletedAt)));
    if (!episode) throw new NotFound('This episode');
    return columnsAt(db, episode, to.position, await findDraftEdit(db, episode.id), before.of);
  }
  const bare = { ...NOWHERE, episodeId: before.episodeId };
  if (to.clock === 'shop') {
    const shopUntil = to.shopUntil === null ? null : new Date(to.shopUntil);
    return {
      ...bare,
      clock: 'shop',
      frame: null,
      rateNum: null,
      rateDen: null,
      shopAt: new Date(to.shopAt),
      shopUntil,
    };
  }
  const [clip] = await db
    .select({ id: clips.id })
    .from(clips)
    .where(and(eq(clips.id, to.clip), eq(clips.buildId, buildId), isNull(clips.deletedAt)));
  if (!clip) throw new NotFound('This clip');
  const { frame, endFrame, rate } = to.position;
  return { ...bare, clock: 'clip', clipId: clip.id, frame, endFrame, rateNum: rate.num, rateDen: rate.den };
}

const NOWHERE = atEpisodeTime('', { frame: 0, endFrame: null, rate: { num: 1, den: 1 } });

/** What a person would say to bring an anchor back; null of a stretch that ends on another clip. */
function placedAnchor(row: AnchorRow): PlacedAnchor | null {
  const { clock, shopAt, shopUntil, clipId, endClipId, episodeId, frame, endFrame, rateNum, rateDen } = row;
  if (clock === 'shop' && shopAt !== null)
    return { clock, shopAt: shopAt.toISOString(), shopUntil: shopUntil?.toISOString() ?? null };
  if (frame === null || frame < 0 || rateNum === null || rateDen === null || endClipId !== null) return null;
  const position = { frame, endFrame, rate: { num: rateNum, den: rateDen } };
  if (clock === 'clip' && clipId !== null) return { clock, clip: clipId, position };
  return episodeId === null ? null : { clock: 'episode', episode: episodeId, position };
}
