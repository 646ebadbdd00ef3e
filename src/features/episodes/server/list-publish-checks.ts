import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { loadPublishChecks } from './load-publish-checks.ts';

/** What must hold and what should, before the episode goes out. */
export const listPublishChecks = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { build, episode } = await loadEpisode(context, ref);
  return { items: await loadPublishChecks(context, build, episode), nextCursor: null };
});
