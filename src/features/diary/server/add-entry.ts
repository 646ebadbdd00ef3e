import { newId } from '../../../db/columns.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type AddEntry } from '../diary.ts';
import { findStage } from './find-stage.ts';
import { writePhotos } from './write-photos.ts';

/** Writes a diary entry. @throws Invalid at `stage` or `photos` for what is not of the build */
export const addEntry = verb(
  { may: 'diary.change' },
  async (context, input: AddEntry & { readonly build: string }) => {
    const { db, workshop, actor } = context;
    const build = await loadBuild(context, input.build);
    const id = newId();
    await db.insert(diaryEntries).values({
      id,
      workshopId: workshop.id,
      buildId: build.id,
      stageId: await findStage(context, build.id, input.stage),
      day: input.day,
      text: input.text,
      visibility: input.visibility,
      writtenBy: actor.kind === 'account' ? actor.id : null,
    });
    await writePhotos(context, { id, buildId: build.id }, input.photos);
    await announcePageChanges(db, [`build:${build.id}`]);
    return { id, version: 1 };
  },
);
