import { formatTimecode } from '../../../src/domain/time/timecode.ts';

export const RATE = { num: 25, den: 1 };

/** Segments and notes; the last is the largest edit that is thought of. */
export const SIZES = [
  [500, 2500],
  [1000, 5000],
  [2000, 10_000],
] as const;

export const CLIPS = 40;
export const CLIP_FRAMES = 60_000;

/** The events of a list of cuts of 1 to 4 s, taken from a few long clips in no order. The same ones each time. */
export function cutList(segments: number): string[] {
  let at = 0;
  return Array.from({ length: segments }, (_none, index) => {
    const length = 25 + ((index * 37) % 75);
    const from = (index * 7919) % (CLIP_FRAMES - 100);
    const times = [from, from + length, at, at + length].map((frame) => formatTimecode(frame, RATE));
    at += length;
    return `${String(index + 1)} C${String(index % CLIPS)} V C ${times.join(' ')}`;
  });
}
