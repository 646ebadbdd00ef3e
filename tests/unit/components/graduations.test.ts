import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { graduate, graduateStretch, numberRule } from '../../../src/components/rule/graduations.ts';

describe('the lines of a rule', () => {
  it('stand every 5 s, 30 s and minute, each on one level only', () => {
    const [five, thirty, minute] = graduate(120);
    expect(five?.at.slice(0, 6)).toEqual([5, 10, 15, 20, 25, 35]);
    expect(thirty?.at).toEqual([30, 90]);
    expect(minute?.at).toEqual([0, 60, 120]);
  });

  it('set five minutes apart only in a long episode', () => {
    expect(graduate(848).map(({ every }) => every)).toEqual([5, 30, 60]);
    expect(graduate(2400).map(({ every }) => every)).toEqual([5, 30, 60, 300]);
  });

  it('need a wider rule the longer the episode is', () => {
    const widthOf = (length: number) => graduate(length)[0]?.minWidth ?? 0;
    expect(widthOf(848)).toBeLessThan(widthOf(7200));
  });

  it('never stand closer than four pixels on the width they ask for', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 20_000 }), (length) => {
        for (const { every, minWidth } of graduate(length)) {
          expect((every / length) * minWidth).toBeGreaterThanOrEqual(4 - 1e-9);
        }
      }),
    );
  });

  it('are all inside the episode', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 20_000, noNaN: true }), (length) => {
        const all = graduate(length).flatMap(({ at }) => at);
        expect(Math.max(...all)).toBeLessThanOrEqual(length);
        expect(new Set(all).size).toBe(all.length);
      }),
    );
  });
});

describe('the numbers of a rule', () => {
  it('are minutes', () => {
    expect(numberRule(200).map(({ text }) => text)).toEqual(['0', '1', '2', '3']);
  });

  it('are hours and minutes from an hour on', () => {
    expect(numberRule(3700).find(({ at }) => at === 3600)?.text).toBe('1:00');
  });

  it('leave the very end free, where there is no room after the line', () => {
    expect(numberRule(848).map(({ text }) => text)).not.toContain('14');
  });

  it('keep every fifth on a rule too narrow for each', () => {
    const widths = new Map(numberRule(1800).map(({ text, minWidth }) => [text, minWidth]));
    expect(widths.get('5')).toBeLessThan(widths.get('4') ?? 0);
  });
});

describe('the lines of a stretch of tape', () => {
  it('are every 5 s where there is room', () => {
    expect(graduateStretch(58, 80, 100).map(({ at }) => at)).toEqual([60, 65, 70, 75]);
  });

  it('thin to minutes where there is little', () => {
    expect(graduateStretch(0, 600, 50).map(({ at }) => at)).toEqual([
      0, 60, 120, 180, 240, 300, 360, 420, 480, 540,
    ]);
  });

  it('carry no number where numbers would touch', () => {
    expect(graduateStretch(0, 600, 50).every(({ text }) => text === undefined || text === '5')).toBe(true);
  });

  it('are none in a stretch without length', () => {
    expect(graduateStretch(60, 60, 100)).toEqual([]);
    expect(graduateStretch(0, 60, 0)).toEqual([]);
  });
});
