import { and, eq, isNotNull, sql } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** Brings a deleted diary entry back. @throws NotFound, or Conflict when it is not as it was deleted */
export const restoreEntry = verb(
  { may: 'diary.change' },
  async (context, input: { readonly build: string; readonly entry: string; readonly version: number }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const deleted = and(
      eq(diaryEntries.id, input.entry),
      eq(diaryEntries.buildId, build.id),
      isNotNull(diaryEntries.deletedAt),
    );
    const [stored] = await db
      .select({ id: diaryEntries.id, text: diaryEntries.text })
      .from(diaryEntries)
      .where(deleted);
    if (!stored) throw new NotFound('This diary entry');
    const [saved] = await db
      .update(diaryEntries)
      .set({ deletedAt: null, version: sql`${diaryEntries.version} + 1`, updatedAt: now })
      .where(and(deleted, eq(diaryEntries.version, input.version)))
      .returning({ id: diaryEntries.id, version: diaryEntries.version });
    if (!saved) throw new Conflict(stored);
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
