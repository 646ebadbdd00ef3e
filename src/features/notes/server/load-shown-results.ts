import { and, eq, inArray, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { noteResults } from '../../../db/schema/notes.ts';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { type ShownResult } from '../note-result.ts';

/** The results that notes carry, by note, as viewers see them. */
export async function loadShownResults(
  db: Database,
  noteIds: readonly string[],
): Promise<ReadonlyMap<string, ShownResult>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db
    .select({
      note: noteResults.noteId,
      what: noteResults.what,
      said: noteResults.said,
      id: worksheets.id,
      title: worksheets.title,
      visibility: worksheets.visibility,
    })
    .from(noteResults)
    .innerJoin(worksheets, and(eq(worksheets.id, noteResults.worksheetId), isNull(worksheets.deletedAt)))
    .where(inArray(noteResults.noteId, [...noteIds]));
  return new Map(
    rows.map(({ note, what, said, id, title, visibility }) => [
      note,
      { what, said, worksheet: visibility === 'public' ? { id, title } : null },
    ]),
  );
}
