import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { fitOf } from '../../../../src/domain/fits/fit.ts';
import { limitDeviations, parseToleranceClass } from '../../../../src/domain/fits/iso-286.ts';
import { convertLimits } from '../../../../src/domain/lengths/convert-limits.ts';

function limits(size: number | string, name: string) {
  const wanted = parseToleranceClass(name);
  if (!wanted.ok) throw new Error(wanted.error);
  const found = limitDeviations(new Fraction(size), wanted.value);
  return found.ok ? `${String(found.value.upper)}/${String(found.value.lower)}` : found.error;
}
function deviations(size: number | string, name: string) {
  const wanted = parseToleranceClass(name);
  const found = wanted.ok ? limitDeviations(new Fraction(size), wanted.value) : wanted;
  if (!found.ok) throw new Error(found.error);
  return found.value;
}

/**
 * Upper/lower deviations, µm. g6 and the h column: published tables and a tool maker's chart; k6: a bearing maker's
 * catalogue; n6, p6, s6: Narayana, Machine Drawing, table 15.2; f7: a published table; K7, N7 and P7: two independent
 * open lists of ISO 286 that agree.
 */
const COLUMNS = ['g6', 'h6', 'k6', 'n6', 'p6', 's6', 'f7', 'h9', 'H7', 'H8', 'K7', 'N7', 'P7'];
const ROWS: readonly (readonly [number, string])[] = [
  [3, '-2/-8 0/-6 6/0 10/4 12/6 20/14 -6/-16 0/-25 10/0 14/0 0/-10 -4/-14 -6/-16'],
  [6, '-4/-12 0/-8 9/1 16/8 20/12 27/19 -10/-22 0/-30 12/0 18/0 3/-9 -4/-16 -8/-20'],
  [10, '-5/-14 0/-9 10/1 19/10 24/15 32/23 -13/-28 0/-36 15/0 22/0 5/-10 -4/-19 -9/-24'],
  [16, '-6/-17 0/-11 12/1 23/12 29/18 39/28 -16/-34 0/-43 18/0 27/0 6/-12 -5/-23 -11/-29'],
  [25, '-7/-20 0/-13 15/2 28/15 35/22 48/35 -20/-41 0/-52 21/0 33/0 6/-15 -7/-28 -14/-35'],
  [40, '-9/-25 0/-16 18/2 33/17 42/26 59/43 -25/-50 0/-62 25/0 39/0 7/-18 -8/-33 -17/-42'],
  [60, '-10/-29 0/-19 21/2 39/20 51/32 72/53 -30/-60 0/-74 30/0 46/0 9/-21 -9/-39 -21/-51'],
  [80, '-10/-29 0/-19 21/2 39/20 51/32 78/59 -30/-60 0/-74 30/0 46/0 9/-21 -9/-39 -21/-51'],
  [100, '-12/-34 0/-22 25/3 45/23 59/37 93/71 -36/-71 0/-87 35/0 54/0 10/-25 -10/-45 -24/-59'],
];

describe('Limit deviations of ISO 286', () => {
  it.each(ROWS)('at %i mm are those of the published tables', (size, row) => {
    expect(COLUMNS.map((name) => limits(size, name)).join(' ')).toBe(row);
  });

  // As above; M7, N9, P9, R7 and S7 by two open lists that agree; js and JS: half of the tolerance, exactly.
  it.each([
    ['d9', '-65/-117'],
    ['e8', '-40/-73'],
    ['h7', '0/-21'],
    ['h11', '0/-130'],
    ['js6', '6.5/-6.5'],
    ['m6', '21/8'],
    ['r6', '41/28'],
    ['D10', '149/65'],
    ['E9', '92/40'],
    ['F8', '53/20'],
    ['G7', '28/7'],
    ['H9', '52/0'],
    ['H11', '130/0'],
    ['JS7', '10.5/-10.5'],
    ['M7', '0/-21'],
    ['R7', '-20/-41'],
    ['S7', '-27/-48'],
    ['N9', '0/-52'],
    ['P9', '-22/-74'],
    // A bearing maker's catalogue:
    ['k5', '11/2'],
    ['m5', '17/8'],
    ['n5', '24/15'],
    ['j5', '5/-4'],
    ['j6', '9/-4'],
    ['h5', '0/-9'],
  ])('25 %s is %s', (name, expected) => {
    expect(limits(25, name)).toBe(expected);
  });

  // Narayana, Machine Drawing, table 15.2.
  it.each([
    [24, 'm n p r s', '8 15 22 28 35'],
    [40, 'm n p r s', '9 17 26 34 43'],
    [65, 'm n p r s', '11 20 32 41 53'],
    [80, 'r s', '43 59'],
    [100, 'm n p r s', '13 23 37 51 71'],
    [120, 'r s', '54 79'],
  ])('at %i mm the shafts %s begin %s µm above nominal', (size, letters, lower) => {
    expect(
      letters
        .split(' ')
        .map((letter) => deviations(size, `${letter}6`).lower)
        .join(' '),
    ).toBe(lower);
  });

  it.each([
    // ISO 286-2:1988 printed these wrong; corrected by its corrigendum of 2006.
    ['E8', 100, 'upper', 126],
    ['R10', 25, 'upper', -28],
    ['f9', 300, 'lower', -186],
    ['A13', 330, 'upper', 2090],
  ] as const)('%s at %i mm has the corrected value, not the misprint of 1988', (name, size, which, value) => {
    expect(deviations(size, name)[which]).toBe(value);
  });

  it('keeps n6 in its steps above 160 mm, where an open list has slipped', () => {
    // n is 27 to 180, 31 to 250, 34 to 315, 37 to 400 and 40 to 500 mm.
    expect([170, 190, 260, 350, 500].map((size) => deviations(size, 'n6').lower)).toEqual([
      27, 31, 34, 37, 40,
    ]);
  });

  it('adds no delta to holes up to 3 mm, where an open list does', () => {
    expect([limits(3, 'R7'), limits(3, 'S7')]).toEqual(['-10/-20', '-14/-24']);
  });

  it('has the exception M6 over 250 to 315 mm', () => {
    // ISO 286-1, table 3, note: from memory.
    expect([limits(315, 'M6'), limits(316, 'M6')]).toEqual(['-9/-41', '-10/-46']);
  });

  it('takes the upper end of a step as part of it', () => {
    expect([limits(10, 'H7'), limits('10.001', 'H7'), limits(500, 'H7')]).toEqual(['15/0', '18/0', '63/0']);
  });

  it('ships tables: a formula would give other numbers', () => {
    // ISO 286-1, table 1; 16 i is 8.67 up to 3 mm, and 10 i is 38.88 over 400 mm.
    expect([limits(3, 'H7'), limits(500, 'H6')]).toEqual(['10/0', '40/0']);
  });

  it.each([
    [501, 'H7', 'go to 500 mm'],
    [0, 'H7', 'above zero'],
    [20, 't6', 'not made at 20 mm'],
    [25, 'K9', 'not made'],
    [25, 'j9', 'not made'],
    [1, 'a9', 'not made'],
  ])('%d mm %s is refused', (size, name, sentence) => {
    expect(limits(size, name)).toContain(sentence);
  });

  it.each(['', 'H', '7', 'H4', 'H15', 'Hh7', 'zc7', 'CD7', 'H7/g6', 'toString', 'h7.5'])(
    '%j is no class that is known',
    (name) => {
      expect(parseToleranceClass(name).ok).toBe(false);
    },
  );
});

describe('A fit', () => {
  // Hole minus shaft from the tables above: computed by hand.
  it.each([
    ['H7', 'g6', 7, 41, 'clearance'],
    ['H7', 'h6', 0, 34, 'clearance'],
    ['H7', 'k6', -15, 19, 'transition'],
    ['H7', 'n6', -28, 6, 'transition'],
    ['H7', 'p6', -35, -1, 'interference'],
    ['H7', 's6', -48, -14, 'interference'],
    ['H8', 'f7', 20, 74, 'clearance'],
    ['H9', 'd9', 65, 169, 'clearance'],
    ['H11', 'c11', 110, 370, 'clearance'],
    ['K7', 'h6', -15, 19, 'transition'],
  ])('25 %s/%s', (hole, shaft, least, most, kind) => {
    expect(fitOf(deviations(25, hole), deviations(25, shaft))).toEqual({ least, most, kind });
  });

  const size = fc.integer({ min: 1001, max: 500_000 }).map((um) => new Fraction(um, 1000).toString());
  const grade = fc.integer({ min: 5, max: 8 });
  const holes = fc.constantFrom('A', 'C', 'F', 'H', 'JS', 'K', 'M', 'N', 'P', 'R', 'S', 'U');
  const shafts = fc.constantFrom('a', 'c', 'f', 'h', 'js', 'k', 'm', 'n', 'p', 'r', 's', 'u');

  it('is hole minus shaft, whichever two parts are made', () => {
    fc.assert(
      fc.property(
        size,
        grade,
        holes,
        shafts,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (mm, it, h, s, at) => {
          const [hole, shaft] = [deviations(mm, `${h}${String(it)}`), deviations(mm, `${s}${String(it)}`)];
          const made = (of: typeof hole, part: number) => of.lower + (of.upper - of.lower) * part;
          const clearance = made(hole, at) - made(shaft, 1 - at);
          const fit = fitOf(hole, shaft);
          expect(clearance).toBeGreaterThanOrEqual(fit.least - 1e-9);
          expect(clearance).toBeLessThanOrEqual(fit.most + 1e-9);
        },
      ),
    );
  });

  it('has limits as far apart as the standard tolerance, in order', () => {
    fc.assert(
      fc.property(size, grade, holes, (mm, it, letter) => {
        const [found, plain] = [deviations(mm, `${letter}${String(it)}`), deviations(mm, `H${String(it)}`)];
        expect(found.upper - found.lower).toBe(plain.upper);
      }),
    );
  });

  it('reads in inches inside its limits, never outside', () => {
    fc.assert(
      fc.property(size, grade, shafts, (mm, it, letter) => {
        const { lower, upper } = deviations(mm, `${letter}${String(it)}`);
        const [least, most] = [lower, upper].map((um) => new Fraction(mm).add(new Fraction(um).div(1000)));
        const read = convertLimits({ least: least!.toString(), most: most!.toString() }, 'mm', 5);
        if (read === null) return;
        expect(new Fraction(read.least).mul('25.4').gte(least!)).toBe(true);
        expect(new Fraction(read.most).mul('25.4').lte(most!)).toBe(true);
      }),
    );
  });
});
