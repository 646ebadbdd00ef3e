import { and, eq, sql } from 'drizzle-orm';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from './load-worksheets.ts';

/** Deletes a worksheet; it can be brought back for 30 days. @throws Conflict when it changed since it was read */
export const deleteWorksheet = verb(
  { may: 'worksheet.change' },
  async (
    context,
    input: { readonly build: string; readonly worksheet: string; readonly version: number },
  ) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadWorksheet(context, build.id, input.worksheet);
    const [deleted] = await db
      .update(worksheets)
      .set({ deletedAt: now, version: sql`${worksheets.version} + 1`, updatedAt: now })
      .where(and(eq(worksheets.id, stored.id), eq(worksheets.version, input.version)))
      .returning({ id: worksheets.id, version: worksheets.version });
    if (!deleted) {
      throw new Conflict(stored, 'Someone else saved this worksheet in the meantime. It was not deleted.');
    }
    await announcePageChanges(db, [`build:${build.id}`]);
    return deleted;
  },
);
