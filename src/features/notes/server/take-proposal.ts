import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceNotes } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { loadStandingNoteAt } from './load-note.ts';
import { setNote } from './set-note.ts';

type Target = EpisodeRef & { readonly note: string; readonly version: number };

/** Takes an editor's proposal: viewers see it from now on. Dropping it is deleting it. */
export const takeProposal = verb({ may: 'published-number.change' }, async (context, input: Target) => {
  const episode = await loadEpisodeOfNotes(context, input);
  const { row, view } = await loadStandingNoteAt(context, episode, input);
  if (!row.proposed) throw new Invalid({ '': 'This is no proposal any more. Nothing was changed.' });
  await announceNotes(context, episode, row.anchorId);
  return setNote(context, view, row, { proposed: false });
});
