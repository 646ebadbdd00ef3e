import { verb } from '../../../server/verb.ts';
import { type ChapterRef } from './lock-chapter.ts';
import { setChapterDeleted } from './set-chapter-deleted.ts';

/** Brings a deleted chapter back. @throws Conflict with the stored chapter */
export const restoreChapter = verb({ may: 'draft-note.change' }, (context, input: ChapterRef) =>
  setChapterDeleted(context, input, null),
);
