import { and, eq, isNotNull, sql } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';

/** Brings a deleted stage back where it stood. @throws NotFound, or Conflict when it is not as it was deleted */
export const restoreStage = verb(
  { may: 'build.change' },
  async (context, input: { readonly build: string; readonly stage: string; readonly version: number }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const [stored] = await db
      .select({ id: stages.id, name: stages.name, about: stages.about, version: stages.version })
      .from(stages)
      .where(and(eq(stages.id, input.stage), eq(stages.buildId, build.id), isNotNull(stages.deletedAt)));
    if (!stored) throw new NotFound('This stage');
    const [saved] = await db
      .update(stages)
      .set({ deletedAt: null, version: sql`${stages.version} + 1`, updatedAt: now })
      .where(and(eq(stages.id, stored.id), eq(stages.version, input.version)))
      .returning({ id: stages.id, version: stages.version });
    if (!saved) throw new Conflict(stored);
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
