import { and, eq, isNull } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { type Build } from '../build.ts';

/** What an address name can look like; anything else is not looked up. */
const LIKE_A_SLUG = /^[a-z0-9-]{1,100}$/;

/**
 * A build of the workshop by its address name, an old one included; `slug` is the current one.
 * @throws NotFound
 */
export async function loadBuild({ db, workshop }: WorkshopContext, slug: string): Promise<Build> {
  if (!LIKE_A_SLUG.test(slug)) throw new NotFound('This build');
  const [asked] = await db
    .select({ build: builds, current: buildSlugs.current })
    .from(buildSlugs)
    .innerJoin(builds, eq(builds.id, buildSlugs.buildId))
    .where(and(eq(buildSlugs.workshopId, workshop.id), eq(buildSlugs.slug, slug), isNull(builds.deletedAt)));
  if (!asked) throw new NotFound('This build');
  if (asked.current) return present(asked.build, slug);
  const [now] = await db
    .select({ slug: buildSlugs.slug })
    .from(buildSlugs)
    .where(and(eq(buildSlugs.buildId, asked.build.id), eq(buildSlugs.current, true)));
  return present(asked.build, now?.slug ?? slug);
}

function present(row: typeof builds.$inferSelect, slug: string): Build {
  const { id, name, about, visibility, plannedEpisodes, currency, version } = row;
  return { id, slug, name, about, visibility, plannedEpisodes, currency, version };
}
