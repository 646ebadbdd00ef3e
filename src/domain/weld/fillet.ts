import Fraction from 'fraction.js';

/** A fillet with two equal legs has its throat at 45°: leg / √2. */
export function throatOf(leg: number): number {
  return leg / Math.SQRT2;
}

/** Mass of the plain triangle of a fillet, kg; a convex bead has about a tenth more. @param leg and length in mm */
export function filletMass(leg: number, length: number, density = 7850): number {
  return ((leg * leg) / 2 / 1_000_000) * (length / 1000) * density;
}

interface Row {
  /** Up to and including this thickness, in mm and as plate is sold in inches. */
  readonly mm: string;
  readonly inch: string;
  readonly leg: string;
}

/** Least fillet by thickness: AWS D1.1, table 7.7 (5.7 before 2020), as secondary sources print it. Bounds inclusive. */
const LEAST_LEGS: readonly Row[] = [
  { mm: '6', inch: '6.35', leg: '3' },
  { mm: '12', inch: '12.7', leg: '5' },
  { mm: '20', inch: '19.05', leg: '6' },
];
const LEAST_LEG_ABOVE = '8';
/** Under cyclic load at least this, mm: AWS D1.1, table 7.7, note. */
const LEAST_LEG_CYCLIC = '5';

/** What the least leg goes by. */
export interface LeastLeg {
  /** mm. */
  readonly leg: Fraction;
  /** The thickness that it goes by, mm. */
  readonly by: Fraction;
  readonly capped: boolean;
}

/**
 * The least leg against cracking; it says nothing about strength. By the thinner part with low-hydrogen electrodes and
 * by the thicker otherwise, because the thick part draws the heat; never more than the thinner part.
 * @param thicknesses of both parts, mm
 */
export function leastLeg(
  [one, other]: readonly [Fraction, Fraction],
  { lowHydrogen, cyclic }: { readonly lowHydrogen: boolean; readonly cyclic: boolean },
): LeastLeg {
  const [thin, thick] = one.lte(other) ? [one, other] : [other, one];
  const by = lowHydrogen ? thin : thick;
  // Plate of exactly an inch size is read in the inch column, where 1/4 in still counts as 6 mm does in the other.
  const row = LEAST_LEGS.find(({ mm, inch }) => by.lte(mm) || by.equals(inch));
  const table = new Fraction(row?.leg ?? LEAST_LEG_ABOVE);
  const wanted = cyclic && table.lt(LEAST_LEG_CYCLIC) ? new Fraction(LEAST_LEG_CYCLIC) : table;
  return wanted.gt(thin) ? { leg: thin, by, capped: true } : { leg: wanted, by, capped: false };
}

/** 1 ksi in N/mm2: 1000 psi. */
const KSI = 6.894757293168361;

/**
 * Shear that a fillet's throat is allowed, N for each mm of length: 0.30 of the electrode's strength, AWS D1.1 and
 * AISC, allowable stress design; tabled by O. W. Blodgett, Design of Welded Structures.
 */
export function allowableShear(leg: number, strengthKsi: number): number {
  return 0.3 * strengthKsi * KSI * throatOf(leg);
}

/** Thermal efficiency of stick welding: ISO/TR 17671-1 (EN 1011-1), table 1. */
const STICK_EFFICIENCY = 0.8;

/** Heat input, kJ/mm. @param speed of travel, mm/min */
export function heatInput(volts: number, amperes: number, speed: number): number {
  return (STICK_EFFICIENCY * volts * amperes * 60) / (speed * 1000);
}
