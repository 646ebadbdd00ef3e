import { and, eq } from 'drizzle-orm';
import { noteResults } from '../../../db/schema/notes.ts';
import { NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from '../../worksheets/server/load-worksheets.ts';
import { requireMayCarry } from './require-may-carry.ts';

interface Input {
  readonly build: string;
  readonly worksheet: string;
  readonly note: string;
}

/** Takes the result of a worksheet off a note. @throws NotFound where the note carries none of it */
export const dropResult = verb({ may: 'worksheet.change' }, async (context, input: Input) => {
  const { db } = context;
  const build = await loadBuild(context, input.build);
  const worksheet = await loadWorksheet(context, build.id, input.worksheet);
  await requireMayCarry(context, build.id, input.note);
  const dropped = await db
    .delete(noteResults)
    .where(and(eq(noteResults.noteId, input.note), eq(noteResults.worksheetId, worksheet.id)))
    .returning({ note: noteResults.noteId });
  if (dropped.length === 0) throw new NotFound('This result');
  await announcePageChanges(db, [`build:${build.id}`]);
  return { note: input.note };
});
