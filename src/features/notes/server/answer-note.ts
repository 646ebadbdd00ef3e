import { Forbidden, Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { keepVersion, loadStandingNoteAt } from './load-note.ts';
import { setNote } from './set-note.ts';

type Answer = EpisodeRef & { readonly note: string; readonly version: number; readonly answer: string };

/** Answers a note that asks one person; it stops waiting in that person's Today. Only they answer, or the owner. */
export const answerNote = verb({ may: 'workshop.see-bench' }, async (context, input: Answer) => {
  const episode = await loadEpisodeOfNotes(context, input);
  const { row, shown, view } = await loadStandingNoteAt(context, episode, input);
  const { actor, role, now } = context;
  const asked = actor.kind === 'account' && row.askedId === actor.id;
  if (row.audience !== 'person' || !(asked || role === 'owner')) {
    throw new Forbidden('This is asked of someone else. Nothing was changed.');
  }
  if (input.answer === '') throw new Invalid({ answer: 'Write the answer.' });
  await keepVersion(context, shown);
  return setNote(context, view, row, { answer: input.answer, answeredAt: now });
});
