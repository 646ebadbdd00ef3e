import { and, eq, sql } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type ChangeBuild } from '../build.ts';
import { loadBuild } from './load-build.ts';

/**
 * Changes what a build is called and who may see it. An old address name keeps leading here.
 * @throws Conflict with the stored build when it changed since it was read; Invalid at `slug` when that is taken
 */
export const changeBuild = verb(
  { may: 'build.change' },
  async (context, input: ChangeBuild & { readonly build: string }) => {
    const { db, workshop, now } = context;
    const stored = await loadBuild(context, input.build);
    const { slug, version, name, about, plannedEpisodes, currency, visibility } = input;
    const [saved] = await db
      .update(builds)
      .set({
        name,
        about,
        plannedEpisodes,
        currency,
        visibility,
        version: sql`${builds.version} + 1`,
        updatedAt: now,
      })
      .where(and(eq(builds.id, stored.id), eq(builds.version, version)))
      .returning({ version: builds.version });
    if (!saved) {
      throw new Conflict(
        stored,
        'Someone else changed this build in the meantime. What you entered is kept below; look it over and save again.',
      );
    }
    if (slug !== stored.slug) await moveTo(slug);
    await announcePageChanges(db, [`workshop:${workshop.id}`, `build:${stored.id}`]);
    return { id: stored.id, slug, version: saved.version };

    async function moveTo(next: string): Promise<void> {
      await db
        .update(buildSlugs)
        .set({ current: false })
        .where(and(eq(buildSlugs.buildId, stored.id), eq(buildSlugs.current, true)));
      const [own] = await db
        .update(buildSlugs)
        .set({ current: true })
        .where(
          and(
            eq(buildSlugs.workshopId, workshop.id),
            eq(buildSlugs.buildId, stored.id),
            eq(buildSlugs.slug, next),
          ),
        )
        .returning({ slug: buildSlugs.slug });
      if (own) return;
      await onUniqueViolation(
        {
          build_slugs_pkey: {
            slug: 'Another build of this workshop has, or had, that address name. Choose another.',
          },
        },
        () =>
          db
            .insert(buildSlugs)
            .values({ workshopId: workshop.id, slug: next, buildId: stored.id, current: true }),
      );
    }
  },
);
