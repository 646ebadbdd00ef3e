import { read } from '../../../server/verb.ts';
import { loadDraftChapters } from './load-chapters.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

/** The chapters of an episode as its team sees them. */
export const listChapters = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { episode } = await loadEpisode(context, ref);
  return { items: await loadDraftChapters(context.db, episode.id), nextCursor: null };
});
