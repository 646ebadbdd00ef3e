import Fraction from 'fraction.js';
import { readDivisor } from './divisor.ts';
import { SCALES, SMALL, TENS_WORDS, ZEROS } from './number-words.ts';

/**
 * How a number was put. `pair` is "one twenty" for 120, `spelled` is digit by digit; both are how names and settings
 * are read out.
 */
export type NumberForm = 'numeral' | 'cardinal' | 'pair' | 'spelled' | 'decimal' | 'fraction' | 'mixed';

/** A number in a list of words. */
export interface SpokenNumber {
  readonly value: Fraction;
  readonly form: NumberForm;
  /** The first word behind it. */
  readonly to: number;
}

type Words = readonly string[];
interface Whole {
  readonly value: Fraction;
  readonly to: number;
  readonly form: 'numeral' | 'cardinal' | 'pair' | 'spelled';
}

const WHOLE_NUMERAL = /^\d+$/;
const DECIMAL_NUMERAL = /^\d*\.\d+$/;
const FRACTION_NUMERAL = /^(\d+)\/(\d+)$/;
const DIGIT = /^\d$/;
/** Before a hundred that is no number: a couple of hundred. */
const VAGUE: ReadonlySet<string> = new Set([
  'couple',
  'few',
  'several',
  'many',
  'of',
  'per',
  'the',
  'odd',
  'by',
]);
/** Longer than any number that is read out. */
const MOST_DIGITS = 20;

/**
 * The number that begins at a word, as long as it goes: cardinals, "fourteen twenty", digits one by one, decimals,
 * fractions, mixed numbers, in words, numerals or both.
 * @param words in lower case
 * @returns null where no number begins; "a" counts only before hundred, thousand and a fraction
 */
export function readSpokenNumber(words: Words, at: number): SpokenNumber | null {
  if (words[at] === 'minus' || words[at] === 'negative') {
    const number = readSpokenNumber(words, at + 1);
    return number === null ? null : { ...number, value: number.value.neg() };
  }
  return (
    readFraction(words, at) ??
    readDecimal(words, at) ??
    readMixed(words, at) ??
    scaled(words, readWhole(words, at))
  );
}

function scaled(words: Words, number: SpokenNumber | null): SpokenNumber | null {
  const scale = number === null ? undefined : SCALES.get(words[number.to] ?? '');
  if (number === null || scale === undefined) return number;
  return { ...number, value: number.value.mul(10n ** BigInt(scale)), to: number.to + 1 };
}

/** Three eighths, a quarter, half, five thirty-seconds, 3/4. */
export function readFraction(words: Words, at: number): SpokenNumber | null {
  const word = words[at] ?? '';
  const [, top, bottom] = FRACTION_NUMERAL.exec(word) ?? [];
  if (top !== undefined && bottom !== undefined && Number(bottom) > 0)
    return { value: new Fraction(`${top}/${bottom}`), form: 'fraction', to: at + 1 };
  if (word === 'half' || word === 'quarter') {
    // "Half a quarter" is nobody's fraction; "quarter twenty" is a thread and stays one.
    return { value: new Fraction(1, word === 'half' ? 2 : 4), form: 'fraction', to: at + 1 };
  }
  const article = word === 'a' || word === 'an';
  const numerator = article ? { value: 1, to: at + 1 } : readNumerator(words, at);
  if (numerator === null) return null;
  const divisor = readDivisor(words, numerator.to, article || numerator.value === 1);
  if (divisor === null || numerator.value >= divisor.value) return null;
  // "Two thirty seconds" is a time: what is left of thirty-seconds and sixty-fourths in lowest terms is odd.
  if (divisor.value >= 32 && divisor.value <= 64 && numerator.value % 2 === 0) return null;
  return { value: new Fraction(numerator.value, divisor.value), form: 'fraction', to: divisor.to };
}

function readNumerator(words: Words, at: number): { value: number; to: number } | null {
  const word = words[at] ?? '';
  if (WHOLE_NUMERAL.test(word) && word.length <= 2) return { value: Number(word), to: at + 1 };
  const small = readBelowHundred(words, at);
  return small === null || small.value === 0 ? null : small;
}

/** Two point five, point oh three, 3.2. */
function readDecimal(words: Words, at: number): SpokenNumber | null {
  const word = words[at] ?? '';
  if (DECIMAL_NUMERAL.test(word))
    return scaled(words, { value: new Fraction(`0${word}`), form: 'decimal', to: at + 1 });
  const whole = ZEROS.has(word) ? { value: new Fraction(0), to: at + 1 } : readWhole(words, at);
  const point = whole?.to ?? at;
  if (words[point] !== 'point') return null;
  const places = readPlaces(words, point + 1);
  if (places === null) return null;
  const value = (whole?.value ?? new Fraction(0)).add(
    new Fraction(BigInt(places.digits), 10n ** BigInt(places.digits.length)),
  );
  return scaled(words, { value, form: 'decimal', to: places.to });
}

function readPlaces(words: Words, from: number): { digits: string; to: number } | null {
  let digits = '';
  let to = from;
  for (;;) {
    const word = words[to] ?? '';
    const digit = digitOf(word);
    if (digit !== null) digits += digit;
    else if (WHOLE_NUMERAL.test(word) && digits === '') return { digits: word, to: to + 1 };
    else break;
    to++;
    if (digits.length > MOST_DIGITS) break;
  }
  if (digits !== '') return { digits, to };
  const two = readBelowHundred(words, from);
  return two === null ? null : { digits: String(two.value), to: two.to };
}

/** Two and a half, one and five eighths, 31 and 3/8, 1 1/2. */
function readMixed(words: Words, at: number): SpokenNumber | null {
  const whole = readWhole(words, at);
  if (whole === null || whole.form === 'spelled') return null;
  const joined = words[whole.to] === 'and';
  const from = joined ? whole.to + 1 : whole.to;
  if (!joined && !FRACTION_NUMERAL.test(words[from] ?? '')) return null;
  const fraction = readFraction(words, from);
  if (fraction === null || (words[from] === 'half' && words[from + 1] === 'a')) return null;
  return scaled(words, { value: whole.value.add(fraction.value), form: 'mixed', to: fraction.to });
}

/** A whole number in any form. */
export function readWhole(words: Words, at: number): Whole | null {
  const word = words[at] ?? '';
  if (WHOLE_NUMERAL.test(word)) return readNumeral(words, at);
  const spelled = readSpelled(words, at);
  if (spelled !== null) return spelled;
  return readPair(words, at) ?? readCardinal(words, at);
}

function readNumeral(words: Words, at: number): Whole {
  const value = new Fraction(words[at] ?? '0');
  if (words[at + 1] !== 'hundred') return { value, to: at + 1, form: 'numeral' };
  return { value: value.mul(100), to: at + 2, form: 'numeral' };
}

/** Three digits or more, one by one: six two oh seven, double oh nine. */
function readSpelled(words: Words, at: number): Whole | null {
  let digits = '';
  let to = at;
  for (;;) {
    const times = words[to] === 'double' ? 2 : words[to] === 'triple' ? 3 : 1;
    const digit = WHOLE_NUMERAL.test(words[to] ?? '')
      ? null
      : digitOf(words[times === 1 ? to : to + 1] ?? '');
    if (digit === null || digits.length > MOST_DIGITS) break;
    digits += digit.repeat(times);
    to += times === 1 ? 1 : 2;
  }
  // A last digit that is the top of a fraction belongs to it: "two three eighths" is no 23.
  if (readDivisor(words, to, false) !== null) return null;
  if (digits.length < 3 || words[to] === 'hundred' || words[to] === 'thousand') return null;
  return { value: new Fraction(digits), to, form: 'spelled' };
}

/** One twenty, fourteen forty, two oh five, sixty thirteen. */
function readPair(words: Words, at: number): Whole | null {
  const left = readBelowHundred(words, at);
  if (left === null || left.value === 0) return null;
  const next = words[left.to] ?? '';
  if (ZEROS.has(next)) {
    const digit = digitOf(words[left.to + 1] ?? '');
    if (digit === null || words[left.to + 2] === 'point') return null;
    return { value: new Fraction(left.value * 100 + Number(digit)), to: left.to + 2, form: 'pair' };
  }
  const right = readBelowHundred(words, left.to);
  if (right === null || right.value < 10) return null;
  const behind = words[right.to] ?? '';
  if (behind === 'hundred' || SCALES.has(behind)) return null;
  // Thirty-two in "two thirty seconds" is no number of its own.
  if (readDivisor(words, left.to, false) !== null || readFraction(words, left.to) !== null) return null;
  return { value: new Fraction(left.value * 100 + right.value), to: right.to, form: 'pair' };
}

/** Three hundred and eighty, fourteen hundred and twenty, sixteen thousand, a hundred. */
function readCardinal(words: Words, at: number): Whole | null {
  let total = 0n;
  let to = at;
  let last = Number.POSITIVE_INFINITY;
  for (;;) {
    const joined = to > at && words[to] === 'and';
    const group = readGroup(words, joined ? to + 1 : to);
    if (group === null) break;
    const scale = SCALES.get(words[group.to] ?? '') ?? 0;
    if (scale >= last || (joined && scale > 0)) break;
    total += BigInt(group.value) * 10n ** BigInt(scale);
    to = scale > 0 ? group.to + 1 : group.to;
    last = scale;
    if (scale === 0) break;
  }
  return to === at ? null : { value: new Fraction(total), to, form: 'cardinal' };
}

/** Up to 9999 in hundreds: twenty-one hundred and eleven. */
function readGroup(words: Words, at: number): { value: number; to: number } | null {
  const article = words[at] === 'a' || words[at] === 'an';
  const next = words[at + 1] ?? '';
  if (article && next !== 'hundred' && !SCALES.has(next)) return null;
  // "Hundred and sixty amps", as it is said in a hurry.
  const alone = words[at] === 'hundred' && !VAGUE.has(words[at - 1] ?? '');
  const left = alone
    ? { value: 1, to: at }
    : article
      ? { value: 1, to: at + 1 }
      : readBelowHundred(words, at);
  if (left === null || words[left.to] !== 'hundred') return left;
  const hundreds = left.value * 100;
  const joined = words[left.to + 1] === 'and';
  const from = joined ? left.to + 2 : left.to + 1;
  const rest = readBelowHundred(words, from);
  const fraction = rest === null || rest.value === 0 ? null : readFraction(words, from);
  if (rest === null || rest.value === 0 || fraction !== null) return { value: hundreds, to: left.to + 1 };
  return { value: hundreds + rest.value, to: rest.to };
}

/** 0 to 99 in words. */
export function readBelowHundred(words: Words, at: number): { value: number; to: number } | null {
  const word = words[at] ?? '';
  const tens = TENS_WORDS.get(word);
  if (tens === undefined) {
    const small = SMALL.get(word);
    return small === undefined ? null : { value: small, to: at + 1 };
  }
  const one = SMALL.get(words[at + 1] ?? '') ?? 0;
  return one >= 1 && one <= 9 ? { value: tens + one, to: at + 2 } : { value: tens, to: at + 1 };
}

function digitOf(word: string): string | null {
  if (ZEROS.has(word)) return '0';
  if (DIGIT.test(word)) return word;
  const value = SMALL.get(word);
  return value !== undefined && value < 10 ? String(value) : null;
}
