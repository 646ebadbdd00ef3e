import type Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';

/** How a hollow section was made; at one size the two differ in mass by their corners. */
export type HollowFinish = 'cold' | 'hot' | 'sharp';

/** A section's area, and how it was found. */
export interface SectionArea {
  /** Square millimetres. */
  readonly area: number;
  readonly formula: string;
  /** What was taken for the corners, in words; null where there are none to round. */
  readonly corners: string | null;
}

/**
 * Outer and inner corner radii of hollow sections, in thicknesses: EN 10219-2 (cold) 2T and 1T to 6 mm, 2.5T and 1.5T
 * to 10 mm, 3T and 2T above, as its annex for section properties has them; EN 10210-2 (hot) 1.5T and 1T. From memory
 * of both standards.
 */
function hollowRadii(wall: Fraction, finish: HollowFinish): readonly [outer: number, inner: number] {
  if (finish === 'sharp') return [0, 0];
  if (finish === 'hot') return [1.5, 1];
  if (wall.lte(6)) return [2, 1];
  return wall.lte(10) ? [2.5, 1.5] : [3, 2];
}

const CORNERS: Readonly<Record<HollowFinish, string>> = {
  cold: 'Corners of EN 10219-2, cold formed.',
  hot: 'Corners of EN 10210-2, hot finished.',
  sharp: 'Corners taken as sharp: heavier than any real section.',
};

/** A flat bar; exact. */
export function flatArea(width: Fraction, thickness: Fraction): SectionArea {
  return { area: width.mul(thickness).valueOf(), formula: 'b × t', corners: null };
}

/** A round bar. */
export function roundArea(diameter: Fraction): SectionArea {
  return { area: (Math.PI / 4) * diameter.mul(diameter).valueOf(), formula: 'π/4 × d²', corners: null };
}

/** A round tube or pipe. */
export function pipeArea(outside: Fraction, wall: Fraction): Answer<SectionArea> {
  if (wall.mul(2).gte(outside))
    return wrong('The wall leaves no bore: twice the wall is not less than the outside.');
  const area = Math.PI * outside.sub(wall).mul(wall).valueOf();
  return right({ area, formula: 'π × (D − t) × t', corners: null });
}

/** A square or rectangular hollow section. */
export function hollowArea(
  height: Fraction,
  width: Fraction,
  wall: Fraction,
  finish: HollowFinish,
): Answer<SectionArea> {
  const [outer, inner] = hollowRadii(wall, finish);
  const least = height.lt(width) ? height : width;
  const tooThick = wall.mul(Math.max(2, 2 * outer)).gte(least);
  if (tooThick) return wrong('The wall is too thick for this section: its corners would meet.');
  const walls = height.add(width).sub(wall.mul(2)).mul(wall).mul(2).valueOf();
  const rounded = (4 - Math.PI) * (outer ** 2 - inner ** 2) * wall.mul(wall).valueOf();
  return right({
    area: walls - rounded,
    formula: '2t(B + H − 2t) − (4 − π)(ro² − ri²)',
    corners: CORNERS[finish],
  });
}

/**
 * Root radii of rolled angles, mm, by the legs: EN 10056-1, from memory; those of 25x3, 40x4, 50x5, 50x6, 60x6 and
 * 80x8 agree with the masses computed for them elsewhere. The toes have half of it.
 */
const ROOT_RADII: Readonly<Record<string, number>> = {
  '20x20': 3.5,
  '25x25': 3.5,
  '30x30': 5,
  '35x35': 5,
  '40x40': 6,
  '45x45': 7,
  '50x50': 7,
  '60x60': 8,
  '65x65': 9,
  '70x70': 9,
  '75x75': 9,
  '80x80': 10,
  '90x90': 11,
  '100x100': 12,
  '120x120': 13,
  '130x130': 14,
  '150x150': 16,
  '180x180': 18,
  '200x200': 18,
  '30x20': 4,
  '40x20': 4,
  '40x25': 4,
  '45x30': 4.5,
  '50x30': 5,
  '60x30': 5,
  '60x40': 6,
  '65x50': 6,
  '70x50': 7,
  '75x50': 7,
  '80x40': 7,
  '80x60': 8,
  '100x50': 8,
  '100x65': 10,
  '100x75': 10,
  '120x80': 11,
  '125x75': 11,
  '150x75': 12,
  '150x90': 12,
  '150x100': 12,
  '200x100': 15,
  '200x150': 15,
};

/** An angle; with the radii of EN 10056-1 where it lists the legs, else with sharp corners. */
export function angleArea(long: Fraction, short: Fraction, thickness: Fraction): Answer<SectionArea> {
  const [a, b] = long.gte(short) ? [long, short] : [short, long];
  if (thickness.gte(b)) return wrong('The angle is thicker than its leg is long.');
  const legs = thickness.mul(a.add(b).sub(thickness)).valueOf();
  const root = ROOT_RADII[`${a.toString()}x${b.toString()}`] ?? null;
  if (root === null)
    return right({
      area: legs,
      formula: 't(a + b − t)',
      corners:
        'No size of EN 10056-1 that is known here: corners taken as sharp, which is a few percent off.',
    });
  const rounded = (1 - Math.PI / 4) * (root ** 2 - 2 * (root / 2) ** 2);
  return right({
    area: legs + rounded,
    formula: 't(a + b − t) + (1 − π/4)(r1² − 2 r2²)',
    corners: `Radii of EN 10056-1: root ${String(root)} mm, toes ${String(root / 2)} mm.`,
  });
}
