import { and, eq, isNull, sql } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { Conflict, Invalid } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type DeleteStage } from '../stage.ts';
import { loadBuild } from './load-build.ts';
import { loadStage } from './load-stages.ts';

/**
 * Deletes a stage. Its diary entries go to another stage, or stay in the diary without one: such entries keep
 * pointing at it, so that bringing it back brings them back to it.
 * @throws Invalid at `entries` when it has some and it was not said where they go; Conflict
 */
export const deleteStage = verb(
  { may: 'build.change' },
  async (context, input: DeleteStage & { readonly build: string; readonly stage: string }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadStage(context, build.id, input.stage);
    const ofStage = and(eq(diaryEntries.stageId, stored.id), isNull(diaryEntries.deletedAt));
    const { entries: written } = stored;
    if (written > 0 && input.entries === undefined) {
      const said = written === 1 ? 'One diary entry is' : `${String(written)} diary entries are`;
      throw new Invalid({ entries: `${said} on this stage. Choose where they go, then delete it.` });
    }
    if (written > 0 && input.entries !== undefined && input.entries !== 'none') {
      const to = await loadStage(context, build.id, input.entries);
      if (to.id === stored.id) throw new Invalid({ entries: 'Choose another stage than the deleted one.' });
      await db
        .update(diaryEntries)
        .set({ stageId: to.id, version: sql`${diaryEntries.version} + 1`, updatedAt: now })
        .where(ofStage);
    }
    const [deleted] = await db
      .update(stages)
      .set({ deletedAt: now, version: sql`${stages.version} + 1`, updatedAt: now })
      .where(and(eq(stages.id, stored.id), eq(stages.version, input.version)))
      .returning({ id: stages.id, version: stages.version });
    if (!deleted) {
      throw new Conflict(
        stored,
        'Someone else changed this stage in the meantime. It was not deleted, and no entry was moved.',
      );
    }
    await announcePageChanges(db, [`build:${build.id}`]);
    return deleted;
  },
);
