import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { squareWorksheet } from '../../../../src/domain/square/square-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
function square(given: Given) {
  const worked = runWorksheet(squareWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value.result;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(squareWorksheet, given);
  return worked.ok ? '' : worked.error;
};

describe('Angle and offset', () => {
  it('belong together', () => {
    // By the definition of the tangent: tan 45° = 1, and atan(x) = x - x³/3 gives 2.0045° for 35 in 1000.
    expect(square({ over: 1000, offset: 1000 }).angleDegrees).toBeCloseTo(45, 12);
    expect(square({ over: 1000, offset: 35 }).angleDegrees).toBeCloseTo(2.0045, 4);
    expect(square({ over: 1000, angle: '45 deg' }).offsetMm).toBeCloseTo(1000, 9);
  });

  it('go back to what they came from', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 89_000 }),
        fc.integer({ min: 1, max: 9000 }),
        (thousandths, over) => {
          const angle = thousandths / 1000;
          const { offsetMm } = square({ over, angle });
          expect((Math.atan((offsetMm ?? 0) / over) * 180) / Math.PI).toBeCloseTo(angle, 9);
        },
      ),
    );
  });
});

describe('Diagonals', () => {
  it('of 3, 4, 5', () => {
    expect(square({ width: 300, height: 400 }).diagonalMm).toBe(500);
    expect(square({ width: 300, height: 400, diagonal: 500, other: 500 })).toMatchObject({
      diagonalsDifferMm: 0,
      outOfSquareDegrees: 0,
      pushMm: 0,
    });
  });

  it('say how far to push the top along', () => {
    // The top of an 800 × 1200 frame pushed along by p: diagonals √((800 ± p)² + h²), h² = 1200² − p².
    const push = 6;
    const up = Math.sqrt(1200 ** 2 - push ** 2);
    const [long, short] = [Math.hypot(800 + push, up), Math.hypot(800 - push, up)];
    const found = square({ width: 800, height: 1200, diagonal: long.toFixed(6), other: short.toFixed(6) });
    expect(found.pushMm).toBeCloseTo(push, 4);
  });

  it.each([
    [{}, 'Give an offset'],
    [{ over: 1000 }, 'either the offset'],
    [{ over: 1000, offset: 3, angle: 2 }, 'either the offset'],
    [{ over: 1000, angle: 90 }, 'less than 90'],
    [{ over: 1000, offset: 3, width: 5 }, 'Give an offset'],
    [{ width: 800 }, 'width and height'],
    [{ width: 800, height: 1200, diagonal: 1443 }, 'both diagonals'],
    [{ width: 800, height: 1200, diagonal: 3000, other: 1000 }, 'no frame'],
  ])('refuse %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
