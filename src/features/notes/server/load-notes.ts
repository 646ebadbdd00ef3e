import { and, asc, eq, inArray, isNull, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { accounts } from '../../../db/schema/accounts.ts';
import { anchors, noteParts, notes } from '../../../db/schema/notes.ts';
import { type Note, positionOf } from '../note.ts';

const writers = alias(accounts, 'writers');

/**
 * Notes with their parts, in the order of the episode.
 * @param where which notes; deleted ones only when it says so itself
 */
export async function loadNotes(db: Database, where: SQL | undefined): Promise<Note[]> {
  const rows = await db
    .select({ note: notes, anchor: anchors, asked: accounts.name, writtenBy: writers.name })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(accounts, eq(accounts.id, notes.askedId))
    .leftJoin(writers, eq(writers.id, notes.writtenBy))
    .where(where)
    .orderBy(asc(anchors.frame), asc(notes.id));
  const partsOf = await loadPartIds(
    db,
    rows.map(({ note }) => note.id),
  );
  return rows.map(({ note, anchor, asked, writtenBy }) => ({
    id: note.id,
    version: note.version,
    kind: note.kind,
    text: note.text,
    audience: note.audience,
    asked: note.askedId === null ? null : { id: note.askedId, name: asked ?? '' },
    answer: note.answer,
    standing: note.standing,
    topic: note.topic,
    proposed: note.proposed,
    partIds: partsOf.get(note.id) ?? [],
    position: positionOf(anchor),
    writtenBy,
  }));
}

/** The notes of an episode that are not deleted. */
export function ofEpisode(episodeId: string): SQL | undefined {
  return and(eq(anchors.episodeId, episodeId), isNull(notes.deletedAt));
}

async function loadPartIds(db: Database, noteIds: readonly string[]): Promise<Map<string, string[]>> {
  const byNote = new Map<string, string[]>();
  if (noteIds.length === 0) return byNote;
  const rows = await db
    .select({ noteId: noteParts.noteId, partId: noteParts.partId })
    .from(noteParts)
    .where(inArray(noteParts.noteId, [...noteIds]))
    .orderBy(asc(noteParts.position));
  for (const { noteId, partId } of rows) byNote.set(noteId, [...(byNote.get(noteId) ?? []), partId]);
  return byNote;
}
