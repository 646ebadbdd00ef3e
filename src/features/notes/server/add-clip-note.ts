import { and, eq } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { MILLISECOND_RATE } from '../../../domain/time/rate.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef } from '../../footage/server/load-clip.ts';
import { type AddClipNote } from '../clip-note.ts';
import { announceClipNotes, loadClipOfNotes, proposesOnClip } from './load-clip-note.ts';
import { lockPlaces, placeAgain } from './place-edit.ts';

/**
 * Adds a note for the team at a moment of a clip; every edit that uses the moment shows it. Sent twice by the same
 * person it is kept once.
 * @throws Invalid at `frame` for a moment after the clip's end
 */
export const addClipNote = verb(
  { may: 'draft-note.change' },
  async (context, input: AddClipNote & ClipRef) => {
    const { db, workshop, actor } = context;
    const clip = await loadClipOfNotes(context, input);
    const { id, kind, text, frame } = input;
    const writtenBy = actor.kind === 'account' ? actor.id : null;
    const [kept] = await db
      .select({ id: notes.id, version: notes.version })
      .from(notes)
      .innerJoin(anchors, eq(anchors.id, notes.anchorId))
      .where(and(eq(notes.id, id), eq(anchors.clipId, clip.id), eq(notes.writtenBy, writtenBy ?? id)));
    if (kept) return kept;
    const even = clip.frameTimes === null;
    const rate = even ? { num: clip.rateNum, den: clip.rateDen } : MILLISECOND_RATE;
    const last = even ? clip.frames : clip.frames && (clip.frames * clip.rateDen * 1000) / clip.rateNum;
    if (last !== null && frame >= last) throw new Invalid({ frame: 'That is after the end of the clip.' });
    await lockPlaces(db, clip.buildId);
    const anchorId = newId();
    const of = { workshopId: workshop.id, buildId: clip.buildId };
    const counted = { rateNum: rate.num, rateDen: rate.den };
    await db
      .insert(anchors)
      .values({ id: anchorId, ...of, clock: 'clip', clipId: clip.id, frame, ...counted });
    const proposed = proposesOnClip(context, clip, kind);
    await onUniqueViolation(
      { notes_pkey: { id: 'This note is kept already. Open the page again to see it.' } },
      () =>
        db.insert(notes).values({ id, ...of, anchorId, kind, text, audience: 'team', proposed, writtenBy }),
    );
    await placeAgain(db, clip.buildId, [anchorId]);
    await announceClipNotes(context, clip);
    return { id, version: 1 };
  },
);
