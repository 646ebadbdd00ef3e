import { formatClock } from '../time/format-clock.ts';
import { CHAPTER_RULES, CHAPTER_TITLE_LENGTH, type Chapter } from './chapter.ts';

/**
 * order, title and end make any list of chapters wrong; first, few and short only keep hosts from showing it.
 */
export type ChapterRule = 'order' | 'title' | 'end' | 'first' | 'few' | 'short';

export interface ChapterFault {
  readonly rule: ChapterRule;
  readonly sentence: string;
  /** Which chapter, counted from 0; null for the list as a whole. */
  readonly index: number | null;
}

const clock = (milliseconds: number) => formatClock(milliseconds / 1000);

/**
 * What is wrong with the chapters of an episode, as sentences.
 * @param chapters as listed, starts in whole milliseconds
 * @param length of the video in milliseconds; null while it is not known
 */
export function checkChapters(chapters: readonly Chapter[], length: number | null): ChapterFault[] {
  const faults: ChapterFault[] = [];
  const first = chapters[0];
  if (first !== undefined && first.start !== 0)
    faults.push({
      rule: 'first',
      index: 0,
      sentence: `The first chapter starts at ${clock(first.start)}, not at 0:00.`,
    });
  if (chapters.length < CHAPTER_RULES.least)
    faults.push({ rule: 'few', index: null, sentence: sayFew(chapters.length) });
  chapters.forEach((chapter, index) => faults.push(...checkOne(chapter, index, chapters, length)));
  return faults;
}

function sayFew(count: number): string {
  const there = ['There are no chapters', 'There is one chapter', 'There are two chapters'][count] ?? '';
  return `${there}; video hosts show them from three on.`;
}

function checkOne(
  { start, title }: Chapter,
  index: number,
  chapters: readonly Chapter[],
  length: number | null,
): ChapterFault[] {
  const faults: ChapterFault[] = [];
  const say = (rule: ChapterRule, sentence: string) => faults.push({ rule, index, sentence });
  const name = title.trim() === '' ? `The chapter at ${clock(start)}` : `“${title}”`;
  if (title.trim() === '') say('title', `${name} has no title.`);
  if (title.length > CHAPTER_TITLE_LENGTH)
    say('title', `The title at ${clock(start)} is longer than ${String(CHAPTER_TITLE_LENGTH)} characters.`);
  const before = chapters[index - 1];
  if (before !== undefined && start <= before.start)
    say('order', `${name} starts at ${clock(start)}, which is not after the chapter before it.`);
  if (length !== null && start >= length)
    say('end', `${name} starts at ${clock(start)}, after the video has ended.`);
  const end = chapters[index + 1]?.start ?? length;
  if (end !== null && end > start && end - start < CHAPTER_RULES.shortestMilliseconds)
    say('short', `${name} at ${clock(start)} is shorter than 10 seconds.`);
  return faults;
}
