import { verb } from '../../../server/verb.ts';
import { announceNotes, requireMayChange } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { loadNoteAt } from './load-note.ts';
import { setNote } from './set-note.ts';

type Target = EpisodeRef & { readonly note: string; readonly version: number };

/** Brings a deleted note back. @throws Conflict as for a change */
export const restoreNote = verb({ may: 'draft-note.change' }, async (context, input: Target) => {
  const episode = await loadEpisodeOfNotes(context, input);
  const { row, view } = await loadNoteAt(context, episode, input);
  if (!row.proposed) requireMayChange(context, episode, [row.kind]);
  await announceNotes(context, episode, row.anchorId);
  return setNote(context, view, row, { deletedAt: null });
});
