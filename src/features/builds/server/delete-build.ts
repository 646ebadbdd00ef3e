import { and, eq, sql } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';

/** Deletes a build; it can be brought back for 30 days. @throws Conflict when it changed since it was read */
export const deleteBuild = verb(
  { may: 'build.change' },
  async (context, { build: slug, version }: { readonly build: string; readonly version: number }) => {
    const { db, workshop, now } = context;
    const build = await loadBuild(context, slug);
    const [deleted] = await db
      .update(builds)
      .set({ deletedAt: now, version: sql`${builds.version} + 1`, updatedAt: now })
      .where(and(eq(builds.id, build.id), eq(builds.version, version)))
      .returning({ version: builds.version });
    if (!deleted) {
      throw new Conflict(build, 'Someone else changed this build in the meantime. It was not deleted.');
    }
    await announcePageChanges(db, [`workshop:${workshop.id}`, `build:${build.id}`]);
    return { id: build.id, slug: build.slug, version: deleted.version };
  },
);
