import { read } from '../../../server/verb.ts';
import { loadFilmedClips } from '../../footage/server/load-filmed-clips.ts';
import { loadBuildClips } from './load-clips.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

/** The clips of an episode's build as an edit is built from them, by name. */
export const listHandClips = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { episode } = await loadEpisode(context, ref);
  const filmed = new Map((await loadFilmedClips(context.db, episode.buildId)).map((clip) => [clip.id, clip]));
  const named = await loadBuildClips(context.db, episode.buildId);
  const items = named.flatMap(({ id, label }) => {
    const clip = filmed.get(id);
    if (clip === undefined) return [];
    const { name, rate, startLabel, drop, frames } = clip;
    return [{ id, label, name, rate, startLabel, drop, frames }];
  });
  return { items, nextCursor: null };
});
