/** A named stretch of an episode: it runs until the next one begins, or the video ends. */
export interface Chapter {
  /** Whole milliseconds from the start of the video. */
  readonly start: number;
  readonly title: string;
}

/**
 * What video hosts ask of chapters in a description before they show them. Common practice of such hosts, read
 * from several of their help pages; no standard says it.
 */
export const CHAPTER_RULES = { least: 3, shortestMilliseconds: 10_000 } as const;

/** The longest title, in characters. Our own limit: hosts cut titles between about 50 and 100. */
export const CHAPTER_TITLE_LENGTH = 100;

/**
 * The chapter that holds an instant: its index, or null before the first.
 * @param chapters in rising order
 * @param time whole milliseconds
 */
export function chapterAt(chapters: readonly { readonly start: number }[], time: number): number | null {
  const index = chapters.findLastIndex((chapter) => chapter.start <= time);
  return index === -1 ? null : index;
}
