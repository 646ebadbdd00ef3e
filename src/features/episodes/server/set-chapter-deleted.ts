import { eq } from 'drizzle-orm';
import { chapters } from '../../../db/schema/notes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { announceEpisode } from './announce-episode.ts';
import { type ChapterRef, lockChapter } from './lock-chapter.ts';

/** Deletes a chapter or brings it back, as its next version. */
export async function setChapterDeleted(context: WorkshopContext, ref: ChapterRef, deletedAt: Date | null) {
  const { episode, row, shown } = await lockChapter(context, ref);
  await context.db
    .update(chapters)
    .set({ deletedAt, version: row.version + 1, updatedAt: context.now })
    .where(eq(chapters.id, row.id));
  await announceEpisode(context, episode);
  return { ...shown, version: row.version + 1 };
}
