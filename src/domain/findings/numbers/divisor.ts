import { DIVISORS, ORDINAL_ONES, TENS_WORDS } from './number-words.ts';

/** A divisor in numerals: 32nds, 16th. */
const NUMERAL = /^(\d+)(?:st|nd|rd|th)s?$/;

/**
 * What a numerator is divided by: "eighths", "thirty seconds", "30 second", "64ths".
 * @param single whether the numerator is one, so that "thirty second" without an s is meant
 */
export function readDivisor(
  words: readonly string[],
  at: number,
  single: boolean,
): { readonly value: number; readonly to: number } | null {
  const word = words[at] ?? '';
  const numeral = NUMERAL.exec(word)?.[1];
  if (numeral !== undefined && Number(numeral) > 2) return { value: Number(numeral), to: at + 1 };
  const plain = DIVISORS.get(word);
  if (plain !== undefined) return { value: plain, to: at + 1 };
  const tens = TENS_WORDS.get(word) ?? (/^[2-9]0$/.test(word) ? Number(word) : undefined);
  const one = ORDINAL_ONES.get(words[at + 1] ?? '');
  if (tens === undefined || one === undefined) return null;
  // "A thirty second clip" is a time.
  if (single && one === 2 && TIMED.has(words[at + 2] ?? '')) return null;
  return { value: tens + one, to: at + 2 };
}

/** What lasts seconds. */
const TIMED: ReadonlySet<string> = new Set(
  'timer wait rest soak dwell clip video delay burst window break job cure pause shot cycle count'.split(' '),
);
