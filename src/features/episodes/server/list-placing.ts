import { and, asc, desc, eq, isNull, ne } from 'drizzle-orm';
import { episodes, videos } from '../../../db/schema/episodes.ts';
import { clips } from '../../../db/schema/footage.ts';
import { MILLISECOND_RATE } from '../../../domain/time/rate.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

/** What a note of an episode can be placed on by hand: the clips of its build, and the build's other episodes. */
export const listPlacing = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { db } = context;
  const { build, episode } = await loadEpisode(context, ref);
  const named = await db
    .select({ id: clips.id, name: clips.name, num: clips.rateNum, den: clips.rateDen })
    .from(clips)
    .where(and(eq(clips.buildId, build.id), isNull(clips.deletedAt)))
    .orderBy(asc(clips.name), asc(clips.id));
  const others = await db
    .selectDistinctOn([episodes.number, episodes.id], {
      id: episodes.id,
      title: episodes.title,
      num: videos.rateNum,
      den: videos.rateDen,
    })
    .from(episodes)
    .leftJoin(videos, eq(videos.episodeId, episodes.id))
    .where(and(eq(episodes.buildId, build.id), ne(episodes.id, episode.id), isNull(episodes.deletedAt)))
    .orderBy(asc(episodes.number), asc(episodes.id), desc(videos.id));
  return {
    clips: named.map(({ id, name, num, den }) => ({ id, name, rate: { num, den } })),
    otherEpisodes: others.map(({ id, title, num, den }) => ({
      id,
      title,
      rate: num === null || den === null ? MILLISECOND_RATE : { num, den },
    })),
  };
});
