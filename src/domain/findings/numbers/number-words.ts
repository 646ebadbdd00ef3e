/** Number words of English, as voices and recognisers have them. */
const ONES =
  'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen sixteen seventeen eighteen nineteen';
const TENS = 'twenty thirty forty fifty sixty seventy eighty ninety';
const ORDINALS =
  'first second third fourth fifth sixth seventh eighth ninth tenth eleventh twelfth thirteenth fourteenth fifteenth sixteenth seventeenth eighteenth nineteenth';

/** Zero to nineteen. */
export const SMALL: ReadonlyMap<string, number> = new Map([
  ...ONES.split(' ').map((word, value) => [word, value] as const),
]);
export const TENS_WORDS: ReadonlyMap<string, number> = new Map([
  ...TENS.split(' ').map((word, index) => [word, 20 + index * 10] as const),
  ['fourty', 40],
]);
/** What is said for the digit 0. */
export const ZEROS: ReadonlySet<string> = new Set(['zero', 'oh', 'o', 'nought', 'naught', 'aught', 'nil']);

/** Words for 10 to a power that multiply what stands before them. */
export const SCALES: ReadonlyMap<string, number> = new Map([
  ['thousand', 3],
  ['grand', 3],
  ['million', 6],
  ['billion', 9],
  ['trillion', 12],
  ['quadrillion', 15],
  ['quintillion', 18],
  ['sextillion', 21],
]);

/** What a whole is divided by: eighths, sixteenth, 64ths. "Second" and "first" divide only behind a ten. */
export const DIVISORS: ReadonlyMap<string, number> = new Map(
  [
    ...ORDINALS.split(' ')
      .map((word, index) => [word, index + 1] as const)
      .filter(([, value]) => value > 2),
    ['half', 2] as const,
    ['quarter', 4] as const,
    ['hundredth', 100] as const,
    ['thousandth', 1000] as const,
    ['thirtieth', 30] as const,
    // As recognisers write eighth and sixteenth.
    ['eight', 8] as const,
    ['sixteen', 16] as const,
  ].flatMap(([word, value]) => [
    ...(word === 'eight' || word === 'sixteen' ? [] : [[word, value] as const]),
    [word === 'half' ? 'halves' : `${word}s`, value] as const,
  ]),
);

/** The unit place of a divisor behind a ten: thirty-second, sixty-fourth. */
export const ORDINAL_ONES: ReadonlyMap<string, number> = new Map(
  ORDINALS.split(' ')
    .slice(0, 9)
    .flatMap((word, index) => [[word, index + 1] as const, [`${word}s`, index + 1] as const]),
);
