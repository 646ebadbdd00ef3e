import { and, eq, isNull } from 'drizzle-orm';
import { editions, episodes } from '../../../db/schema/episodes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceEpisode } from './announce-episode.ts';
import { type EpisodeRef, lockEpisode } from './load-episode.ts';

/** Takes a published episode off: its page says so, its notes stay on the bench. @throws Conflict, Invalid */
export const withdrawEpisode = verb(
  { may: 'episode.publish' },
  async (context, input: EpisodeRef & { readonly version: number }) => {
    const { db, now } = context;
    const { episode } = await lockEpisode(context, input);
    if (episode.state !== 'published') throw new Invalid({ '': 'The episode is not published.' });
    await db
      .update(editions)
      .set({ withdrawnAt: now })
      .where(
        and(eq(editions.episodeId, episode.id), isNull(editions.replacedAt), isNull(editions.withdrawnAt)),
      );
    await db
      .update(episodes)
      .set({ state: 'withdrawn', version: episode.version + 1, updatedAt: now })
      .where(eq(episodes.id, episode.id));
    await announceEpisode(context, episode);
    return { id: episode.id };
  },
);
