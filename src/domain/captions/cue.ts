/** A caption: shown from start up to, not including, end, both whole milliseconds from the start of the video. */
export interface Cue {
  readonly start: number;
  readonly end: number;
  /** Plain text, without tags and escapes; none of the lines is empty. */
  readonly lines: readonly string[];
  /** Who speaks, where the file says so. */
  readonly voice?: string;
  /** When words begin, where the file says so, as the captions of video hosts do. */
  readonly stamps?: readonly Stamp[];
}

/** The words from a character on are spoken from a moment on. */
export interface Stamp {
  /** Counted from 0 in the lines joined by line feeds. */
  readonly character: number;
  /** Milliseconds from the start of the video. */
  readonly time: number;
}

/**
 * What a captions file may hold. Our own limits: ten hours of talk are about 15 000 captions and 1.5 MB.
 */
export const CAPTIONS_LIMITS = { bytes: 4 * 1024 * 1024, cues: 20_000, cueCharacters: 2_000 } as const;

/**
 * The caption that shows at an instant: the one that began last, where several do. Null between captions.
 * @param cues sorted by start
 * @param time milliseconds
 */
export function cueAt(cues: readonly Cue[], time: number): Cue | null {
  return cues.findLast((cue) => cue.start <= time && time < cue.end) ?? null;
}

/** Captions in the order in which they show; of two that begin together, the longer first. */
export function sortCues(cues: readonly Cue[]): Cue[] {
  return [...cues].sort((a, b) => a.start - b.start || b.end - a.end);
}
