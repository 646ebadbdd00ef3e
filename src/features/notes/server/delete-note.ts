import { type Ruled, verb } from '../../../server/verb.ts';
import { type Note } from '../note.ts';
import { announceNotes, requireMayChange } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { loadStandingNoteAt } from './load-note.ts';
import { setNote } from './set-note.ts';

type Target = EpisodeRef & { readonly note: string; readonly version: number };

/** Deletes a note; for 30 days restoring it is the inverse. @throws Conflict as for a change */
export const deleteNote: Ruled<Target, Note> = verb(
  { may: 'draft-note.change' },
  async (context, input: Target) => {
    const episode = await loadEpisodeOfNotes(context, input);
    const { row, view } = await loadStandingNoteAt(context, episode, input);
    if (!row.proposed) requireMayChange(context, episode, [row.kind]);
    await announceNotes(context, episode, row.anchorId);
    return setNote(context, view, row, { deletedAt: context.now });
  },
);
