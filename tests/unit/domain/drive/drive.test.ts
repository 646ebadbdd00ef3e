import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { driveWorksheet } from '../../../../src/domain/drive/drive-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
function drive(given: Given) {
  const worked = runWorksheet(driveWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(driveWorksheet, given);
  return worked.ok ? '' : worked.error;
};

describe('A drive', () => {
  // Computed by hand.
  it('slows by its ratio, in one step or two', () => {
    expect(drive({ rpm: 1440, driver: 80, driven: 240 }).result).toMatchObject({ ratio: 3, rpm: 480 });
    expect(drive({ rpm: 1440, driver: 80, driven: 240, driver2: 15, driven2: 45 }).result.rpm).toBe(160);
  });

  it('takes inches and teeth', () => {
    expect(drive({ rpm: '1725 rpm', driver: '3 in', driven: '9 in' }).result.rpm).toBe(575);
  });

  it('has a speed at the rim, and a speed for cutting', () => {
    // π × 0.3 × 480 = 452.39; 25 / (π × 0.025) = 318.3.
    expect(drive({ rpm: 480, diameter: 300 }).result.surfaceMPerMin).toBeCloseTo(452.39, 2);
    expect(drive({ diameter: 25, cutting: '25 m/min' }).result.rpmForCutting).toBeCloseTo(318.3, 1);
    // 100 ft/min at 1 in: 12 × 100 / π = 381.97.
    expect(drive({ diameter: '1 in', cutting: '100 ft/min' }).result.rpmForCutting).toBeCloseTo(381.97, 2);
  });

  it('has a belt: two straight runs and two halves where the pulleys are alike', () => {
    const { result } = drive({ driver: 100, driven: 100, centres: 400 });
    expect([result.beltMm, result.wrapDegrees]).toEqual([expect.closeTo(800 + Math.PI * 100, 9), 180]);
  });

  it('warns of a small pulley that the belt hardly covers', () => {
    expect(drive({ driver: 50, driven: 300, centres: 200 }).warnings.join(' ')).toContain('small pulley');
  });

  it('goes faster the other way round, by as much', () => {
    fc.assert(
      fc.property(fc.integer({ min: 10, max: 500 }), fc.integer({ min: 10, max: 500 }), (a, b) => {
        const [down, up] = [
          drive({ rpm: 1000, driver: a, driven: b }),
          drive({ rpm: 1000, driver: b, driven: a }),
        ];
        expect((down.result.rpm ?? 0) * (up.result.rpm ?? 0)).toBeCloseTo(1_000_000, 3);
      }),
    );
  });

  it.each([
    [{}, 'Give a speed'],
    [{ rpm: 0 }, 'above zero'],
    [{ rpm: 999_999 }, 'up to 100000'],
    [{ driver: 80 }, 'together'],
    [{ driver: 80, driven: 240, driver2: 60 }, 'second driver and driven together'],
    [{ driver: 80, driven: 240, centres: 100 }, 'would touch'],
    [{ cutting: '25 m/min' }, 'diameter'],
    [{ rpm: 'fast' }, 'no turning'],
  ])('refuses %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
