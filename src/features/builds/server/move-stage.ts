import { and, eq, sql } from 'drizzle-orm';
import { builds, stages } from '../../../db/schema/builds.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type MoveStage } from '../stage.ts';
import { loadBuild } from './load-build.ts';
import { loadStage, loadStages } from './load-stages.ts';

/** Moves a stage one place up or down; at the end it stays. @throws Conflict when it changed since it was read */
export const moveStage = verb(
  { may: 'build.change' },
  async (context, input: MoveStage & { readonly build: string; readonly stage: string }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    // Two moves at once would otherwise number the stages twice over each other.
    await db.select({ id: builds.id }).from(builds).where(eq(builds.id, build.id)).for('update');
    const stored = await loadStage(context, build.id, input.stage);
    if (stored.version !== input.version) {
      throw new Conflict(stored, 'Someone else changed this stage in the meantime. It was not moved.');
    }
    const order = (await loadStages(context, build.id)).map(({ id }) => id);
    const from = order.indexOf(stored.id);
    const to = Math.min(Math.max(from + (input.to === 'up' ? -1 : 1), 0), order.length - 1);
    if (from === to) return { id: stored.id, version: stored.version };
    order.splice(to, 0, ...order.splice(from, 1));
    for (const [position, id] of order.entries()) {
      await db
        .update(stages)
        .set({ position: position + 1 })
        .where(eq(stages.id, id));
    }
    const [saved] = await db
      .update(stages)
      .set({ version: sql`${stages.version} + 1`, updatedAt: now })
      .where(and(eq(stages.id, stored.id), eq(stages.version, stored.version)))
      .returning({ id: stages.id, version: stages.version });
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved ?? { id: stored.id, version: stored.version };
  },
);
