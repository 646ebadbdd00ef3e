import { and, eq, sql } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadEntry } from './load-entry.ts';

/** Deletes a diary entry; its photos stay with the build. @throws Conflict when it changed since it was read */
export const deleteEntry = verb(
  { may: 'diary.change' },
  async (context, input: { readonly build: string; readonly entry: string; readonly version: number }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadEntry(context, build.id, input.entry);
    const [deleted] = await db
      .update(diaryEntries)
      .set({ deletedAt: now, version: sql`${diaryEntries.version} + 1`, updatedAt: now })
      .where(and(eq(diaryEntries.id, stored.id), eq(diaryEntries.version, input.version)))
      .returning({ id: diaryEntries.id, version: diaryEntries.version });
    if (!deleted) {
      throw new Conflict(stored, 'Someone else saved this entry in the meantime. It was not deleted.');
    }
    await announcePageChanges(db, [`build:${build.id}`]);
    return deleted;
  },
);
