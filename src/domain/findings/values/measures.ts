import Fraction from 'fraction.js';
import { type Dialect } from '../finding.ts';
import { type NumberForm, readFraction, readSpokenNumber } from '../numbers/spoken-number.ts';
import { type Dimension, readUnit, type SpokenUnit } from './units.ts';

/** A number with its unit, or without one. */
export interface Term {
  readonly from: number;
  readonly to: number;
  readonly value: Fraction;
  readonly form: NumberForm | 'article';
  readonly unit: string | null;
  readonly dimension: Dimension | null;
  readonly plural: boolean;
}

/** What was measured or set: one number, several joined by "by", or a range with one unit. */
export interface Measure {
  readonly from: number;
  readonly to: number;
  readonly terms: readonly Term[];
  readonly joined: 'by' | 'range' | null;
  /** Null where no unit was said. */
  readonly dimension: Dimension | null;
}

type Words = readonly string[];

/** The measure that begins at a word, with its unit where one is said. */
export function readMeasure(words: Words, at: number, dialect: Dialect): Measure | null {
  const first = readTerm(words, at, dialect);
  if (first === null) return null;
  const terms = [first];
  let joined: Measure['joined'] = null;
  for (;;) {
    const last = terms.at(-1) ?? first;
    const joint = jointOf(words[last.to] ?? '', last, joined);
    if (joint === null || terms.length > 4) break;
    const next = readTerm(words, last.to + 1, dialect);
    if (next === null || !joins(last, next, joint, words)) break;
    terms.push(next);
    joined = joint;
  }
  // "Ten and then" is no range: a range ends in a unit.
  const last = terms.at(-1) ?? first;
  return { from: first.from, to: last.to, terms, joined, dimension: last.dimension ?? first.dimension };
}

function jointOf(word: string, last: Term, joined: Measure['joined']): Measure['joined'] {
  if (word === 'by' && joined !== 'range') return 'by';
  if ((word === 'to' || word === 'or' || word === 'and') && joined !== 'by' && last.form !== 'article')
    return word === 'to' || last.unit === null ? 'range' : null;
  return null;
}

function joins(last: Term, next: Term, joint: Measure['joined'], words: Words): boolean {
  const alike = next.unit === null || last.unit === null || next.dimension === last.dimension;
  if (joint === 'by') return alike && next.dimension !== 'other' && next.form !== 'article';
  if (next.unit === null || next.form === 'article' || next.dimension === 'other' || words[next.to] === 'by')
    return false;
  // Half of "ten and half an inch" is of its own.
  if (words[last.to] === 'and' && (next.form === 'fraction' || last.form === 'fraction')) return false;
  return last.unit === null || last.unit === next.unit;
}

const ARTICLES: ReadonlySet<string> = new Set(['a', 'an']);

/** A number and its unit. */
export function readTerm(words: Words, at: number, dialect: Dialect): Term | null {
  return unitFirst(words, at, dialect) ?? withUnit(words, at, dialect, readSpokenNumber(words, at)) ?? null;
}

/** An inch and a quarter, a foot, inch and a half. */
function unitFirst(words: Words, at: number, dialect: Dialect): Term | null {
  const article = ARTICLES.has(words[at] ?? '');
  const unit = readUnit(words, article ? at + 1 : at, dialect);
  if (unit === null || unit.plural || !(unit.dimension === 'length' || unit.unit === 'h')) return null;
  if (!article && (unit.dimension !== 'length' || words[unit.to] !== 'and')) return null;
  const term: Term = { ...unit, from: at, value: new Fraction(1), form: 'article' };
  const longer = addFraction(words, term, dialect);
  return longer !== term || article ? longer : null;
}

function withUnit(
  words: Words,
  at: number,
  dialect: Dialect,
  number: ReturnType<typeof readSpokenNumber>,
): Term | null {
  if (number === null) return null;
  const unit = unitBehind(words, number, dialect);
  const term: Term = {
    from: at,
    to: unit?.to ?? number.to,
    value: number.value,
    form: number.form,
    unit: unit?.unit ?? null,
    dimension: unit?.dimension ?? null,
    plural: unit?.plural ?? false,
  };
  return unit === null ? term : addInches(words, addFraction(words, term, dialect), dialect);
}

/** The unit right behind a number, or behind "of a" where the number is a part of one. */
function unitBehind(
  words: Words,
  number: { value: Fraction; to: number },
  dialect: Dialect,
): SpokenUnit | null {
  const close = readUnit(words, number.to, dialect);
  if (close !== null) {
    // "30 seconds" that are no time have been read as a fraction by now; a lone letter is checked by the reader.
    return close;
  }
  if (number.value.compare(1) >= 0) return null;
  let to = number.to;
  if (words[to] === 'of') to++;
  if (ARTICLES.has(words[to] ?? '')) to++;
  if (to === number.to) return null;
  const far = readUnit(words, to, dialect);
  return far;
}

const SPLIT_UNITS: ReadonlySet<string> = new Set([
  'in',
  'ft',
  'mm',
  'cm',
  'm',
  'thou',
  'h',
  'min',
  't',
  'hp',
]);

/** "Two inches and a quarter": the fraction is of the same unit. */
function addFraction(words: Words, term: Term, dialect: Dialect): Term {
  if (words[term.to] !== 'and' || !SPLIT_UNITS.has(term.unit ?? '')) return term;
  if (term.form === 'fraction' || term.form === 'mixed' || term.form === 'decimal') return term;
  const fraction = readFraction(words, term.to + 1);
  if (fraction === null || readUnit(words, fraction.to, dialect) !== null) return term;
  // "An inch and half the width", "half a" and "quarter of" begin something new.
  if (/^(?:the|a|an|of|my|that)$/.test(words[fraction.to] ?? '')) return term;
  return { ...term, value: term.value.add(fraction.value), to: fraction.to, form: 'mixed' };
}

/** "Four foot six and a half": told in inches, the one unit in which it is exact. */
function addInches(words: Words, term: Term, dialect: Dialect): Term {
  if (term.unit !== 'ft' || term.form === 'mixed') return term;
  const from = words[term.to] === 'and' ? term.to + 1 : term.to;
  const inches = readSpokenNumber(words, from);
  if (inches === null || inches.value.compare(12) >= 0 || inches.value.compare(0) < 0) return term;
  const unit = readUnit(words, inches.to, dialect);
  if (unit !== null ? unit.unit !== 'in' : from > term.to || words[inches.to] === 'by') return term;
  return { ...term, unit: 'in', value: term.value.mul(12).add(inches.value), to: unit?.to ?? inches.to };
}
