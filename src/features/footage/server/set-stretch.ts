import { and, eq, isNull } from 'drizzle-orm';
import { workStretches } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { announceFootage } from './announce-footage.ts';

export interface StretchRef {
  readonly build: string;
  readonly stretch: string;
  readonly version: number;
}

/**
 * Sets columns of a stretch of work as its next version.
 * @param options.deleted whether one that was deleted is meant, too
 * @throws NotFound; Conflict with the stored stretch
 */
export async function setStretch(
  context: WorkshopContext,
  ref: StretchRef,
  columns: Partial<Pick<typeof workStretches.$inferInsert, 'untilAt' | 'deletedAt'>>,
  options: { readonly deleted?: boolean } = {},
): Promise<{ id: string; version: number }> {
  const { db, now } = context;
  const build = await loadBuild(context, ref.build);
  const [stored] = await db
    .select()
    .from(workStretches)
    .where(
      and(
        eq(workStretches.id, ref.stretch),
        eq(workStretches.buildId, build.id),
        options.deleted === true ? undefined : isNull(workStretches.deletedAt),
      ),
    )
    .for('update');
  if (!stored) throw new NotFound('This stretch of work');
  if (stored.version !== ref.version)
    throw new Conflict(
      stored,
      'Someone else changed this stretch of work in the meantime. Look at it again.',
    );
  const version = stored.version + 1;
  await db
    .update(workStretches)
    .set({ ...columns, version, updatedAt: now })
    .where(eq(workStretches.id, stored.id));
  await announceFootage(context, build.id);
  return { id: stored.id, version };
}
