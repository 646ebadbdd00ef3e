import { and, desc, eq, lt, type SQL } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { editClips, edits } from '../../../db/schema/episodes.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { fromEditRecord } from '../../../domain/edit/edit-record.ts';
import { type EditSource } from '../../../domain/edit/edit-sources.ts';

/** A version of an episode's edit, with the footage that its names stand for. */
export interface StoredEdit {
  readonly id: string;
  readonly episodeId: string;
  readonly number: number;
  readonly source: EditSource;
  readonly sourceName: string;
  readonly takenAt: Date;
  readonly edit: Edit;
  /** By the name that the edit has for a clip; null where it was said that it is none of the footage. */
  readonly clipIds: ReadonlyMap<string, string | null>;
}

/** The edit that the draft of an episode has: the newest, or none. */
export function findDraftEdit(db: Database, episodeId: string): Promise<StoredEdit | null> {
  return findEdit(db, eq(edits.episodeId, episodeId));
}

/** An edit by its id. */
export function findEditById(db: Database, id: string): Promise<StoredEdit | null> {
  return findEdit(db, eq(edits.id, id));
}

/** The edit that an episode had before one of its edits. */
export function findEditBefore(
  db: Database,
  { episodeId, number }: Pick<StoredEdit, 'episodeId' | 'number'>,
): Promise<StoredEdit | null> {
  return findEdit(db, and(eq(edits.episodeId, episodeId), lt(edits.number, number)));
}

/** The edit whose timeline an episode had before it had any edit. */
export function findFirstEdit(db: Database, episodeId: string): Promise<StoredEdit | null> {
  return findEdit(db, and(eq(edits.episodeId, episodeId), eq(edits.number, 1)));
}

async function findEdit(db: Database, where: SQL | undefined): Promise<StoredEdit | null> {
  const [row] = await db.select().from(edits).where(where).orderBy(desc(edits.number)).limit(1);
  if (!row) return null;
  const matches = await db
    .select({ name: editClips.name, clipId: editClips.clipId })
    .from(editClips)
    .where(eq(editClips.editId, row.id));
  const { id, episodeId, number, source, sourceName, createdAt, record } = row;
  return {
    id,
    episodeId,
    number,
    source,
    sourceName,
    takenAt: createdAt,
    edit: fromEditRecord(record),
    clipIds: new Map(matches.map(({ name, clipId }) => [name, clipId])),
  };
}
