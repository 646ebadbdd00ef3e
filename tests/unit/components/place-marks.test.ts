import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { placeMarks } from '../../../src/components/rule/place-marks.ts';
import { placeForAllWidths } from '../../../src/components/rule/rule-widths.ts';

const shares = fc
  .array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 80 })
  .map((values) => values.toSorted((a, b) => a - b));

describe('marks along the rule', () => {
  it('stay where they belong when nothing is in the way', () => {
    expect(placeMarks([0.1, 0.5, 0.9], 900, 30)).toEqual([
      { shift: 0, row: 0 },
      { shift: 0, row: 0 },
      { shift: 0, row: 0 },
    ]);
  });

  it('fan out evenly to both sides when they would lie on each other', () => {
    const shifts = placeMarks([0.5, 0.5, 0.5], 900, 30).map(({ shift }) => shift);
    expect(shifts).toEqual([-30, 0, 30]);
  });

  it('stay on the rule at its ends', () => {
    expect(placeMarks([0, 0], 900, 30).map(({ shift }) => shift)).toEqual([0, 30]);
    expect(placeMarks([1, 1], 900, 30).map(({ shift }) => shift)).toEqual([-30, 0]);
  });

  it('take a second row when one is too short', () => {
    const rows = placeMarks(
      Array.from({ length: 12 }, (_, index) => index / 11),
      300,
      30,
    ).map(({ row }) => row);
    expect(new Set(rows)).toEqual(new Set([0, 1]));
  });

  it('never touch in their row, on the width they were placed for and on every wider one', () => {
    fc.assert(
      fc.property(
        shares,
        fc.integer({ min: 200, max: 1200 }),
        fc.integer({ min: 0, max: 800 }),
        (at, width, more) => {
          const placed = placeMarks(at, width, 24);
          for (const row of new Set(placed.map((place) => place.row))) {
            const xs = placed.flatMap((place, index) =>
              place.row === row ? [(at[index] ?? 0) * (width + more) + place.shift] : [],
            );
            xs.slice(1).forEach((x, index) => {
              expect(x - (xs[index] ?? 0)).toBeGreaterThanOrEqual(24 - 0.11);
            });
          }
        },
      ),
    );
  });
});

describe('strips for all widths', () => {
  it('are one when nothing has to move even on the narrowest rule', () => {
    expect(placeForAllWidths([0.1, 0.9], 30).map(({ className }) => className)).toEqual([undefined]);
  });

  it('end with one that every wider rule shows', () => {
    const strips = placeForAllWidths([0.5, 0.52], 30);
    expect(strips.length).toBeGreaterThan(1);
    expect(strips.at(-1)?.className).not.toMatch(/@min-\[\d+px\]:hidden/);
  });
});
