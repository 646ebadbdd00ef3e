import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { convertLimits } from '../../../../src/domain/lengths/convert-limits.ts';
import { formatBoth } from '../../../../src/domain/lengths/format-length.ts';
import { parseLength } from '../../../../src/domain/lengths/parse-length.ts';
import { SHOP_DENOMINATORS, toShopFraction } from '../../../../src/domain/lengths/shop-fraction.ts';

describe('toShopFraction', () => {
  // Nearest 1/n, halves up, reduced: computed from 25.4 mm exactly, with the error at 1/64.
  it.each([
    [3, '1/8', '1/8', '1/8', 0.175],
    [6, '1/4', '1/4', '15/64', -0.0469],
    [10, '3/8', '13/32', '25/64', -0.0781],
    [12, '1/2', '15/32', '15/32', -0.0938],
    [20, '13/16', '25/32', '25/32', -0.1562],
    [25, '1', '31/32', '63/64', 0.0031],
    [50, '1 15/16', '1 31/32', '1 31/32', 0.0063],
    [100, '3 15/16', '3 15/16', '3 15/16', 0.0125],
    [1000, '39 3/8', '39 3/8', '39 3/8', 0.125],
  ])('of %i mm is %s, %s and %s', (mm, sixteenth, thirtySecond, sixtyFourth, error) => {
    const length = { mm: String(mm) };
    expect(SHOP_DENOMINATORS.map((n) => toShopFraction(length, n).text)).toEqual([
      sixteenth,
      thirtySecond,
      sixtyFourth,
    ]);
    expect(Number(toShopFraction(length).errorMm)).toBeCloseTo(error, 3);
  });

  // Exact products of the inch: computed.
  it.each([
    ['0.396875', '1/64'],
    ['0.79375', '1/32'],
    ['2.38125', '3/32'],
    ['1.5875', '1/16'],
    ['3.175', '1/8'],
    ['4.7625', '3/16'],
    ['6.35', '1/4'],
    ['7.9375', '5/16'],
    ['9.525', '3/8'],
    ['12.7', '1/2'],
    ['15.875', '5/8'],
    ['19.05', '3/4'],
    ['22.225', '7/8'],
  ])('of %s mm is %s without error', (mm, text) => {
    expect(toShopFraction({ mm })).toEqual({ text, errorMm: '0' });
  });

  it('is never farther than half a mark', () => {
    fc.assert(
      fc.property(fc.nat(10_000_000), fc.constantFrom(...SHOP_DENOMINATORS), (thousandths, n) => {
        const { errorMm } = toShopFraction({ mm: new Fraction(thousandths, 1000).toString() }, n);
        expect(Math.abs(Number(errorMm))).toBeLessThanOrEqual(25.4 / (2 * n));
      }),
    );
  });
});

describe('formatBoth', () => {
  it.each([
    ['1-1/2 in', '1-1/2 in', '38.1 mm'],
    ['5/32 in', '5/32 in', '3.97 mm'],
    [`3'-4"`, `3'-4"`, '1016 mm'],
    ['40 thou', '40 thou', '1.016 mm'],
    ['1.3783 in', '1.3783 in', '35.0088 mm'],
    ['412 mm', '412 mm', '16 7/32 in'],
    ['12.5 mm', '12.5 mm', '0.492 in'],
    ['35.009 mm', '35.009 mm', '1.37831 in'],
    ['12.5 cm', '12.5 cm', '4 59/64 in'],
  ])('writes %s first, then the other system', (text, given, other) => {
    const read = parseLength(text);
    const both = read.ok ? formatBoth(read.value) : null;
    expect([both?.given.text, both?.other.text]).toEqual([given, other]);
  });

  it('tells two sizes apart in inches that were apart in millimetres', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 900_000 }), (thousandths) => {
        const inches = [thousandths, thousandths + 1].map((n) => {
          const read = parseLength(`${(n / 1000).toFixed(3)} mm`);
          return read.ok ? formatBoth(read.value).other.text : '';
        });
        expect(inches[0]).not.toBe(inches[1]);
      }),
    );
  });
});

describe('convertLimits', () => {
  it('rounds the least up and the most down', () => {
    // 35.002 mm = 1.378031… in, 35.018 mm = 1.378661… in: computed from 25.4.
    expect(convertLimits({ least: '35.002', most: '35.018' }, 'mm', 4)).toEqual({
      least: '1.3781',
      most: '1.3786',
    });
  });

  it('gives none where no number so short lies within', () => {
    expect(convertLimits({ least: '35.002', most: '35.018' }, 'mm', 2)).toBeNull();
  });

  it('throws where the least is above the most', () => {
    expect(() => convertLimits({ least: '2', most: '1' }, 'mm', 3)).toThrow(RangeError);
  });

  it('never lies outside the limits that were given', () => {
    const systems = fc.constantFrom('mm' as const, 'in' as const);
    fc.assert(
      fc.property(
        fc.nat(1_000_000),
        fc.nat(5000),
        systems,
        fc.integer({ min: 1, max: 5 }),
        (low, wide, from, places) => {
          const [least, most] = [new Fraction(low, 10_000), new Fraction(low + wide, 10_000)];
          const limits = convertLimits({ least: least.toString(), most: most.toString() }, from, places);
          if (limits === null) return;
          const back = (text: string) =>
            from === 'mm' ? new Fraction(text).mul('25.4') : new Fraction(text).div('25.4');
          expect(back(limits.least).gte(least) && back(limits.most).lte(most)).toBe(true);
        },
      ),
    );
  });
});
