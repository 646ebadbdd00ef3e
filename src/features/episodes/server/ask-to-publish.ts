import { eq } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef, lockEpisode } from './load-episode.ts';
import { loadPublishChecks } from './load-publish-checks.ts';

/**
 * Says that a draft is ready, which asks the owner to publish it. A question that waits for one person holds it back.
 * @throws Invalid naming what must hold and does not, Conflict with the stored episode
 */
export const askToPublish = verb(
  { may: 'episode.ask-to-publish' },
  async (context, input: EpisodeRef & { readonly version: number }) => {
    const { db, actor, now } = context;
    const { build, episode } = await lockEpisode(context, input);
    if (episode.state !== 'draft') throw new Invalid({ '': 'Only a draft can be made ready.' });
    const open = (await loadPublishChecks(context, build, episode)).filter(
      ({ level, holds }) => level === 'must' && !holds,
    );
    if (open.length > 0) throw new Invalid({ '': open.map(({ sentence }) => sentence).join(' ') });
    await db
      .update(episodes)
      .set({
        state: 'ready',
        readyAskedBy: actor.kind === 'account' ? actor.id : null,
        readyAskedAt: now,
        version: episode.version + 1,
        updatedAt: now,
      })
      .where(eq(episodes.id, episode.id));
    return { id: episode.id };
  },
);
