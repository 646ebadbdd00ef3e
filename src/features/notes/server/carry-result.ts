import { noteResults } from '../../../db/schema/notes.ts';
import { Invalid } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from '../../worksheets/server/load-worksheets.ts';
import { workOut } from '../../worksheets/work-out.ts';
import { type CarryResult } from '../note-result.ts';
import { requireMayCarry } from './require-may-carry.ts';

type Input = CarryResult & { readonly build: string; readonly worksheet: string };

/**
 * Lets a note carry a result of a worksheet, as it is now; it takes the place of another that it carried.
 * @throws Invalid for a note or a result that is not there, Forbidden where the number is one that viewers build from
 */
export const carryResult = verb({ may: 'worksheet.change' }, async (context, input: Input) => {
  const { db, workshop } = context;
  const build = await loadBuild(context, input.build);
  const worksheet = await loadWorksheet(context, build.id, input.worksheet);
  const said = workOut(worksheet).get(input.what);
  if (said === undefined)
    throw new Invalid({ what: 'The worksheet has no such result now. Choose another.' });
  await requireMayCarry(context, build.id, input.note);
  const carried = { worksheetId: worksheet.id, what: input.what, said };
  await db
    .insert(noteResults)
    .values({ workshopId: workshop.id, noteId: input.note, ...carried })
    .onConflictDoUpdate({ target: noteResults.noteId, set: carried });
  await announcePageChanges(db, [`build:${build.id}`]);
  return { note: input.note };
});
