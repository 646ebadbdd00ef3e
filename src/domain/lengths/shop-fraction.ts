import type Fraction from 'fraction.js';
import { inInches, type Length, MILLIMETRES } from './length.ts';

/** The divisions of an inch that shop rules carry. */
export const SHOP_DENOMINATORS = [16, 32, 64] as const;
export type ShopDenominator = (typeof SHOP_DENOMINATORS)[number];

/** The nearest mark of an inch rule. */
export interface ShopFraction {
  /** Reduced: 1 1/2, 3/8, 2, 0. */
  readonly text: string;
  /** The mark less the length, in millimetres, as an exact or 15-digit decimal: above zero when the mark is longer. */
  readonly errorMm: string;
}

/** A length to the nearest 1/16, 1/32 or 1/64 in, halves up, with the error that this makes. */
export function toShopFraction(length: Pick<Length, 'mm'>, denominator: ShopDenominator = 64): ShopFraction {
  const inches = inInches(length);
  const mark = inches.mul(denominator).add(1, 2).floor().div(denominator);
  return { text: formatFraction(mark), errorMm: mark.sub(inches).mul(MILLIMETRES.in).toString() };
}

/** An exact number of inches as a mixed number. @param inches not negative */
export function formatFraction(inches: Fraction): string {
  return inches.toFraction(true);
}
