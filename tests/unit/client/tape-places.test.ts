import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { heightAt, timeAt } from '../../../src/client/tape-places.ts';

const places = [
  { at: 0, y: 0 },
  { at: 58, y: 24 },
  { at: 130, y: 200 },
  { at: 848, y: 400 },
];

describe('a tape beside rows', () => {
  it('stands at a row’s place at its time, and evenly between', () => {
    expect(heightAt(58, places)).toBe(24);
    expect(heightAt(94, places)).toBe(112);
    expect(heightAt(848, places)).toBe(400);
  });

  it('gives a time for a height and the same height for that time', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 400, noNaN: true }), (y) => {
        expect(heightAt(timeAt(y, places), places)).toBeCloseTo(y, 6);
      }),
    );
  });

  it('stands at the later of two rows of one second', () => {
    const twins = [
      { at: 0, y: 0 },
      { at: 10, y: 50 },
      { at: 10, y: 90 },
      { at: 20, y: 120 },
    ];
    expect(heightAt(10, twins)).toBe(90);
  });

  it('is nowhere without rows', () => {
    expect(heightAt(5, [])).toBe(0);
  });
});
