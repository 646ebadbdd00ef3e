import { describe, expect, it } from 'vitest';
import { framesIn } from '../../../src/domain/media-rates.ts';
import { LISTED_RATES, MILLISECOND_RATE as MILLISECONDS, snapRate } from '../../../src/domain/time/rate.ts';

describe('The rate of a clip', () => {
  it.each(LISTED_RATES.map((rate) => [`${String(rate.num)}/${String(rate.den)}`, rate] as const))(
    'is %s when its average is exactly that',
    (_name, rate) => {
      expect(snapRate(rate)).toEqual(rate);
    },
  );

  it.each([
    ['a phone a shade under 30', { num: 29_990, den: 1000 }, { num: 30, den: 1 }],
    ['one a shade over 29.97', { num: 29_975, den: 1000 }, { num: 30_000, den: 1001 }],
    ['25 within 0.1 %', { num: 25_024, den: 1000 }, { num: 25, den: 1 }],
    ['25 past 0.1 %', { num: 25_026, den: 1000 }, MILLISECONDS],
    ['a screen at 27', { num: 27, den: 1 }, MILLISECONDS],
    ['a fast camera at 120', { num: 120, den: 1 }, MILLISECONDS],
  ])('of %s', (_name, average, expected) => {
    expect(snapRate(average)).toEqual(expected);
  });
});

describe('A length in frames', () => {
  it('is exact over hours at 29.97', () => {
    expect(framesIn({ num: 3600, den: 1 }, { num: 30_000, den: 1001 })).toBe(107_892);
  });

  it('is rounded to the nearest frame', () => {
    expect(framesIn({ num: 1019, den: 1000 }, { num: 25, den: 1 })).toBe(25);
    expect(framesIn({ num: 1021, den: 1000 }, { num: 25, den: 1 })).toBe(26);
  });

  it('counts milliseconds where frames mean nothing', () => {
    expect(framesIn({ num: 48_000 * 3 + 24, den: 48_000 }, MILLISECONDS)).toBe(3001);
  });
});
