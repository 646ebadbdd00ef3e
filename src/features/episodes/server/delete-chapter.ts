import { setChapterDeleted } from './set-chapter-deleted.ts';
import { verb } from '../../../server/verb.ts';
import { type ChapterRef } from './lock-chapter.ts';

/** Deletes a chapter; for 30 days restoring it is the inverse. @throws Conflict with the stored chapter */
export const deleteChapter = verb({ may: 'draft-note.change' }, (context, input: ChapterRef) =>
  setChapterDeleted(context, input, context.now),
);
