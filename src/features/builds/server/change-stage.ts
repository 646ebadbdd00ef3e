import { and, eq, sql } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type ChangeStage } from '../stage.ts';
import { loadBuild } from './load-build.ts';
import { loadStage } from './load-stages.ts';

/** Changes a stage's name and text. @throws Conflict with the stored stage when it changed since it was read */
export const changeStage = verb(
  { may: 'build.change' },
  async (context, input: ChangeStage & { readonly build: string; readonly stage: string }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadStage(context, build.id, input.stage);
    const [saved] = await db
      .update(stages)
      .set({
        name: input.name,
        about: input.about,
        version: sql`${stages.version} + 1`,
        updatedAt: now,
      })
      .where(and(eq(stages.id, stored.id), eq(stages.version, input.version)))
      .returning({ id: stages.id, version: stages.version });
    if (!saved) {
      throw new Conflict(
        stored,
        `Someone else changed the stage “${stored.name}” in the meantime. What you entered is kept; look it over and save again.`,
      );
    }
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
