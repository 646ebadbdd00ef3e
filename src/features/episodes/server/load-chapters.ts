import { and, asc, eq, isNull, type SQL } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { anchors, chapters } from '../../../db/schema/notes.ts';
import { positionOf } from '../../notes/note.ts';
import { type Chapter } from '../episode.ts';

/** The chapters of an episode, in its order. */
export function loadChapters(db: Database, episodeId: string): Promise<Chapter[]> {
  return loadChaptersWhere(db, and(eq(chapters.episodeId, episodeId), isNull(chapters.deletedAt)));
}

/** Chapters by any condition; deleted ones too, unless it says otherwise. */
export async function loadChaptersWhere(db: Database, where: SQL | undefined): Promise<Chapter[]> {
  const rows = await db
    .select({ chapter: chapters, anchor: anchors })
    .from(chapters)
    .innerJoin(anchors, eq(anchors.id, chapters.anchorId))
    .where(where)
    .orderBy(asc(anchors.frame), asc(chapters.id));
  return rows.map(({ chapter, anchor }) => ({
    id: chapter.id,
    version: chapter.version,
    title: chapter.title,
    position: positionOf(anchor),
  }));
}
