import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { parseElectrode, tradeDiameter } from '../../../../src/domain/weld/electrodes.ts';
import {
  allowableShear,
  filletMass,
  heatInput,
  leastLeg,
  throatOf,
} from '../../../../src/domain/weld/fillet.ts';
import { weldWorksheet } from '../../../../src/domain/weld/weld-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
const OURS: Given = { electrode: 'E7018', diameter: 3.2, leg: 5, length: 400, thickness: 10, other: 12 };
function weld(given: Given) {
  const worked = runWorksheet(weldWorksheet, { ...OURS, ...given });
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(weldWorksheet, { ...OURS, ...given });
  return worked.ok ? '' : worked.error;
};

/** A kip on an inch, N on a mm. */
const KIP_PER_INCH = 4448.2216152605 / 25.4;

describe('A fillet', () => {
  it('has its throat at leg / √2', () => {
    expect(throatOf(6)).toBeCloseTo(4.243, 3);
    expect(throatOf(6.35) / 25.4).toBeCloseTo(0.1768, 4);
  });

  // Blodgett's table, printed as table 9-6 in Shigley's Mechanical Engineering Design; kip per inch.
  it.each([
    ['1/8', 1.59, 1.86],
    ['3/16', 2.39, 2.78],
    ['1/4', 3.18, 3.71],
    ['5/16', 3.98, 4.64],
    ['3/8', 4.77, 5.57],
    ['1/2', 6.36, 7.42],
  ])('of %s in is allowed %d kip/in with E60 and %d with E70', (leg, e60, e70) => {
    const mm = new Fraction(leg).mul('25.4').valueOf();
    expect(allowableShear(mm, 60) / KIP_PER_INCH).toBeCloseTo(e60, 1);
    expect(allowableShear(mm, 70) / KIP_PER_INCH).toBeCloseTo(e70, 1);
  });

  it('of 1/4 in E70 is not the 2.78 kip/in that one calculator prints', () => {
    expect(allowableShear(6.35, 70) / KIP_PER_INCH).toBeCloseTo(3.71, 2);
  });

  // The plain triangle, 7850 kg/m3: computed by hand. 1/2 in: .424 lb/ft in a filler maker's handbook.
  it.each([
    [3, 0.0353],
    [5, 0.0981],
    [6, 0.1413],
    [8, 0.2512],
    [10, 0.3925],
  ])('of %i mm weighs %d kg a metre', (leg, kg) => {
    expect(filletMass(leg, 1000)).toBeCloseTo(kg, 4);
  });

  it('of 1/2 in weighs .424 lb a foot', () => {
    expect(filletMass(12.7, 304.8) / 0.45359237).toBeCloseTo(0.425, 2);
  });

  it('takes 0.96 kJ/mm at 25 V, 120 A and 150 mm/min', () => {
    // Q = 0.8 U I 60 / (1000 v): computed by hand.
    expect(heatInput(25, 120, 150)).toBeCloseTo(0.96, 6);
    expect(heatInput(24, 110, 180)).toBeCloseTo(0.704, 6);
  });
});

describe('The least leg', () => {
  const least = (one: string | number, other: string | number, lowHydrogen = true, cyclic = false) =>
    leastLeg([new Fraction(one), new Fraction(other)], { lowHydrogen, cyclic }).leg.valueOf();

  // AWS D1.1:2025, table 7.7, by secondary sources; bounds inclusive.
  it.each([
    [6, 3],
    ['6.35', 3],
    ['6.4', 5],
    [12, 5],
    ['12.7', 5],
    [13, 6],
    [20, 6],
    [21, 8],
  ])('at %s mm is %i mm', (thickness, leg) => {
    expect(least(thickness, 100)).toBe(leg);
  });

  it('goes by the thinner part with low hydrogen, by the thicker otherwise', () => {
    expect([least(6, 25, true), least(10, 25, false)]).toEqual([3, 8]);
  });

  it('is never more than the thinner part', () => {
    // 1 in plate to 3/16 in plate with E6010: 5/16 in by the table, held to 3/16.
    expect(least('25.4', '4.7625', false)).toBe(4.7625);
  });

  it('is at least 5 mm under a load that comes and goes', () => {
    expect(least(6, 6, true, true)).toBe(5);
  });
});

describe('Electrodes', () => {
  it.each([
    ['E7018', 70, true],
    ['6013', 60, false],
    ['E7018-1', 70, true],
    ['e6011', 60, false],
    ['E7024', 70, false],
  ])('%s', (text, strengthKsi, lowHydrogen) => {
    expect(parseElectrode(text)).toMatchObject({ ok: true, value: { strengthKsi, lowHydrogen } });
  });

  it.each([
    ['ER70S-6', 'not covered'],
    ['E71T-1', 'not covered'],
    ['E9018', 'no electrode'],
    ['rod', 'no electrode'],
  ])('%s is refused', (text, sentence) => {
    const read = parseElectrode(text);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });

  it.each([
    ['3.2', '1/8'],
    ['3.175', '1/8'],
    ['2.5', '3/32'],
    ['4.76', '3/16'],
    ['3', null],
  ])('%s mm is %s', (mm, inches) => {
    expect(tradeDiameter(new Fraction(mm))).toBe(inches);
  });

  // Machinery's Handbook, 31st edition, page 1594, tables 13 and 14.
  it.each([
    ['E7018', '1/8 in', [110, 160]],
    ['E7018', '2.5', [70, 105]],
    ['E6013', '3.2', [75, 135]],
    ['E7014', '5/32 in', [145, 210]],
    ['E7024', '1/4 in', [325, 450]],
    ['E6013', '7/32 in', null],
    ['E6010', '3.2', null],
  ])('%s of %s takes %j A', (electrode, diameter, amperes) => {
    expect(weld({ electrode, diameter }).result.currentA).toEqual(amperes);
  });
});

describe('The weld worksheet', () => {
  it('counts electrodes by weight and by number', () => {
    // 1 m of 6 mm: 0.1413 kg, / 0.62 = 0.228 kg; a 3.2 × 350 core has 18.9 g without its stub.
    const { result } = weld({ leg: 6, length: 1000 });
    expect(result.electrodesKg).toBeCloseTo(0.228, 3);
    expect(result.electrodes).toBe(8);
    expect(weld({ leg: 6, length: 1000, efficiency: '0.55' }).result.electrodesKg).toBeCloseTo(0.257, 3);
  });

  it('gives no strength under a load that comes and goes', () => {
    expect(weld({ cyclic: true }).result.allowableKN).toBeNull();
    expect(weld({ cyclic: true }).notChecked.join(' ')).toContain('Fatigue');
    expect(weld({}).result.allowableKN).toBeGreaterThan(0);
  });

  it('warns of a leg below the least, above the plate, and of a current outside its range', () => {
    expect(weld({ leg: 3 }).warnings.join(' ')).toContain('below the least');
    expect(weld({ leg: 12 }).warnings.join(' ')).toContain('larger than the thinner');
    expect(weld({ volts: 25, amps: 200, speed: 150 }).warnings.join(' ')).toContain('outside 110 to 160 A');
    expect(weld({}).warnings).toEqual([]);
  });

  it('names the least leg so that nobody takes it for strength', () => {
    const names = weld({}).working.map(({ what }) => what);
    expect(names).toContain('Least leg against cracking; says nothing about strength');
  });

  it.each([
    [{ process: 'mig' }, 'mig welding is not covered'],
    [{ diameter: 3 }, 'no size of electrode'],
    [{ leg: 0 }, 'above zero'],
    [{ leg: 100 }, '2 to 40 mm'],
    [{ thickness: 1000 }, '1.5 to 150'],
    [{ efficiency: 62 }, '0.2 to 1'],
    [{ volts: 25 }, 'together'],
    [{ electrode: undefined }, 'Electrode'],
    [{ length: 'long' }, 'no size'],
  ])('refuses %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
