import type Fraction from 'fraction.js';
import { type LengthUnit, MILLIMETRES, systemOf } from './length.ts';
import { matchAt, type NumberRead, readNumber } from './read-number.ts';

/** A number with its unit, as it stands in a text; without one it may take its neighbour's: 40 x 3 mm. */
export interface Measure {
  readonly start: number;
  readonly end: number;
  /** In the unit, or bare. */
  readonly value: Fraction;
  readonly unit: LengthUnit | null;
  readonly decimals: number | null;
  /** The unit's own word; '' for none. */
  readonly word: string;
}

/** The words of each unit. m stands in small letters only: M is a thread. */
const UNIT_WORDS: readonly (readonly [LengthUnit, RegExp])[] = [
  ['mm', /[ \u00a0-]?(mm|millimet(?:re|er)s?)/iy],
  ['um', /[ \u00a0-]?(µm|μm|um|microns?|micromet(?:re|er)s?)/iy],
  ['cm', /[ \u00a0-]?(cm|centimet(?:re|er)s?)/iy],
  ['thou', /[ \u00a0-]?(thou|thousandths? of an inch)/iy],
  ['in', /[ \u00a0-]?(inch(?:es)?|in)/iy],
  ['ft', /[ \u00a0-]?(feet|foot|ft)/iy],
  ['m', /[ \u00a0-]?(m|met(?:re|er)s?)/y],
];
const INCH_MARK = /["″]|''/y;
/** Not the apostrophe of a word: the 90's. */
const FOOT_MARK = /['′](?!'|(?!x)\p{L})/uy;

/** What a unit's word may not run into: more of a word, a power, a rate (mm/rev), a torque (ft-lb), seconds. */
const RUNS_ON = /[\p{L}\p{N}_²³^]|\/[ ]?\p{L}|[ ·.-]?lbs?\b|[ ]\d+[ ]?s\b/uy;
/** Feet may run into their inches: 3ft4in. */
const FEET_RUN_ON = /[\p{L}_²³^]|\/[ ]?\p{L}|[ ·.-]?lbs?\b/uy;

/** The full stop of in. and ft., unless it ends the sentence. */
const STOP = /\.(?=[ \u00a0][^\p{Lu}\s]|[,;:)])/uy;

/** Between feet and inches: 3'-4", 3' 4", 3 ft 4 in. */
const FEET_TO_INCHES = /[ ]?-[ ]?|[ ]|(?=\d)/y;

/** A number at a place in a text, with its unit where it has one; feet with inches are one measure. */
export function readMeasure(text: string, at: number): Measure | null {
  const number = readNumber(text, at);
  if (number === null) return null;
  const measure = withUnit(text, at, number);
  return measure.unit === 'ft' ? (withInches(text, measure) ?? measure) : measure;
}

function withUnit(text: string, start: number, number: NumberRead): Measure {
  const { value, decimals } = number;
  const unit = readUnit(text, number.end);
  // A fraction of a millimetre is nothing that is written: it keeps its number, and finds no unit.
  if (unit === null || (decimals === null && systemOf(unit.unit) === 'mm'))
    return { start, end: number.end, value, unit: null, decimals, word: '' };
  return { start, end: unit.end, value, unit: unit.unit, decimals, word: unit.word };
}

function readUnit(text: string, at: number): { unit: LengthUnit; end: number; word: string } | null {
  const inch = matchAt(INCH_MARK, text, at);
  if (inch !== null) return { unit: 'in', end: at + inch[0].length, word: inch[0] };
  const foot = matchAt(FOOT_MARK, text, at);
  if (foot !== null) return { unit: 'ft', end: at + foot[0].length, word: foot[0] };
  for (const [unit, pattern] of UNIT_WORDS) {
    const found = matchAt(pattern, text, at);
    if (found === null) continue;
    const end = at + found[0].length;
    if (matchAt(unit === 'ft' ? FEET_RUN_ON : RUNS_ON, text, end) !== null) continue;
    const stop = systemOf(unit) === 'in' && unit !== 'thou' ? matchAt(STOP, text, end) : null;
    return { unit, end: end + (stop?.[0].length ?? 0), word: `${found[1] ?? ''}${stop?.[0] ?? ''}` };
  }
  return null;
}

function withInches(text: string, feet: Measure): Measure | null {
  const gap = matchAt(FEET_TO_INCHES, text, feet.end);
  if (gap === null) return null;
  const inches = readMeasure(text, feet.end + gap[0].length);
  if (inches?.unit !== 'in' || inches.value.gte(12)) return null;
  const exact = feet.value.mul(MILLIMETRES.ft).add(inches.value.mul(MILLIMETRES.in)).div(MILLIMETRES.ft);
  return { ...inches, start: feet.start, value: exact, unit: 'ft' };
}
