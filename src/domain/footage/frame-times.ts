import { type Rate } from '../time/rate.ts';

/** Frames whose times are kept one by one; of a film with more of them none are. Our own limit. */
export const MOST_FRAME_TIMES = 1_000_000;

/** The average rate of frames that begin at these milliseconds, two or more. */
export function averageOf(times: readonly number[]): Rate {
  return { num: (times.length - 1) * 1e6, den: Math.round((times.at(-1) ?? 0) * 1000) };
}

/** How far from an even beat a frame may begin, in frames: so far, counting comes to the same frame. */
const UNEVEN = 0.5;

/**
 * When the frames of a film begin, in the order they are shown.
 * @param seconds of each frame by the film's own clock, in any order: a file keeps them in the order they are decoded
 * @returns milliseconds since the first, to the microsecond; null where they come evenly
 */
export function frameTimesOf(seconds: readonly number[]): readonly number[] | null {
  const shown = Float64Array.from(seconds).sort();
  const [first, last] = [shown.at(0), shown.at(-1)];
  if (first === undefined || last === undefined || last === first) return null;
  const beat = (last - first) / (shown.length - 1);
  const even = shown.every((at, index) => Math.abs(at - first - index * beat) <= UNEVEN * beat);
  return even ? null : Array.from(shown, (at) => Math.round((at - first) * 1e6) / 1e3);
}
