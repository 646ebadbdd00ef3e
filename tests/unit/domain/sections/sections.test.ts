import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sectionsWorksheet } from '../../../../src/domain/sections/sections-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

function weigh(given: Readonly<Record<string, unknown>>) {
  const worked = runWorksheet(sectionsWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Readonly<Record<string, unknown>>) => {
  const worked = runWorksheet(sectionsWorksheet, given);
  return worked.ok ? '' : worked.error;
};

describe('The mass of a section', () => {
  // Area × 7850 kg/m3: computed by hand.
  it.each([
    [{ flat: '50x12', length: '6000' }, 4.71, 28.26],
    [{ flat: '50x6' }, 2.355, null],
    [{ flat: '20x20' }, 3.14, null],
  ])('of %j is exact', (given, kgPerM, kg) => {
    expect(weigh(given).result).toEqual({ kgPerM, kg });
  });

  // Area × 7850 kg/m3, three decimals: computed by hand.
  it.each([
    [{ round: '20' }, 2.466],
    [{ round: '25' }, 3.853],
    [{ pipe: '33.7x3.2' }, 2.407],
    [{ pipe: '42.4x3.2' }, 3.094],
    [{ pipe: '48.3x3.2' }, 3.559],
    [{ pipe: '60.3x3.6' }, 5.034],
    [{ pipe: '88.9x5' }, 10.35],
  ])('of %j is %d kg/m', (given, kgPerM) => {
    expect(weigh(given).result.kgPerM).toBeCloseTo(kgPerM, 2);
  });

  // By the formula of EN 10219-2 and EN 10210-2: computed apart from this code, not read in the standards' tables.
  it.each([
    ['40x40x3', 3.303, 3.41, 3.485],
    ['50x50x3', 4.245, 4.352, 4.427],
    ['50x50x5', 6.56, 6.854, 7.065],
    ['60x40x3', 4.245, 4.352, 4.427],
    ['80x80x5', 11.27, 11.564, 11.775],
    ['100x100x5', 14.41, 14.704, 14.915],
    ['100x100x10', 25.565, 27.418, 28.26],
  ])('of a hollow section %s differs cold, hot and sharp', (rhs, cold, hot, sharp) => {
    const masses = ['cold', 'hot', 'sharp'].map((finish) => weigh({ rhs, finish }).result.kgPerM);
    expect(masses.map((mass) => mass.toFixed(3))).toEqual([cold, hot, sharp].map((mass) => mass.toFixed(3)));
  });

  // By the formula of EN 10056-1: computed apart from this code, not read in the standard's table.
  it.each([
    ['25x3', 1.117],
    ['40x4', 2.417],
    ['50x5', 3.77],
    ['50x6', 4.469],
    ['60x6', 5.423],
    ['80x8', 9.63],
  ])('of an angle %s is %d kg/m', (angle, kgPerM) => {
    expect(weigh({ angle }).result.kgPerM).toBeCloseTo(kgPerM, 3);
  });

  it('says which corners a hollow section was given', () => {
    expect(weigh({ shs: '50x3' }).limits.join(' ')).toContain('EN 10219-2');
    expect(weigh({ angle: '52x5' }).limits.join(' ')).toContain('sharp');
  });

  it('takes inches, pieces and another density', () => {
    // A cubic inch is 16.387064 cm3 exactly.
    expect(weigh({ flat: '1 x 1 in', length: '1 in', density: '1 g/cm3' }).result.kg).toBeCloseTo(
      0.016387064,
      12,
    );
    expect(weigh({ flat: '50x12', length: '6 m', quantity: 2 }).result.kg).toBe(56.52);
  });

  it('grows with length as often as the length', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 400 }), fc.integer({ min: 1, max: 9000 }), (width, length) => {
        const { kgPerM, kg } = weigh({ flat: `${String(width)}x10`, length }).result;
        expect(kg).toBeCloseTo((kgPerM * length) / 1000, 9);
      }),
    );
  });
});

describe('A section that is none', () => {
  it.each([
    [{}, 'Give one section'],
    [{ flat: '50x12', round: '30' }, 'Give one section'],
    [{ flat: '50' }, '2 sizes'],
    [{ flat: '50x0' }, 'above zero'],
    [{ round: '-30' }, 'not below zero'],
    [{ round: 'thick' }, 'no size'],
    [{ round: 1e9 }, 'Round bar'],
    [{ pipe: '20x10' }, 'no bore'],
    [{ shs: '50x20' }, 'too thick'],
    [{ angle: '50x50' }, 'thicker than its leg'],
    [{ flat: '50x12', density: '7850 bar' }, 'Density'],
    [{ flat: '50x12', finish: 'rusty' }, 'cold, hot, sharp'],
  ])('%j gets a sentence', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
