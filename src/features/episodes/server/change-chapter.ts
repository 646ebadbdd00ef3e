import { eq } from 'drizzle-orm';
import { chapters } from '../../../db/schema/notes.ts';
import { type Position } from '../../../domain/positions.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceEpisode } from './announce-episode.ts';
import { isInEdit } from '../../notes/note.ts';
import { moveAnchor } from '../../notes/server/write-anchor.ts';
import { loadChaptersWhere } from './load-chapters.ts';
import { type ChapterRef, lockChapter } from './lock-chapter.ts';

type Input = ChapterRef & { readonly title: string; readonly position: Position };

/** Renames or moves a chapter. @throws Conflict with the stored chapter */
export const changeChapter = verb({ may: 'draft-note.change' }, async (context, input: Input) => {
  const { db, now } = context;
  const { episode, row, shown, view } = await lockChapter(context, input);
  if (row.deletedAt !== null) throw new NotFound('This chapter');
  const stands = isInEdit(shown) ? shown.position : null;
  await moveAnchor(context, episode, row.anchorId, { ...input.position, endFrame: null }, stands);
  await db
    .update(chapters)
    .set({ title: input.title, version: row.version + 1, updatedAt: now })
    .where(eq(chapters.id, row.id));
  await announceEpisode(context, episode);
  const [chapter] = await loadChaptersWhere(db, view, eq(chapters.id, row.id));
  return chapter ?? shown;
});
