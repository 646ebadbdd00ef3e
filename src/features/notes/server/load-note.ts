import { and, eq } from 'drizzle-orm';
import { anchors, notes, noteVersions } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { places } from '../../../db/schema/places.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { type Note } from '../note.ts';
import { type EpisodeOfNotes } from './load-episode.ts';
import { findDraftView, mainPlace, writtenAt } from './episode-view.ts';
import { loadNotes } from './load-notes.ts';

/**
 * A note of an episode as stored, locked for the change that follows, with its presentation.
 * @throws NotFound for one that the reader may not see either, or Conflict with the stored note, and whether it is
 *   deleted, when it is not at the version that the change names
 */
export async function loadNoteAt(
  context: WorkshopContext,
  episode: EpisodeOfNotes,
  { note: id, version }: { readonly note: string; readonly version: number },
) {
  const { db, workshop } = context;
  const view = await findDraftView(db, episode.id);
  const [row] = await db
    .select({ note: notes })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(places, mainPlace(view))
    .where(and(eq(notes.id, id), eq(notes.workshopId, workshop.id), writtenAt(view)))
    .for('update', { of: notes });
  if (!row || !maySee(context, row.note)) throw new NotFound('This note');
  const [shown] = await loadNotes(db, view, eq(notes.id, id));
  if (!shown) throw new NotFound('This note');
  if (row.note.version !== version) throw new Conflict({ ...shown, deleted: row.note.deletedAt !== null });
  return { row: row.note, shown, view };
}

/**
 * The same of a note that is not deleted.
 * @throws NotFound, Conflict
 */
export async function loadStandingNoteAt(...asked: Parameters<typeof loadNoteAt>) {
  const found = await loadNoteAt(...asked);
  if (found.row.deletedAt !== null) throw new NotFound('This note');
  return found;
}

/** What is asked of one person is for them, who asked, and the owner. */
export function maySee({ actor, role }: WorkshopContext, note: typeof notes.$inferSelect): boolean {
  if (note.audience !== 'person' || role === 'owner') return true;
  return actor.kind === 'account' && (note.askedId === actor.id || note.writtenBy === actor.id);
}

/** Keeps what a note said, before it is changed. */
export async function keepVersion({ db, workshop, actor, now }: WorkshopContext, note: Note): Promise<void> {
  const { id, version, place: _place, ...fields } = note;
  await db.insert(noteVersions).values({
    workshopId: workshop.id,
    noteId: id,
    version,
    fields,
    changedBy: actor.kind === 'account' ? actor.id : null,
    changedAt: now,
  });
}
