import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { type Edit, rateOf } from './edit.ts';
import { sayFrames, sayRate } from './say-frames.ts';

/** How long a video is, and whether a person typed that to a second. */
export interface VideoLength {
  readonly seconds: number;
  readonly rate: Rate;
  readonly typed: boolean;
}

/** Sound may run a frame past the picture in a file; a typed length is a whole second. Our own choice. */
const FRAMES_APART = 1;
const TYPED_SECONDS_APART = 1;

/**
 * Whether an edit and the video made from it are equally long.
 * @returns a sentence with both lengths in time and frames of the edit; null where they agree
 */
export function sayLengthsApart(
  { frames, rate, drop }: Pick<Edit, 'frames' | 'rate' | 'drop'>,
  video: VideoLength,
): string | null {
  const inVideo = new Fraction(Math.round(video.seconds * 1e6), 1_000_000).mul(rateOf(rate));
  const apart = frames.sub(inVideo);
  const allowed = video.typed
    ? rateOf(rate).mul(TYPED_SECONDS_APART)
    : new Fraction(FRAMES_APART).add(new Fraction(1, 1000));
  if (apart.abs().compare(allowed) <= 0) return null;
  const say = (length: Fraction) => {
    const whole = length.round();
    return `${sayFrames(whole, rate, drop)} (${whole.toString()} frames at ${sayRate(rate)})`;
  };
  const by = apart.abs().round().toString();
  return `The edit is ${say(frames)} long, the video ${say(inVideo)}: the edit is ${by} frames ${apart.compare(0) > 0 ? 'longer' : 'shorter'}.`;
}
