/** Frames, or other counts, a second: an exact fraction. */
export interface MediaRate {
  readonly num: number;
  readonly den: number;
}

/** The frame rates that cameras and editors work in (SMPTE ST 12-1 and its film and doubled relatives). */
export const LISTED_RATES: readonly MediaRate[] = [
  { num: 24_000, den: 1001 },
  { num: 24, den: 1 },
  { num: 25, den: 1 },
  { num: 30_000, den: 1001 },
  { num: 30, den: 1 },
  { num: 48_000, den: 1001 },
  { num: 48, den: 1 },
  { num: 50, den: 1 },
  { num: 60_000, den: 1001 },
  { num: 60, den: 1 },
];

/** What counts where frames mean nothing: milliseconds. */
export const MILLISECONDS: MediaRate = { num: 1000, den: 1 };

/** How far an average may lie from a listed rate and still be it. */
const TOLERANCE = 0.001;

/**
 * The rate that positions in a clip are counted at: the nearest listed one when the average lies within 0.1 % of
 * it, else milliseconds.
 * @param average frames a second over the whole clip, as an exact fraction; null when unknown
 */
export function snapRate(average: MediaRate | null): MediaRate {
  if (average === null || average.num <= 0 || average.den <= 0) return MILLISECONDS;
  const value = average.num / average.den;
  const distance = ({ num, den }: MediaRate) => Math.abs((value * den) / num - 1);
  const nearest = LISTED_RATES.reduce((best, rate) => (distance(rate) < distance(best) ? rate : best));
  return distance(nearest) <= TOLERANCE ? nearest : MILLISECONDS;
}

/**
 * A length in whole frames, rounded to the nearest.
 * @param seconds as an exact fraction
 */
export function framesIn(seconds: MediaRate, rate: MediaRate): number {
  const numerator = BigInt(seconds.num) * BigInt(rate.num);
  const denominator = BigInt(seconds.den) * BigInt(rate.den);
  return Number((2n * numerator + denominator) / (2n * denominator));
}
