import { and, desc, eq, isNull, sql } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { editions, episodes } from '../../../db/schema/episodes.ts';
import { workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { read } from '../../../server/verb.ts';

/** The newest published episodes of every workshop, for the front door. */
export const listNewEpisodes = read({ may: 'account.enter' }, async ({ db }) => {
  const items = await db
    .select({
      number: episodes.number,
      title: episodes.title,
      publishedOn: episodes.publishedOn,
      build: { slug: buildSlugs.slug, name: builds.name },
      workshop: { slug: workshopSlugs.slug, name: workshops.name },
    })
    .from(editions)
    .innerJoin(episodes, eq(episodes.id, editions.episodeId))
    .innerJoin(builds, and(eq(builds.id, episodes.buildId), eq(builds.visibility, 'public')))
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .innerJoin(workshops, eq(workshops.id, editions.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .where(
      and(
        isNull(editions.replacedAt),
        isNull(editions.withdrawnAt),
        eq(episodes.state, 'published'),
        isNull(episodes.deletedAt),
        isNull(builds.deletedAt),
      ),
    )
    .orderBy(sql`${episodes.publishedOn} desc nulls last`, desc(editions.id))
    .limit(8);
  return { items, nextCursor: null };
});
