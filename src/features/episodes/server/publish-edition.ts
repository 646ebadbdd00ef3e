import { and, eq, isNull, max } from 'drizzle-orm';
import { editions, episodes } from '../../../db/schema/episodes.ts';
import { NEXT_EPISODE_STATES } from '../../../domain/episode-states.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { dayIn } from '../../../domain/time/day-in.ts';
import { verb } from '../../../server/verb.ts';
import { announceEpisode } from './announce-episode.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';
import { findDraftCaptions, findDraftVideo, type EpisodeRef, lockEpisode } from './load-episode.ts';
import { loadPublishChecks } from './load-publish-checks.ts';

type Input = EpisodeRef & { readonly version: number; readonly publishedOn?: string | undefined };

/**
 * Publishes what the draft holds now as the next edition; it replaces the one before in the same moment.
 * @throws Invalid naming the checks that must hold and do not, Conflict with the stored episode
 */
export const publishEdition = verb({ may: 'episode.publish' }, async (context, input: Input) => {
  const { db, workshop, actor, now } = context;
  const { build, episode } = await lockEpisode(context, input);
  if (!NEXT_EPISODE_STATES[episode.state].includes('published')) {
    throw new Invalid({ '': 'The episode cannot be published from this state.' });
  }
  const open = (await loadPublishChecks(context, build, episode)).filter(
    ({ level, holds }) => level === 'must' && !holds,
  );
  if (open.length > 0) throw new Invalid({ '': open.map(({ sentence }) => sentence).join(' ') });
  const video = await findDraftVideo(db, episode.id);
  if (!video) throw new Invalid({ '': 'There is no video yet.' });
  const captions = await findDraftCaptions(db, episode.id);
  const edit = await findDraftEdit(db, episode.id);
  await replaceShown(context, episode.id);
  const [last] = await db
    .select({ number: max(editions.number) })
    .from(editions)
    .where(eq(editions.episodeId, episode.id));
  const number = (last?.number ?? 0) + 1;
  await db.insert(editions).values({
    workshopId: workshop.id,
    episodeId: episode.id,
    number,
    videoId: video.id,
    captionsId: captions?.id ?? null,
    editId: edit?.id ?? null,
    publishedAt: now,
    publishedBy: actor.kind === 'account' ? actor.id : null,
  });
  const publishedOn = input.publishedOn ?? episode.publishedOn ?? dayIn(workshop.timeZone, now);
  await db
    .update(episodes)
    .set({ state: 'published', publishedOn, version: episode.version + 1, updatedAt: now })
    .where(eq(episodes.id, episode.id));
  await announceEpisode(context, episode);
  return { id: episode.id };
});

async function replaceShown({ db, now }: WorkshopContext, episodeId: string): Promise<void> {
  await db
    .update(editions)
    .set({ replacedAt: now })
    .where(and(eq(editions.episodeId, episodeId), isNull(editions.replacedAt), isNull(editions.withdrawnAt)));
}
