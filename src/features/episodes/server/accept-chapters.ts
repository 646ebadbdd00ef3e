import { newId } from '../../../db/columns.ts';
import { millisecondsToFrame } from '../../../domain/time/frames.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { addChapter } from './add-chapter.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { loadNewProposals } from './load-new-proposals.ts';

/**
 * Takes chapters that the stages of the footage propose, by where they start.
 * @throws Invalid when none of them is proposed any more
 */
export const acceptChapters = verb(
  { may: 'draft-note.change' },
  async (context, input: EpisodeRef & { readonly start: readonly number[] }) => {
    const { episode } = await loadEpisode(context, input);
    const { chapters, rate } = await loadNewProposals(context, episode);
    const taken = chapters.filter(({ start }) => input.start.includes(start));
    if (taken.length === 0 || rate === null)
      throw new Invalid({ start: 'These are proposed no more. Look at the list again.' });
    for (const { start, title } of taken) {
      const position = { frame: millisecondsToFrame(start, rate), endFrame: null, rate };
      await addChapter(context, { build: input.build, episode: episode.id, id: newId(), title, position });
    }
    return { added: taken.length };
  },
);
