import { and, eq, isNotNull, sql } from 'drizzle-orm';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** Brings a deleted worksheet back. @throws NotFound, or Conflict when it is not as it was deleted */
export const restoreWorksheet = verb(
  { may: 'worksheet.change' },
  async (
    context,
    input: { readonly build: string; readonly worksheet: string; readonly version: number },
  ) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const deleted = and(
      eq(worksheets.id, input.worksheet),
      eq(worksheets.buildId, build.id),
      isNotNull(worksheets.deletedAt),
    );
    const [stored] = await db
      .select({ id: worksheets.id, title: worksheets.title })
      .from(worksheets)
      .where(deleted);
    if (!stored) throw new NotFound('This worksheet');
    const [saved] = await db
      .update(worksheets)
      .set({ deletedAt: null, version: sql`${worksheets.version} + 1`, updatedAt: now })
      .where(and(deleted, eq(worksheets.version, input.version)))
      .returning({ id: worksheets.id, version: worksheets.version });
    if (!saved) throw new Conflict(stored);
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
