import type Fraction from 'fraction.js';
import { inInches, inMillimetres, type Length, type LengthSystem, systemOf } from './length.ts';
import { formatFraction, toShopFraction } from './shop-fraction.ts';

/** The most decimals that a size is written with: a micrometre, or a hundred-thousandth of an inch. */
const MOST_DECIMALS = 5;

/** A number to at most so many decimals, halves away from zero, without zeros at the end. */
function decimal(value: Fraction, places: number): string {
  const text = value.round(places).toString();
  return text;
}

/**
 * A length in millimetres, with the unit. Given in millimetres or their like it is exact; inches are rounded to as
 * many decimals as were typed, fractions to two, so that no mark of a rule is lost.
 */
export function formatMillimetres(length: Length): string {
  const mm = inMillimetres(length);
  if (systemOf(length.unit) === 'mm') return `${decimal(mm, MOST_DECIMALS)} mm`;
  const fine = length.unit === 'thou' ? 3 + (length.decimals ?? 0) : (length.decimals ?? 2);
  return `${decimal(mm, Math.min(MOST_DECIMALS, Math.max(1, fine)))} mm`;
}

/**
 * A length in inches, with the unit. Whole millimetres go to the nearest 1/64; finer ones to two decimals more
 * than they were typed with, which tells all of them apart.
 */
export function formatInches(length: Length): string {
  const inches = inInches(length);
  if (systemOf(length.unit) === 'in')
    return `${length.decimals === null ? formatFraction(inches) : decimal(inches, MOST_DECIMALS)} in`;
  const fine = decimalsInMillimetres(length);
  if (fine <= 0) return `${toShopFraction(length).text} in`;
  return `${decimal(inches, Math.min(MOST_DECIMALS, fine + 2))} in`;
}

/** How many decimals of a millimetre were meant: 12.5 cm is one less than it shows. */
function decimalsInMillimetres({ unit, decimals }: Length): number {
  const shift = { um: 3, mm: 0, cm: -1, m: -3, thou: 0, in: 0, ft: 0 }[unit];
  return (decimals ?? 0) + shift;
}

/** Both readings of a length, the system it was given in first. */
export interface BothReadings {
  readonly given: { readonly system: LengthSystem; readonly text: string };
  readonly other: { readonly system: LengthSystem; readonly text: string };
}

/** A length in both systems: as typed, then the other one. */
export function formatBoth(length: Length): BothReadings {
  const system = systemOf(length.unit);
  return system === 'mm'
    ? { given: { system, text: length.typed }, other: { system: 'in', text: formatInches(length) } }
    : { given: { system, text: length.typed }, other: { system: 'mm', text: formatMillimetres(length) } };
}
