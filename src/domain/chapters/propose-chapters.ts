import { CHAPTER_RULES, CHAPTER_TITLE_LENGTH, type Chapter } from './chapter.ts';

/** A moment of the episode that belongs to a stage of the build. */
export interface StageMoment {
  /** Whole milliseconds from the start of the video. */
  readonly at: number;
  /** The stage's title. */
  readonly stage: string;
}

/**
 * Chapters where the stage of the notes changes, to be taken or changed. A stage that is touched for less than ten
 * seconds makes none; the first chapter begins with the video.
 * @param moments of the notes that have a stage, in any order
 * @param length of the video in whole milliseconds; null while it is not known
 */
export function proposeChapters(moments: readonly StageMoment[], length: number | null): Chapter[] {
  const sorted = [...moments].sort((a, b) => a.at - b.at);
  const chapters: Chapter[] = [];
  for (const { at, stage } of sorted) {
    const title = stage.slice(0, CHAPTER_TITLE_LENGTH).trim();
    const last = chapters.at(-1);
    if (title === '' || last?.title === title || (length !== null && at >= length)) continue;
    if (last !== undefined && at - last.start < CHAPTER_RULES.shortestMilliseconds) {
      chapters.pop();
      if (chapters.at(-1)?.title !== title) chapters.push({ start: last.start, title });
    } else chapters.push({ start: last === undefined ? 0 : at, title });
  }
  const end = chapters.at(-1);
  if (
    end !== undefined &&
    chapters.length > 1 &&
    length !== null &&
    length - end.start < CHAPTER_RULES.shortestMilliseconds
  )
    chapters.pop();
  return chapters;
}
