import type Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { formatTimecode, hasTimecode } from '../time/timecode.ts';
import { rateOf } from './edit.ts';

/**
 * Frames as a person reads them off a timeline: the label of the one that has begun; seconds where the rate has no
 * labels, or the frame lies before the first.
 */
export function sayFrames(frames: Fraction, rate: Rate, drop = false): string {
  const whole = Number(frames.floor());
  if (hasTimecode(rate) && whole >= 0) return formatTimecode(whole, rate, drop);
  return `${frames.div(rateOf(rate)).valueOf().toFixed(3)} s`;
}

/** A rate as editors write it: 25, 29.97. */
export function sayRate({ num, den }: Rate): string {
  return den === 1 ? String(num) : String(Number((num / den).toFixed(3)));
}

/** A rate exactly, as `parseRate` reads it: 25, 30000/1001. */
export function writeRate({ num, den }: Rate): string {
  return den === 1 ? String(num) : `${String(num)}/${String(den)}`;
}
