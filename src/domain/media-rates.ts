import { type Rate } from './time/rate.ts';

/**
 * A length in whole frames, rounded to the nearest.
 * @param seconds as an exact fraction
 */
export function framesIn(seconds: Rate, rate: Rate): number {
  const numerator = BigInt(seconds.num) * BigInt(rate.num);
  const denominator = BigInt(seconds.den) * BigInt(rate.den);
  return Number((2n * numerator + denominator) / (2n * denominator));
}
