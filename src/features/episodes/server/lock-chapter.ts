import { and, eq } from 'drizzle-orm';
import { chapters } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { loadChaptersWhere } from './load-chapters.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

export type ChapterRef = EpisodeRef & { readonly chapter: string; readonly version: number };

/** A chapter, locked for the change that follows. @throws NotFound, Conflict with the stored chapter */
export async function lockChapter(context: WorkshopContext, ref: ChapterRef) {
  const { episode } = await loadEpisode(context, ref);
  const [row] = await context.db
    .select()
    .from(chapters)
    .where(and(eq(chapters.id, ref.chapter), eq(chapters.episodeId, episode.id)))
    .for('update');
  const view = await findDraftView(context.db, episode.id);
  const [shown] = await loadChaptersWhere(context.db, view, eq(chapters.id, ref.chapter));
  if (!row || !shown) throw new NotFound('This chapter');
  if (row.version !== ref.version) throw new Conflict({ ...shown, deleted: row.deletedAt !== null });
  return { episode, row, shown, view };
}
