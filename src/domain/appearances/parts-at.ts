import { type Appearance } from './appearance.ts';

/** How many parts are shown at once: what a narrow screen holds beside the video. Our own choice. */
export const MOST_PARTS = 4;

/** A part that stands on the bench, or stood there earlier in the chapter. */
export interface PartAt {
  readonly partId: string;
  /** It is in view at this very frame. */
  readonly filled: boolean;
  /** The frame at which it last came into view. */
  readonly since: number;
}

/**
 * The parts to show at a frame: those in view, newest first, then those that came into view earlier in the same
 * chapter, newest first; four at most, each once, and never one that is still to come. Runs in the browser too.
 * @param frame of the same rate as the appearances and chapters
 * @param chapterStarts first frames of the chapters, in any order; with none, the whole episode is one
 */
export function partsAt(
  frame: number,
  appearances: readonly Appearance[],
  chapterStarts: readonly number[] = [],
): PartAt[] {
  const chapter = Math.max(Number.NEGATIVE_INFINITY, ...chapterStarts.filter((start) => start <= frame));
  const latest = new Map<string, PartAt>();
  for (const { partId, from, to } of appearances) {
    const filled = frame < to;
    if (from > frame || (!filled && from < chapter)) continue;
    const known = latest.get(partId);
    latest.set(partId, {
      partId,
      filled: filled || known?.filled === true,
      since: Math.max(from, known?.since ?? from),
    });
  }
  return [...latest.values()]
    .sort((a, b) => Number(b.filled) - Number(a.filled) || b.since - a.since)
    .slice(0, MOST_PARTS);
}
