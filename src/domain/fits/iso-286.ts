import type Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';

/**
 * ISO 286-1:2010 and ISO 286-2:2010, as tables: the formulas behind them give other numbers, because each table value
 * was rounded by rules of its own. Known misprints of ISO 286-2:1988 (corrigendum of 2006) are right here.
 */

/** Steps of nominal sizes, mm, each over the last and up to and including this: ISO 286-1, table 1. */
const STEPS = [3, 6, 10, 18, 30, 50, 80, 120, 180, 250, 315, 400, 500] as const;

/** The finer steps of some fundamental deviations: ISO 286-1, tables 2 to 5. */
const FINE_STEPS = [
  3, 6, 10, 14, 18, 24, 30, 40, 50, 65, 80, 100, 120, 140, 160, 180, 200, 225, 250, 280, 315, 355, 400, 450,
  500,
] as const;

/** Standard tolerances, µm, a value a step: ISO 286-1, table 1. IT4 only serves the holes K to U of grade 5. */
const TOLERANCES: Readonly<Record<number, readonly number[]>> = {
  4: [3, 4, 4, 5, 6, 7, 8, 10, 12, 14, 16, 18, 20],
  5: [4, 5, 6, 8, 9, 11, 13, 15, 18, 20, 23, 25, 27],
  6: [6, 8, 9, 11, 13, 16, 19, 22, 25, 29, 32, 36, 40],
  7: [10, 12, 15, 18, 21, 25, 30, 35, 40, 46, 52, 57, 63],
  8: [14, 18, 22, 27, 33, 39, 46, 54, 63, 72, 81, 89, 97],
  9: [25, 30, 36, 43, 52, 62, 74, 87, 100, 115, 130, 140, 155],
  10: [40, 48, 58, 70, 84, 100, 120, 140, 160, 185, 210, 230, 250],
  11: [60, 75, 90, 110, 130, 160, 190, 220, 250, 290, 320, 360, 400],
  12: [100, 120, 150, 180, 210, 250, 300, 350, 400, 460, 520, 570, 630],
  13: [140, 180, 220, 270, 330, 390, 460, 540, 630, 720, 810, 890, 970],
  14: [250, 300, 360, 430, 520, 620, 740, 870, 1000, 1150, 1300, 1400, 1550],
};

/** The grades that are read. */
const [FINEST, COARSEST] = [5, 14];

/**
 * Fundamental deviations of shafts, µm, without their sign: for a to g the upper one below zero, for k to u the lower
 * one above it. 13 values go by the steps, 25 by the fine steps; t begins above 24 mm. ISO 286-1, tables 4 and 5.
 */
const DEVIATIONS: Readonly<Record<string, readonly (number | null)[]>> = {
  a: [
    270, 270, 280, 290, 290, 300, 300, 310, 320, 340, 360, 380, 410, 460, 520, 580, 660, 740, 820, 920, 1050,
    1200, 1350, 1500, 1650,
  ],
  b: [
    140, 140, 150, 150, 150, 160, 160, 170, 180, 190, 200, 220, 240, 260, 280, 310, 340, 380, 420, 480, 540,
    600, 680, 760, 840,
  ],
  c: [
    60, 70, 80, 95, 95, 110, 110, 120, 130, 140, 150, 170, 180, 200, 210, 230, 240, 260, 280, 300, 330, 360,
    400, 440, 480,
  ],
  d: [20, 30, 40, 50, 65, 80, 100, 120, 145, 170, 190, 210, 230],
  e: [14, 20, 25, 32, 40, 50, 60, 72, 85, 100, 110, 125, 135],
  f: [6, 10, 13, 16, 20, 25, 30, 36, 43, 50, 56, 62, 68],
  g: [2, 4, 5, 6, 7, 9, 10, 12, 14, 15, 17, 18, 20],
  h: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0],
  k: [0, 1, 1, 1, 2, 2, 2, 3, 3, 4, 4, 4, 5],
  m: [2, 4, 6, 7, 8, 9, 11, 13, 15, 17, 20, 21, 23],
  n: [4, 8, 10, 12, 15, 17, 20, 23, 27, 31, 34, 37, 40],
  p: [6, 12, 15, 18, 22, 26, 32, 37, 43, 50, 56, 62, 68],
  r: [10, 15, 19, 23, 23, 28, 28, 34, 34, 41, 43, 51, 54, 63, 65, 68, 77, 80, 84, 94, 98, 108, 114, 126, 132],
  s: [
    14, 19, 23, 28, 28, 35, 35, 43, 43, 53, 59, 71, 79, 92, 100, 108, 122, 130, 140, 158, 170, 190, 208, 232,
    252,
  ],
  t: [
    null,
    null,
    null,
    null,
    null,
    null,
    41,
    48,
    54,
    66,
    75,
    91,
    104,
    122,
    134,
    146,
    166,
    180,
    196,
    218,
    240,
    268,
    294,
    330,
    360,
  ],
  u: [
    18, 23, 28, 33, 33, 41, 48, 60, 70, 87, 102, 124, 144, 170, 190, 210, 236, 258, 284, 315, 350, 390, 435,
    490, 540,
  ],
};

/** j of shafts, below zero, and J of holes, above it, by grade, µm: ISO 286-1, tables 4 and 2. */
const SHAFT_J: Readonly<Record<number, readonly number[]>> = {
  5: [2, 2, 2, 3, 4, 5, 7, 9, 11, 13, 16, 18, 20],
  6: [2, 2, 2, 3, 4, 5, 7, 9, 11, 13, 16, 18, 20],
  7: [4, 4, 5, 6, 8, 10, 12, 15, 18, 21, 26, 28, 32],
};
const HOLE_J: Readonly<Record<number, readonly number[]>> = {
  6: [2, 5, 5, 6, 8, 10, 13, 16, 18, 22, 25, 29, 33],
  7: [4, 6, 8, 10, 12, 14, 18, 22, 26, 30, 36, 39, 43],
  8: [6, 10, 12, 15, 20, 24, 28, 34, 41, 47, 55, 60, 66],
};

/** M6 over 250 to 315 mm has ES -9, not the -11 of the rule: ISO 286-1, table 3, note. From memory. */
const M6_EXCEPTION = { step: STEPS.indexOf(315), upper: -9 };

/** A tolerance class: its letter, in small letters, whether it is a hole's, and its grade. */
export interface ToleranceClass {
  readonly of: 'hole' | 'shaft';
  readonly letter: string;
  readonly grade: number;
  /** As it is written: H7, js6. */
  readonly name: string;
}

/** The limit deviations of a size, µm. js of an odd tolerance has halves. */
export interface Deviations {
  readonly lower: number;
  readonly upper: number;
}

const LETTERS = [...Object.keys(DEVIATIONS), 'j', 'js'];

/** A tolerance class as it is written: capital letters are holes, small ones shafts. */
export function parseToleranceClass(text: string): Answer<ToleranceClass> {
  const [, letters = '', digits = ''] = /^([A-Za-z]{1,2})(\d{1,2})$/.exec(text.trim()) ?? [];
  const letter = letters.toLowerCase();
  const hole = letters === letters.toUpperCase();
  const name = text.trim().slice(0, 20);
  if (letters === '' || (!hole && letters !== letter))
    return wrong(`${name} is no tolerance class. Write it as H7 for a hole, k6 for a shaft.`);
  if (!LETTERS.includes(letter))
    return wrong(`${name} is not known here. The letters are ${[...LETTERS].sort().join(', ')}.`);
  const grade = Number(digits);
  if (grade < FINEST || grade > COARSEST)
    return wrong(`${name} is out of range: the grades here are ${String(FINEST)} to ${String(COARSEST)}.`);
  return right({ of: hole ? 'hole' : 'shaft', letter, grade, name });
}

function stepOf(steps: readonly number[], size: Fraction): number {
  return steps.findIndex((most) => size.lte(most));
}

function toleranceOf(grade: number, step: number): number {
  const tolerance = TOLERANCES[grade]?.[step];
  if (tolerance === undefined) throw new RangeError(`There is no tolerance of grade ${String(grade)} here.`);
  return tolerance;
}

/** The fundamental deviation without its sign; null where the class is not made at this size. */
function deviationOf({ letter, of, grade }: ToleranceClass, size: Fraction): number | null {
  const values = DEVIATIONS[letter] ?? [];
  // k means its few micrometres in grades 4 to 7 of shafts, and up to 8 of holes; coarser it is zero.
  if (letter === 'k' && of === 'shaft' && grade > 7) return 0;
  const steps = values.length === STEPS.length ? STEPS : FINE_STEPS;
  return values[stepOf(steps, size)] ?? null;
}

/** The upper deviation of a hole K to U: ISO 286-1, 4.3.2.5 and table 3. Null where the class is not made. */
function upperOfHole(wanted: ToleranceClass, size: Fraction, step: number): number | null {
  const { letter, grade } = wanted;
  const deviation = deviationOf(wanted, size);
  if (deviation === null) return null;
  const small = size.lte(3);
  if (letter === 'k' && grade > 8 && !small) return null;
  if (letter === 'n' && grade > 8 && !small) return 0;
  if (letter === 'm' && grade === 6 && step === M6_EXCEPTION.step) return M6_EXCEPTION.upper;
  const lastWithDelta = ['k', 'm', 'n'].includes(letter) ? 8 : 7;
  const delta = small || grade > lastWithDelta ? 0 : toleranceOf(grade, step) - toleranceOf(grade - 1, step);
  return delta - deviation;
}

function refuse(name: string, size: Fraction): { readonly ok: false; readonly error: string } {
  return wrong(`${name} is not made at ${size.toString()} mm.`);
}

/** Deviations of j and J, which have tables of their own. */
function deviationsOfJ(
  { of, grade, name }: ToleranceClass,
  size: Fraction,
  step: number,
): Answer<Deviations> {
  const value = (of === 'hole' ? HOLE_J : SHAFT_J)[grade]?.[step];
  if (value === undefined) return refuse(name, size);
  const tolerance = toleranceOf(grade, step);
  return right(
    of === 'hole' ? { lower: value - tolerance, upper: value } : { lower: -value, upper: tolerance - value },
  );
}

/**
 * The limit deviations of a nominal size with a tolerance class.
 * @param size millimetres, above 0 and up to 500; ISO 286 splits at upper limits that belong to their step
 * @returns µm, or the sentence for a size or class that ISO 286 does not have
 */
export function limitDeviations(size: Fraction, wanted: ToleranceClass): Answer<Deviations> {
  if (size.lte(0)) return wrong('A size is above zero.');
  if (size.gt(500)) return wrong(`${size.toString()} mm is out of range: the tables here go to 500 mm.`);
  const { letter, grade, of, name } = wanted;
  const step = stepOf(STEPS, size);
  const tolerance = toleranceOf(grade, step);
  if (letter === 'js') return right({ lower: -tolerance / 2, upper: tolerance / 2 });
  if (letter === 'j') return deviationsOfJ(wanted, size, step);
  // ISO 286-1, notes to the tables: a, b and N coarser than 8 are not for sizes up to 1 mm.
  if (size.lte(1) && (['a', 'b'].includes(letter) || (of === 'hole' && letter === 'n' && grade > 8)))
    return refuse(name, size);
  const clear = letter <= 'h';
  if (of === 'hole' && !clear) {
    const upper = upperOfHole(wanted, size, step);
    return upper === null ? refuse(name, size) : right({ lower: upper - tolerance, upper });
  }
  const deviation = deviationOf(wanted, size);
  if (deviation === null) return refuse(name, size);
  // A hole A to H is the shaft's mirror image.
  if (of === 'hole') return right({ lower: deviation, upper: deviation + tolerance });
  return right(
    clear
      ? { lower: 0 - deviation - tolerance, upper: 0 - deviation }
      : { lower: deviation, upper: deviation + tolerance },
  );
}
