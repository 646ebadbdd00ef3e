import { and, asc, eq, isNull } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** The episodes of a build as its team sees them, by number. */
export const listEpisodes = read(
  { may: 'workshop.see-bench' },
  async (context, { build: slug }: { build: string }) => {
    const build = await loadBuild(context, slug);
    const items = await context.db
      .select({
        id: episodes.id,
        number: episodes.number,
        title: episodes.title,
        state: episodes.state,
        publishedOn: episodes.publishedOn,
      })
      .from(episodes)
      .where(and(eq(episodes.buildId, build.id), isNull(episodes.deletedAt)))
      .orderBy(asc(episodes.number));
    return { items, nextCursor: null };
  },
);
