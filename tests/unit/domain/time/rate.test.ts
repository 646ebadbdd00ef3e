import { describe, expect, it } from 'vitest';
import { parseRate, type Rate, sameRate, snapRate } from '../../../../src/domain/time/rate.ts';

describe('parseRate', () => {
  it.each<[string, Rate]>([
    ['25', { num: 25, den: 1 }],
    ['30000/1001', { num: 30000, den: 1001 }],
    ['29.97', { num: 30000, den: 1001 }],
    ['23.976', { num: 24000, den: 1001 }],
    ['23.98', { num: 24000, den: 1001 }],
    ['59.94', { num: 60000, den: 1001 }],
  ])('reads %s exactly', (text, rate) => {
    expect(parseRate(text)).toEqual({ ok: true, value: rate });
  });

  it.each(['', '0', '25/0', '-25', '29.9', 'fast', '1e3'])('says why %j is no rate', (text) => {
    const read = parseRate(text);
    expect(read.ok ? '' : read.error).toContain('no frame rate');
  });
});

describe('snapRate', () => {
  it.each<[Rate, Rate]>([
    [
      { num: 2997, den: 100 },
      { num: 30000, den: 1001 },
    ],
    [
      { num: 24000, den: 1001 },
      { num: 24000, den: 1001 },
    ],
    [
      { num: 23_999, den: 1000 },
      { num: 24, den: 1 },
    ],
    [
      { num: 25_020, den: 1000 },
      { num: 25, den: 1 },
    ],
    [
      { num: 25_030, den: 1000 },
      { num: 1000, den: 1 },
    ],
    [
      { num: 15, den: 1 },
      { num: 1000, den: 1 },
    ],
  ])('takes $num/$den for the listed rate beside it, or counts milliseconds', (average, rate) => {
    expect(snapRate(average)).toEqual(rate);
  });

  it('throws for a probe that saw no frames', () => {
    expect(() => snapRate({ num: 0, den: 0 })).toThrow(RangeError);
  });
});

describe('sameRate', () => {
  it('sees through the way a rate is written', () => {
    expect(sameRate({ num: 50, den: 2 }, { num: 25, den: 1 })).toBe(true);
    expect(sameRate({ num: 30000, den: 1001 }, { num: 2997, den: 100 })).toBe(false);
  });
});
