import { type Answer, right, wrong } from '../answer.ts';

/** Frames a second as an exact fraction of safe integers, such as 30000/1001. */
export interface Rate {
  readonly num: number;
  readonly den: number;
}

/**
 * The rates that timecode is defined for, and that a measured rate is snapped to.
 * Source: SMPTE ST 12-1:2014, as OpenTimelineIO's rationalTime.cpp lists them.
 */
export const LISTED_RATES: readonly Rate[] = [
  { num: 24000, den: 1001 },
  { num: 24, den: 1 },
  { num: 25, den: 1 },
  { num: 30000, den: 1001 },
  { num: 30, den: 1 },
  { num: 48000, den: 1001 },
  { num: 48, den: 1 },
  { num: 50, den: 1 },
  { num: 60000, den: 1001 },
  { num: 60, den: 1 },
];

/** Counts in milliseconds: for a clip whose rate is none of the listed ones. */
export const MILLISECOND_RATE: Rate = { num: 1000, den: 1 };

/** The farthest an average rate may lie from a listed one, as a part of it. Our own choice. */
const SNAP = 0.001;

/** What two decimals on a screen stand for. Common practice: cameras and editors write the rates so. */
const WRITTEN_RATES: Readonly<Record<string, Rate>> = {
  '23.98': { num: 24000, den: 1001 },
  '23.976': { num: 24000, den: 1001 },
  '29.97': { num: 30000, den: 1001 },
  '47.95': { num: 48000, den: 1001 },
  '47.952': { num: 48000, den: 1001 },
  '59.94': { num: 60000, den: 1001 },
};

/** Whether a rate can be counted with: both numbers whole, safe and above zero. */
export function isRate(rate: Rate): boolean {
  return [rate.num, rate.den].every((number) => Number.isSafeInteger(number) && number > 0);
}

/** @throws RangeError for a rate that cannot be counted with */
export function requireRate(rate: Rate): void {
  if (!isRate(rate)) throw new RangeError(`${String(rate.num)}/${String(rate.den)} is no frame rate.`);
}

/** Whether two rates are the same number, however written: 50/2 is 25/1. */
export function sameRate(a: Rate, b: Rate): boolean {
  return BigInt(a.num) * BigInt(b.den) === BigInt(b.num) * BigInt(a.den);
}

/**
 * A rate as written on a command line or in a list: 25, 30000/1001, 29.97.
 * The decimals of 23.976, 29.97, 47.952 and 59.94 stand for the exact fractions over 1001.
 */
export function parseRate(text: string): Answer<Rate> {
  const written = text.trim();
  const known = WRITTEN_RATES[written];
  if (known !== undefined) return right(known);
  const [, num, den = '1'] = /^(\d{1,7})(?:\/(\d{1,5}))?$/.exec(written) ?? [];
  const rate = { num: Number(num), den: Number(den) };
  if (num === undefined || !isRate(rate))
    return wrong(`There is no frame rate “${written.slice(0, 40)}”. Write 25 or 30000/1001.`);
  return right(rate);
}

/**
 * The rate that positions of a clip are counted in.
 * @param average frames a second as the file's probe reports its average
 * @returns the nearest listed rate within 0.1 %, else 1000/1
 */
export function snapRate(average: Rate): Rate {
  requireRate(average);
  const measured = average.num / average.den;
  const distance = (rate: Rate) => Math.abs(measured - rate.num / rate.den) / (rate.num / rate.den);
  const nearest = LISTED_RATES.reduce((best, rate) => (distance(rate) < distance(best) ? rate : best));
  return distance(nearest) <= SNAP ? nearest : MILLISECOND_RATE;
}
