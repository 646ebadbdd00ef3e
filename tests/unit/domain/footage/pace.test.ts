import { describe, expect, test } from 'vitest';
import { parsePace, sayPace, writePace } from '../../../../src/domain/footage/pace.ts';

describe('a pace', () => {
  test.each([
    ['', 1, 1],
    ['1', 1, 1],
    ['1:20', 20, 1],
    ['20', 20, 1],
    ['1/4', 1, 4],
    ['4:1', 1, 4],
    [' 1 : 120 ', 120, 1],
  ])('written %j shows %i/%i seconds of the shop in one', (text, num, den) => {
    expect(parsePace(text)).toEqual({ ok: true, value: { num, den } });
  });

  test.each(['fast', '0', '1:0', '-2', '1:999999', '1/5000', '1:2:3'])('written %j is refused', (text) => {
    expect(parsePace(text).ok).toBe(false);
  });

  test('is written as it is read, and said in words', () => {
    expect(
      [
        { num: 20, den: 1 },
        { num: 1, den: 4 },
        { num: 1, den: 1 },
      ].map(writePace),
    ).toEqual(['1:20', '1/4', '']);
    expect(sayPace({ num: 20, den: 1 })).toBe('time-lapse 1:20');
    expect(sayPace({ num: 1, den: 4 })).toBe('slow motion 1/4');
    expect(sayPace({ num: 1, den: 1 })).toBeNull();
  });
});
