import { and, eq, sql } from 'drizzle-orm';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type ChangeWorksheet } from '../worksheet.ts';
import { findOwner } from './find-owner.ts';
import { loadWorksheet } from './load-worksheets.ts';

/** Changes a kept worksheet. @throws Conflict with the stored one when it changed since it was read */
export const changeWorksheet = verb(
  { may: 'worksheet.change' },
  async (context, input: ChangeWorksheet & { readonly build: string; readonly worksheet: string }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadWorksheet(context, build.id, input.worksheet);
    const { title, inputs, visibility } = input;
    const [saved] = await db
      .update(worksheets)
      .set({
        title,
        inputs,
        visibility,
        ...(await findOwner(context, build.id, input.of)),
        version: sql`${worksheets.version} + 1`,
        updatedAt: now,
      })
      .where(and(eq(worksheets.id, stored.id), eq(worksheets.version, input.version)))
      .returning({ id: worksheets.id, version: worksheets.version });
    if (!saved) {
      throw new Conflict(
        stored,
        'Someone else saved this worksheet in the meantime. What you typed is kept below; look at theirs and save again.',
      );
    }
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
