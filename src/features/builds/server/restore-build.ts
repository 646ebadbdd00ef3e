import { and, eq, isNotNull, sql } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';

/** Brings a deleted build back as it was. @throws NotFound when no deleted build has that address name */
export const restoreBuild = verb(
  { may: 'build.change' },
  async ({ db, workshop, now }, { build: slug }: { readonly build: string }) => {
    const [asked] = await db
      .select({ id: builds.id })
      .from(buildSlugs)
      .innerJoin(builds, eq(builds.id, buildSlugs.buildId))
      .where(
        and(eq(buildSlugs.workshopId, workshop.id), eq(buildSlugs.slug, slug), isNotNull(builds.deletedAt)),
      );
    if (!asked) throw new NotFound('This build');
    const [restored] = await db
      .update(builds)
      .set({ deletedAt: null, version: sql`${builds.version} + 1`, updatedAt: now })
      .where(eq(builds.id, asked.id))
      .returning({ id: builds.id, version: builds.version });
    if (!restored) throw new NotFound('This build');
    await announcePageChanges(db, [`workshop:${workshop.id}`, `build:${restored.id}`]);
    return { ...restored, slug };
  },
);
