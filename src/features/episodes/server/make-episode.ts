import { eq, max } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { episodeNumbers, episodes } from '../../../db/schema/episodes.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

interface Input {
  readonly build: string;
  readonly title: string;
  readonly number?: number | undefined;
}

/** Makes a draft. Without a number it gets the next one. @throws Invalid at `number` when that was ever another's */
export const makeEpisode = verb({ may: 'edit.change' }, async (context, input: Input) => {
  const { db, workshop } = context;
  const build = await loadBuild(context, input.build);
  const [highest] = await db
    .select({ number: max(episodeNumbers.number) })
    .from(episodeNumbers)
    .where(eq(episodeNumbers.buildId, build.id));
  const number = input.number ?? (highest?.number ?? 0) + 1;
  const id = newId();
  await db
    .insert(episodes)
    .values({ id, workshopId: workshop.id, buildId: build.id, number, title: input.title });
  await onUniqueViolation(
    { episode_numbers_pkey: { number: 'Another episode has, or had, that number. Choose another.' } },
    () =>
      db
        .insert(episodeNumbers)
        .values({ workshopId: workshop.id, buildId: build.id, number, episodeId: id, current: true }),
  );
  return { id };
});
