import { eq } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { type Note } from '../note.ts';
import { type EpisodeView } from './episode-view.ts';
import { loadNotes } from './load-notes.ts';

type Row = typeof notes.$inferSelect;

/** Sets columns of a note as its next version. */
export async function setNote(
  { db, now }: WorkshopContext,
  view: EpisodeView,
  row: Row,
  columns: Partial<Pick<Row, 'deletedAt' | 'answer' | 'answeredAt' | 'proposed'>>,
): Promise<Note> {
  await db
    .update(notes)
    .set({ ...columns, version: row.version + 1, updatedAt: now })
    .where(eq(notes.id, row.id));
  const [note] = await loadNotes(db, view, eq(notes.id, row.id));
  if (!note) throw new Error('The note was not kept.');
  return note;
}
