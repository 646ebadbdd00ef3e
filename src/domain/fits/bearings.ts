import type Fraction from 'fraction.js';
import { type Deviations } from './iso-286.ts';

/**
 * Bores of radial ball and roller bearings, Normal class, µm below nominal, by bore over the last and up to and
 * including this, mm: ISO 492:2014, table 1. 10 to 120 mm agree with makers' catalogues; the rest is from memory.
 */
const BORES: readonly (readonly [upTo: number, below: number])[] = [
  [18, 8],
  [30, 10],
  [50, 12],
  [80, 15],
  [120, 20],
  [180, 25],
  [250, 30],
  [315, 35],
  [400, 40],
  [500, 45],
];

/** Outside diameters, Normal class, µm below nominal: ISO 492:2014, table 2. From memory. */
const OUTSIDES: readonly (readonly [upTo: number, below: number])[] = [
  [18, 8],
  [30, 9],
  [50, 11],
  [80, 13],
  [120, 15],
  [150, 18],
  [180, 25],
  [250, 30],
  [315, 35],
  [400, 40],
  [500, 45],
];

function below(table: typeof BORES, size: Fraction, over: number): Deviations | null {
  const [, down] = size.lte(over) ? [] : (table.find(([upTo]) => size.lte(upTo)) ?? []);
  return down === undefined ? null : { lower: -down, upper: 0 };
}

/** The limits of a bearing's bore, µm; null above 500 mm and up to 0.6 mm. */
export function bearingBore(size: Fraction): Deviations | null {
  return below(BORES, size, 0.6);
}

/** The limits of a bearing's outside diameter, µm; null above 500 mm and up to 2.5 mm. */
export function bearingOutside(size: Fraction): Deviations | null {
  return below(OUTSIDES, size, 2.5);
}

/** Which ring turns under the load. A wheel on a dead axle has a turning outer ring. */
export type TurningRing = 'inner' | 'outer';

/**
 * Seats in common use by how the load turns: the ring that the load goes around is tight, the other slides. Catalogues
 * of several bearing makers agree on these; which of them depends on size and load.
 */
export const USUAL_SEATS: Readonly<
  Record<TurningRing, { readonly shaft: string; readonly housing: string }>
> = {
  inner: {
    shaft: 'j5, j6 or k5, k6; m5, m6 for heavy loads',
    housing: 'H7; J7 where it need not slide',
  },
  outer: {
    shaft: 'g6 or h6; h5 for precision',
    housing: 'N7; M7 for light, P7 for heavy loads',
  },
};
