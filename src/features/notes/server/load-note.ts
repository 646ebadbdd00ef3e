import { and, eq } from 'drizzle-orm';
import { anchors, notes, noteVersions } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { type Note } from '../note.ts';
import { type EpisodeOfNotes } from './load-episode.ts';
import { loadNotes } from './load-notes.ts';

/**
 * A note of an episode as stored, locked for the change that follows, with its presentation.
 * @throws NotFound, or Conflict with the stored note when it is not at the version that the change names
 */
export async function loadNoteAt(
  { db, workshop }: WorkshopContext,
  episode: EpisodeOfNotes,
  { note: id, version }: { readonly note: string; readonly version: number },
) {
  const [row] = await db
    .select({ note: notes })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .where(and(eq(notes.id, id), eq(notes.workshopId, workshop.id), eq(anchors.episodeId, episode.id)))
    .for('update', { of: notes });
  if (!row) throw new NotFound('This note');
  const [shown] = await loadNotes(db, eq(notes.id, id));
  if (!shown) throw new NotFound('This note');
  if (row.note.version !== version) throw new Conflict(shown);
  return { row: row.note, shown };
}

/** Keeps what a note said, before it is changed. */
export async function keepVersion({ db, workshop, actor, now }: WorkshopContext, note: Note): Promise<void> {
  const { id, version, ...fields } = note;
  await db.insert(noteVersions).values({
    workshopId: workshop.id,
    noteId: id,
    version,
    fields,
    changedBy: actor.kind === 'account' ? actor.id : null,
    changedAt: now,
  });
}
