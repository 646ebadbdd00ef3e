import { eq } from 'drizzle-orm';
import { anchors, chapters } from '../../../db/schema/notes.ts';
import { type Position } from '../../../domain/positions.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceEpisode } from './announce-episode.ts';
import { loadChaptersWhere } from './load-chapters.ts';
import { type ChapterRef, lockChapter } from './lock-chapter.ts';

type Input = ChapterRef & { readonly title: string; readonly position: Position };

/** Renames or moves a chapter. @throws Conflict with the stored chapter */
export const changeChapter = verb({ may: 'draft-note.change' }, async (context, input: Input) => {
  const { db, now } = context;
  const { episode, row, shown } = await lockChapter(context, input);
  if (row.deletedAt !== null) throw new NotFound('This chapter');
  const { frame, rate } = input.position;
  await db
    .update(anchors)
    .set({ frame, rateNum: rate.num, rateDen: rate.den })
    .where(eq(anchors.id, row.anchorId));
  await db
    .update(chapters)
    .set({ title: input.title, version: row.version + 1, updatedAt: now })
    .where(eq(chapters.id, row.id));
  await announceEpisode(context, episode);
  const [chapter] = await loadChaptersWhere(db, eq(chapters.id, row.id));
  return chapter ?? shown;
});
