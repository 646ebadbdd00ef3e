import { newId } from '../../../db/columns.ts';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type AddWorksheet } from '../worksheet.ts';
import { findOwner } from './find-owner.ts';

/** Keeps a worksheet with a build. @throws Invalid at `of` for what is not of the build */
export const addWorksheet = verb(
  { may: 'worksheet.change' },
  async (context, input: AddWorksheet & { readonly build: string }) => {
    const { db, workshop, actor } = context;
    const build = await loadBuild(context, input.build);
    const { sheet, title, inputs, visibility } = input;
    const id = newId();
    await db.insert(worksheets).values({
      id,
      workshopId: workshop.id,
      buildId: build.id,
      sheet,
      title,
      inputs,
      visibility,
      ...(await findOwner(context, build.id, input.of)),
      writtenBy: actor.kind === 'account' ? actor.id : null,
    });
    await announcePageChanges(db, [`build:${build.id}`]);
    return { id, version: 1 };
  },
);
