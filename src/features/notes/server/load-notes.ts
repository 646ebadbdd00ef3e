import { and, asc, eq, inArray, isNull, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { accounts } from '../../../db/schema/accounts.ts';
import { anchors, noteParts, notes } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { type Note } from '../note.ts';
import {
  type EpisodeView,
  inEpisodeOrder,
  mainPlace,
  sayPlaces,
  shownIn,
  standsAt,
  toldIn,
} from './episode-view.ts';

const writers = alias(accounts, 'writers');

/**
 * Notes with their parts, in the order of the episode.
 * @param view whose places they are shown at
 * @param where which notes; deleted ones only when it says so itself
 */
export async function loadNotes(db: Database, view: EpisodeView, where: SQL | undefined): Promise<Note[]> {
  const rows = await db
    .select({ note: notes, anchor: anchors, place: places, asked: accounts.name, writtenBy: writers.name })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(places, mainPlace(view))
    .leftJoin(accounts, eq(accounts.id, notes.askedId))
    .leftJoin(writers, eq(writers.id, notes.writtenBy))
    .where(where);
  const partsOf = await loadPartIds(
    db,
    rows.map(({ note }) => note.id),
  );
  const placeOf = await sayPlaces(db, view, rows);
  const loaded = rows.map(({ note, anchor, place, asked, writtenBy }) => ({
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
    position: standsAt(view, anchor, place),
    place: placeOf(anchor.id),
    writtenBy,
  }));
  return inEpisodeOrder(loaded);
}

/** The notes that a view of an episode shows and that are not deleted. */
export function ofEpisode(view: EpisodeView): SQL | undefined {
  return and(shownIn(view), isNull(notes.deletedAt));
}

/** The same with those that are not in its edit. */
export function ofDesk(view: EpisodeView): SQL | undefined {
  return and(toldIn(view), isNull(notes.deletedAt));
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
