import { type Chapter } from '../../../domain/chapters/chapter.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { loadNewProposals } from './load-new-proposals.ts';

/** Chapters that the stages of the footage propose, without those that are there. */
export const listProposedChapters = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<{ items: readonly Chapter[]; nextCursor: null }> => {
    const { episode } = await loadEpisode(context, ref);
    return { items: (await loadNewProposals(context, episode)).chapters, nextCursor: null };
  },
);
