import { and, eq, sql } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { Conflict } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type ChangeEntry } from '../diary.ts';
import { findStage } from './find-stage.ts';
import { loadEntry } from './load-entry.ts';
import { writePhotos } from './write-photos.ts';

/** Changes a diary entry. @throws Conflict with the stored entry when it changed since it was read */
export const changeEntry = verb(
  { may: 'diary.change' },
  async (context, input: ChangeEntry & { readonly build: string; readonly entry: string }) => {
    const { db, now } = context;
    const build = await loadBuild(context, input.build);
    const stored = await loadEntry(context, build.id, input.entry);
    const stageId = await findStage(context, build.id, input.stage);
    const [saved] = await db
      .update(diaryEntries)
      .set({
        day: input.day,
        stageId,
        text: input.text,
        visibility: input.visibility,
        version: sql`${diaryEntries.version} + 1`,
        updatedAt: now,
      })
      .where(and(eq(diaryEntries.id, stored.id), eq(diaryEntries.version, input.version)))
      .returning({ id: diaryEntries.id, version: diaryEntries.version });
    if (!saved) {
      throw new Conflict(
        stored,
        'Someone else saved this entry in the meantime. What you wrote is kept below, beside what is stored; look it over and save again.',
      );
    }
    await writePhotos(context, { id: stored.id, buildId: build.id }, input.photos);
    await announcePageChanges(db, [`build:${build.id}`]);
    return saved;
  },
);
