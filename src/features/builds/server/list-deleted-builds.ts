import { and, desc, eq, isNotNull } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { read } from '../../../server/verb.ts';

/** The builds that were deleted and can still be brought back, the last deleted first. */
export const listDeletedBuilds = read({ may: 'build.change' }, async ({ db, workshop }) => {
  const items = await db
    .select({ id: builds.id, slug: buildSlugs.slug, name: builds.name, deletedAt: builds.deletedAt })
    .from(builds)
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .where(and(eq(builds.workshopId, workshop.id), isNotNull(builds.deletedAt)))
    .orderBy(desc(builds.deletedAt));
  return { items, nextCursor: null };
});
