import { eq } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef, lockEpisode } from './load-episode.ts';

/** Deletes an episode that viewers do not see. @throws Invalid for a published one, Conflict */
export const deleteEpisode = verb(
  { may: 'edit.change' },
  async (context, input: EpisodeRef & { readonly version: number }) => {
    const { episode } = await lockEpisode(context, input);
    if (episode.state === 'published')
      throw new Invalid({ '': 'Withdraw it first: viewers see this episode.' });
    await context.db
      .update(episodes)
      .set({ deletedAt: context.now, version: episode.version + 1 })
      .where(eq(episodes.id, episode.id));
    return { id: episode.id };
  },
);
