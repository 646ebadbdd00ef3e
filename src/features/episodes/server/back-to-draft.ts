import { eq } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef, lockEpisode } from './load-episode.ts';

/** Takes back that an episode is ready, or works on a withdrawn one again. @throws Invalid, Conflict */
export const backToDraft = verb(
  { may: 'episode.ask-to-publish' },
  async (context, input: EpisodeRef & { readonly version: number }) => {
    const { episode } = await lockEpisode(context, input);
    if (episode.state !== 'ready' && episode.state !== 'withdrawn') {
      throw new Invalid({ '': 'Only what is ready or withdrawn goes back to draft.' });
    }
    await context.db
      .update(episodes)
      .set({
        state: 'draft',
        readyAskedBy: null,
        readyAskedAt: null,
        version: episode.version + 1,
        updatedAt: context.now,
      })
      .where(eq(episodes.id, episode.id));
    return { id: episode.id };
  },
);
