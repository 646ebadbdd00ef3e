/** How the two ends of a cylinder are held. */
export type Mounting = 'pinned' | 'fixed-pinned' | 'fixed-fixed' | 'fixed-free';

/** Effective length factors for ideal ends: ANSI/AISC 360, commentary, table C-A-7.1, theoretical values. From memory. */
export const LENGTH_FACTORS: Readonly<Record<Mounting, number>> = {
  pinned: 1,
  'fixed-pinned': 0.7,
  'fixed-fixed': 0.5,
  'fixed-free': 2,
};

/** Steel, N/mm2: EN 1993-1-1, 3.2.6, has 210 000; 205 000 stands in many handbooks and is the safer of the two. */
export const STEEL_MODULUS = 205_000;
/** Yield taken for a rod of unknown steel, N/mm2: common practice, below that of usual chromed bar. */
export const ROD_YIELD = 300;

/** At what load a rod buckles, and by which formula. */
export interface Buckling {
  /** N. */
  readonly load: number;
  readonly slenderness: number;
  readonly formula: 'Euler' | 'Johnson';
}

/**
 * The load at which a round rod buckles. Euler's formula for slender rods; below the slenderness at which its stress
 * is half of the yield it would promise too much, and Johnson's parabola takes over.
 * @param diameter of the rod, mm, taken for the whole length
 * @param length between the two ends with the cylinder extended, mm
 */
export function bucklingLoad(
  diameter: number,
  length: number,
  mounting: Mounting,
  modulus = STEEL_MODULUS,
): Buckling {
  if (!(diameter > 0 && length > 0)) throw new RangeError('A rod has a diameter and a length.');
  const area = (Math.PI / 4) * diameter ** 2;
  const slenderness = (LENGTH_FACTORS[mounting] * length) / (diameter / 4);
  const euler = (Math.PI ** 2 * modulus) / slenderness ** 2;
  if (euler <= ROD_YIELD / 2) return { load: euler * area, slenderness, formula: 'Euler' };
  const johnson = ROD_YIELD * (1 - (ROD_YIELD * slenderness ** 2) / (4 * Math.PI ** 2 * modulus));
  return { load: johnson * area, slenderness, formula: 'Johnson' };
}
