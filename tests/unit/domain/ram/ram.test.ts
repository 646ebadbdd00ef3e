import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bucklingLoad, ROD_YIELD } from '../../../../src/domain/ram/buckling.ts';
import { parsePump } from '../../../../src/domain/ram/pump.ts';
import { ramWorksheet } from '../../../../src/domain/ram/ram-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
const OURS: Given = { bore: 100, rod: 45, stroke: 600, pressure: '165 bar' };
function ram(given: Given) {
  const worked = runWorksheet(ramWorksheet, { ...OURS, ...given });
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(ramWorksheet, { ...OURS, ...given });
  return worked.ok ? '' : worked.error;
};

describe('A ram', () => {
  // F = p A, v = Q / A, hp = Q p / 1714.29: computed by hand from exact factors.
  it('of 4 in bore at 2500 psi and 11 gpm', () => {
    const { result } = ram({
      bore: '4 in',
      rod: '1.75 in',
      stroke: '24 in',
      pressure: '2500 psi',
      pump: '11 gpm@2500 psi',
    });
    expect(result.extendForce.lbf).toBeCloseTo(31_415.9, 1);
    expect(result.extendForce.shortTons).toBeCloseTo(15.708, 3);
    expect(result.extendForce.tonnesForce).toBeCloseTo(14.25, 2);
    expect(result.extendForce.kN).toBeCloseTo(139.745, 3);
    expect(result.retractForce.lbf).toBeCloseTo(25_402.7, 1);
    expect(result.extendS).toBeCloseTo(7.121, 3);
    expect(result.retractS).toBeCloseTo(5.758, 3);
    // 301.59 in3, also printed by a maker of log splitters as 301.
    expect(result.oilLitres).toBeCloseTo(1.3056 * 3.785411784, 3);
    expect(result.stages[0]?.hydraulicKW).toBeCloseTo(16.044 * 0.7457, 2);
    expect(result.stages[0]?.shaftHp).toBeCloseTo(18.88, 1);
  });

  it('of 5 in bore', () => {
    const { result } = ram({
      bore: '5 in',
      rod: '2.5 in',
      stroke: '24 in',
      pressure: '2500 psi',
      pump: '16 gpm@2500psi',
    });
    expect(result.extendForce.lbf).toBeCloseTo(49_087.4, 1);
    expect(result.extendForce.shortTons).toBeCloseTo(24.54, 2);
    expect(result.extendS).toBeCloseTo(7.65, 3);
  });

  it('of 4 in bore at 3000 psi presses 18.85 short tons, not two', () => {
    expect(ram({ bore: '4 in', pressure: '3000 psi' }).result.extendForce.shortTons).toBeCloseTo(18.85, 2);
  });

  it('of 80/50 mm', () => {
    const { result } = ram({ bore: 80, rod: 50, pressure: '160 bar', pump: '40 L/min@160 bar' });
    expect(result.extendForce.kN).toBeCloseTo(80.425, 3);
    expect(result.retractForce.kN).toBeCloseTo(49.009, 3);
    expect(result.stages[0]?.extendMmPerS).toBeCloseTo(132.63, 2);
    expect(result.stages[0]?.retractMmPerS).toBeCloseTo(217.65, 2);
    expect(result.stages[0]?.hydraulicKW).toBeCloseTo(10.667, 3);
    expect(result.stages[0]?.shaftKW).toBeCloseTo(12.55, 2);
  });

  it('has two segments of speed on a two-stage pump, and never all the oil at all the pressure', () => {
    const pump = '11 gpm@650psi,3 gpm@2500psi';
    const { result } = ram({
      bore: '4 in',
      rod: '1.75 in',
      stroke: '24 in',
      pressure: '2500 psi',
      pump,
      pressing: '2 in',
    });
    // 4.17 and 4.38 hp; 11 gpm at 2500 psi would be 16.04.
    expect(result.stages.map(({ hydraulicKW }) => hydraulicKW / 0.7456998715822702)).toEqual([
      expect.closeTo(4.17, 2),
      expect.closeTo(4.38, 2),
    ]);
    // 22 in at 11 gpm and 2 in at 3 gpm: 12.5664 in2 × L / (231 Q / 60).
    expect(result.extendS).toBeCloseTo((12.5664 * 22 * 60) / 231 / 11 + (12.5664 * 2 * 60) / 231 / 3, 3);
    expect(ram({ pressure: '2500 psi', pump }).result.extendS).toBeNull();
  });

  it('takes the lower of pump and relief, and says when they differ', () => {
    const low = ram({ pressure: '165 bar', pump: '20 L/min@150 bar' });
    expect([low.result.pressureBar, low.warnings.join(' ')]).toEqual([
      150,
      expect.stringContaining('differ'),
    ]);
    const high = ram({ pressure: '150 bar', pump: '20 L/min@165 bar' });
    expect([high.result.pressureBar, high.result.stages[0]?.upToBar]).toEqual([150, 150]);
    expect(ram({ pump: '20 L/min@165 bar' }).warnings).toEqual([]);
  });

  it('says that rod and frame are not checked without length and ends', () => {
    expect(ram({}).notChecked.join(' ')).toContain('Rod and frame not checked');
    const checked = ram({ extended: 1300, mounting: 'pinned' });
    expect(checked.notChecked.join(' ')).not.toContain('Rod and frame');
    expect(checked.result.bucklingFactor).toBeGreaterThan(1);
  });

  it('reckons the oil in a hose', () => {
    // 10 gpm in 1/2 in: 0.320833 × 10 / (π/4 × 0.25) = 16.34 ft/s.
    expect(ram({ pump: '10 gpm@165 bar', hose: '1/2 in' }).result.hoseMPerS).toBeCloseTo(16.34 * 0.3048, 2);
    expect(ram({ pump: '10 gpm@165 bar', hose: '1/4 in' }).warnings.join(' ')).toContain('is usual');
  });

  it('tells the continuous from the peak rating of an engine', () => {
    const pump = '20 L/min@165 bar'; // 5.5 kW in the oil, 6.47 at the shaft
    expect(ram({ pump, engine: '7 kW' }).warnings).toEqual([]);
    expect(ram({ pump, engine: '7 kW', rating: 'peak' }).warnings.join(' ')).toContain('holds 5.95 kW');
    expect(ram({ pump, engine: '6 kW' }).warnings.join(' ')).toContain('asks for 6.47 kW');
  });

  it('says what the rod side would see with its port shut', () => {
    // 100² / (100² − 45²) = 1.2539
    expect(ram({}).result.rodSidePressureBar).toBeCloseTo(165 * 1.2539, 1);
  });

  it('never pushes less with more pressure, and never pulls more than it pushes', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 699 }), fc.integer({ min: 50, max: 300 }), (bar, bore) => {
        const [less, more] = [bar, bar + 1].map(
          (pressure) => ram({ bore, pressure: `${String(pressure)} bar` }).result,
        );
        expect(more!.extendForce.kN).toBeGreaterThan(less!.extendForce.kN);
        expect(more!.retractForce.kN).toBeLessThan(more!.extendForce.kN);
      }),
    );
  });

  it.each([
    [{ rod: 100 }, 'thinner than the bore'],
    [{ bore: 5000 }, 'up to 1000 mm'],
    [{ bore: 0 }, 'above zero'],
    [{ pressure: '165' }, 'no unit'],
    [{ pressure: '5000 bar' }, '1 to 700 bar'],
    [{ pressure: '-5 bar' }, 'below zero'],
    [{ pump: '11 gpm' }, 'no stage'],
    [{ pump: '3 gpm@2500psi,11 gpm@650psi' }, 'less oil and more pressure'],
    [{ pressing: 700 }, 'longer than the stroke'],
    [{ extended: 1300 }, 'together'],
    [{ extended: 500, mounting: 'pinned' }, 'not shorter than the stroke'],
    [{ hoserating: '100 bar' }, 'Do not run it'],
  ])('refuses %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});

describe('A pump', () => {
  it.each([
    ['11 gpm@650psi,3 gpm@2500psi', [650, 2500]],
    ['11 gpm @ 650 psi, 3 gpm @ 2,500 psi', [650, 2500]],
  ])('%s', (text, pressures) => {
    const read = parsePump(text);
    const found = read.ok
      ? read.value.map(({ pressure }) => Math.round(pressure.valueOf() / 6894.757293))
      : [];
    expect(found).toEqual(pressures);
  });
});

describe('A rod that buckles', () => {
  it('by Euler, as published', () => {
    // d 50 mm, 2 m, 205 GPa, pinned: 31.04 kN with a factor of 5 (an engineering reference site); 0.5 m, 20 m, 200
    // GPa: 15.14 MN (a textbook problem).
    expect(bucklingLoad(50, 2000, 'pinned').load / 5).toBeCloseTo(31_040, -2);
    expect(bucklingLoad(500, 20_000, 'pinned', 200_000).load / 1e6).toBeCloseTo(15.14, 2);
  });

  it('by Johnson where Euler would promise more than the steel has', () => {
    const short = bucklingLoad(50, 300, 'pinned');
    expect([short.formula, short.load < (ROD_YIELD * Math.PI * 50 ** 2) / 4]).toEqual(['Johnson', true]);
  });

  it('at less the longer it is, without a step between the formulas', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 10, max: 100 }),
        fc.integer({ min: 100, max: 5000 }),
        (diameter, length) => {
          const [here, next] = [
            bucklingLoad(diameter, length, 'pinned'),
            bucklingLoad(diameter, length + 1, 'pinned'),
          ];
          expect(next.load).toBeLessThan(here.load);
          expect(next.load / here.load).toBeGreaterThan(0.97);
        },
      ),
    );
  });
});
