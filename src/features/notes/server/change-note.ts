import { eq } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { verb } from '../../../server/verb.ts';
import { isInEdit, type Note, type NoteFields } from '../note.ts';
import { announceNotes, requireMayChange } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { keepVersion, loadStandingNoteAt } from './load-note.ts';
import { loadNotes } from './load-notes.ts';
import { moveAnchor } from './write-anchor.ts';
import { requireKnown, writeParts } from './write-note.ts';

type Change = NoteFields & EpisodeRef & { readonly note: string; readonly version: number };

/**
 * Changes a note; what it said before is kept. An unanswered question to one person stays unanswered.
 * @throws Conflict with the stored note when someone saved it in the meantime
 */
export const changeNote = verb(
  { may: 'draft-note.change' },
  async (context, input: Change): Promise<Note> => {
    const { db, now } = context;
    const episode = await loadEpisodeOfNotes(context, input);
    const { row, shown, view } = await loadStandingNoteAt(context, episode, input);
    if (!row.proposed) requireMayChange(context, episode, [row.kind, input.kind]);
    await requireKnown(context, episode, input);
    await keepVersion(context, shown);
    const { kind, text, audience, askedId, standing, topic } = input;
    // Who was asked, and what they answered, stays known when the note turns to others.
    const asked = audience === 'person' ? askedId : row.askedId;
    await db
      .update(notes)
      .set({
        kind,
        text,
        audience,
        askedId: asked,
        ...(asked !== row.askedId && { answer: null, answeredAt: null }),
        standing,
        topic,
        version: row.version + 1,
        updatedAt: now,
      })
      .where(eq(notes.id, row.id));
    const stands = isInEdit(shown) ? shown.position : null;
    await moveAnchor(context, episode, row.anchorId, input.position, stands);
    await writeParts(context, row.id, input.partIds);
    await announceNotes(context, episode, row.anchorId);
    const [note] = await loadNotes(db, view, eq(notes.id, row.id));
    return note ?? shown;
  },
);
