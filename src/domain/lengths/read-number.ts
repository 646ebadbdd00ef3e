import Fraction from 'fraction.js';
import { dividesInches } from './length.ts';

/** A number as it stands in a text. */
export interface NumberRead {
  readonly value: Fraction;
  /** Just after its last character. */
  readonly end: number;
  /** Decimals that were typed; null for a fraction or a mixed number. */
  readonly decimals: number | null;
}

/** Fractions that are one character. */
export const VULGAR: Readonly<Record<string, string>> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
};

/** 1-1/2, 1 1/2, 3/4, 1½: the whole part, then the fraction. */
const MIXED = /(?:(\d{1,5})(?:-|[ \u00a0]))?(\d{1,3})[/⁄](\d{1,3})(?![\d/])/y;
const VULGAR_MIXED = /(?:(\d{1,5})[- \u00a0]?)?([½¼¾⅛⅜⅝⅞])/y;

/** 1500, 1,500, 35.009, .5; and 12,5 or 0,125 with a decimal comma, which no thousands could be. */
const DECIMAL_COMMA = /(?:0,(\d{1,6})|\d{1,5},(\d{1,2}))(?![\d,])/y;
const DECIMAL = /(?:\d{1,3}(?:,\d{3})+|\d{1,7})?(?:\.(\d{1,6}))?(?![\d])/y;

/** Tries a sticky pattern at a place in a text. */
export function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

/** The number that begins at a place in a text, the longest that makes sense; null for none. */
export function readNumber(text: string, at: number): NumberRead | null {
  return readFraction(text, at) ?? readDecimal(text, at);
}

function readFraction(text: string, at: number): NumberRead | null {
  const plain = matchAt(MIXED, text, at);
  const vulgar = plain === null ? matchAt(VULGAR_MIXED, text, at) : null;
  const found = plain ?? vulgar;
  if (found === null) return null;
  const [whole = '0', over, under] = [
    found[1],
    ...(plain === null ? (VULGAR[found[2] ?? ''] ?? '').split('/') : [found[2], found[3]]),
  ];
  const [numerator, denominator] = [Number(over), Number(under)];
  // 3/8 and 1-1/2 are sizes; 12/11 is a date, 1-20/3 nothing at all.
  if (!dividesInches(denominator) || numerator === 0 || numerator >= denominator) return null;
  return {
    value: new Fraction(numerator, denominator).add(Number(whole)),
    end: at + found[0].length,
    decimals: null,
  };
}

function readDecimal(text: string, at: number): NumberRead | null {
  const comma = matchAt(DECIMAL_COMMA, text, at);
  const found = comma ?? matchAt(DECIMAL, text, at);
  const typed = found?.[0] ?? '';
  if (found === null || !/\d/.test(typed)) return null;
  const digits = comma === null ? typed.replaceAll(',', '') : typed.replace(',', '.');
  const decimals = (found[1] ?? found[2] ?? '').length;
  return {
    value: new Fraction(digits.startsWith('.') ? `0${digits}` : digits),
    end: at + typed.length,
    decimals,
  };
}
