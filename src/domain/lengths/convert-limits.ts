import Fraction from 'fraction.js';
import { type LengthSystem, MILLIMETRES } from './length.ts';

/** The least and the most that a size may be, as exact decimals of one unit. */
export interface Limits {
  readonly least: string;
  readonly most: string;
}

/**
 * Limits in the other system, rounded inwards: the least up, the most down, so that no reading within them lies
 * outside the limits that were given.
 * @param from the system that the limits are given in
 * @param decimals of the result
 * @returns null where no number with so few decimals lies within
 * @throws RangeError where the least is above the most
 */
export function convertLimits(limits: Limits, from: LengthSystem, decimals: number): Limits | null {
  const [least, most] = [new Fraction(limits.least), new Fraction(limits.most)];
  if (least.gt(most)) throw new RangeError(`${limits.least} is above ${limits.most}.`);
  const factor = from === 'mm' ? MILLIMETRES.in.inverse() : MILLIMETRES.in;
  const [low, high] = [least.mul(factor).ceil(decimals), most.mul(factor).floor(decimals)];
  return low.gt(high) ? null : { least: low.toString(), most: high.toString() };
}
