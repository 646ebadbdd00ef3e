import { describe, expect, test } from 'vitest';
import { massOfParts } from '../../../../src/domain/sections/part-mass.ts';
import { PRESS_PARTS } from '../../../../src/seed/press-parts.ts';

const part = (material: string, size: string, quantity = 1) => ({
  number: '1',
  name: 'piece',
  quantity,
  material,
  size,
});

describe('what the sections of a parts list weigh', () => {
  test.each([
    // 4.71 kg/m: 50 × 12 mm at 7850 kg/m³, by arithmetic.
    ['50 x 12 flat', '6000 mm', 28.26],
    ['50 x 12 mm flat bar', '6000', 28.26],
    ['12 mm plate', '50 x 6000 mm', 28.26],
    // π/4 × (30 mm)² × 7850 kg/m³ = 5.549 kg/m, by arithmetic.
    ['30 mm bright bar', '1000 mm', 5.549],
    // A millimetre of stainless sheet, 7900 kg/m³: 7.9 kg/m².
    ['1 mm stainless', '1000 x 1000 mm', 7.9],
  ])('%s, %s', (material, size, kg) => {
    expect(massOfParts([part(material, size)]).kg).toBeCloseTo(kg, 2);
  });

  test('counts every piece', () => {
    expect(massOfParts([part('50 x 12 flat', '6000 mm', 4)]).kg).toBeCloseTo(113.04, 2);
  });

  test.each([
    ['ash, untreated', '36 x 8 x 460 mm', 'not one section of steel'],
    ['120 x 60 channel', '780 mm', 'no section that is read here'],
    ['8 mm plate', '120 mm', 'no width by length'],
    ['50 x 12 flat', 'about 6 m', 'no length'],
    ['40 x 40 x 30 box', '100 mm', 'wall'],
    ['', '', 'no section that is read here'],
  ])('leaves out %j, %j and says why', (material, size, why) => {
    const { kg, parts } = massOfParts([part(material, size)]);
    expect(kg).toBe(0);
    expect(parts[0]).toMatchObject({ kg: null, read: expect.stringContaining(why) as string });
  });

  test('adds up the steel of the demo’s press, and lists the rest', () => {
    const list = PRESS_PARTS.map(([number, name, , quantity, material, size]) => ({
      number,
      name,
      quantity,
      material,
      size,
    }));
    const { kg, parts } = massOfParts(list);
    expect(parts).toHaveLength(34);
    expect(parts.filter((one) => one.kg !== null).map(({ number }) => number)).toEqual(
      expect.arrayContaining(['101', '102', '104', '105', '106', '107', '113', '114', '117']),
    );
    expect(kg).toBeGreaterThan(80);
    expect(kg).toBeLessThan(200);
  });
});
