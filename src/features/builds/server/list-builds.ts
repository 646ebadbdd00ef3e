import { and, desc, eq, isNull } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { read } from '../../../server/verb.ts';

/** The builds of a workshop as its team sees them, newest first. */
export const listBuilds = read({ may: 'workshop.see-bench' }, (context) => loadBuilds(context, false));

/** The builds that are on show to everyone, newest first. */
export const listPublicBuilds = read({ may: 'published.read' }, (context) => loadBuilds(context, true));

async function loadBuilds({ db, workshop }: WorkshopContext, onlyPublic: boolean) {
  const items = await db
    .select({
      id: builds.id,
      slug: buildSlugs.slug,
      name: builds.name,
      about: builds.about,
      visibility: builds.visibility,
    })
    .from(builds)
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .where(
      and(
        eq(builds.workshopId, workshop.id),
        isNull(builds.deletedAt),
        onlyPublic ? eq(builds.visibility, 'public') : undefined,
      ),
    )
    .orderBy(desc(builds.id));
  return { items, nextCursor: null };
}
