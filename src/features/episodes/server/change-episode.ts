import { and, eq } from 'drizzle-orm';
import { episodeNumbers, episodes } from '../../../db/schema/episodes.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { announceEpisode } from './announce-episode.ts';
import { type EpisodeRef, lockEpisode } from './load-episode.ts';

type Input = EpisodeRef & {
  readonly title: string;
  readonly number: number;
  readonly about: string;
  readonly version: number;
};

/**
 * Changes title, number and about. An old number keeps leading here and is given to no other episode.
 * @throws Conflict with the stored episode, or Invalid at `number`
 */
export const changeEpisode = verb({ may: 'edit.change' }, async (context, input: Input) => {
  const { db, workshop, now } = context;
  const { build, episode } = await lockEpisode(context, input);
  if (input.number !== episode.number) await moveToNumber();
  const [saved] = await db
    .update(episodes)
    .set({
      title: input.title,
      number: input.number,
      about: input.about,
      version: episode.version + 1,
      updatedAt: now,
    })
    .where(eq(episodes.id, episode.id))
    .returning();
  await announceEpisode(context, episode);
  return saved ?? episode;

  async function moveToNumber(): Promise<void> {
    const own = and(eq(episodeNumbers.episodeId, episode.id), eq(episodeNumbers.number, input.number));
    await db.update(episodeNumbers).set({ current: false }).where(eq(episodeNumbers.episodeId, episode.id));
    const [had] = await db.update(episodeNumbers).set({ current: true }).where(own).returning();
    if (had) return;
    await onUniqueViolation(
      { episode_numbers_pkey: { number: 'Another episode has, or had, that number. Choose another.' } },
      () =>
        db.insert(episodeNumbers).values({
          workshopId: workshop.id,
          buildId: build.id,
          number: input.number,
          episodeId: episode.id,
          current: true,
        }),
    );
  }
});
