import { expect, test } from 'vitest';
import { averageOf, frameTimesOf } from '../../../../src/domain/footage/frame-times.ts';

test('frames in the order they are decoded are put in the order they are shown, from the first on', () => {
  expect(frameTimesOf([10, 10.1, 10.02, 10.16])).toEqual([0, 20, 100, 160]);
});

test.each([
  ['at an even beat', Array.from({ length: 1000 }, (_, index) => (index * 1001) / 30_000)],
  // Matroska keeps whole milliseconds.
  [
    'at an even beat, rounded',
    Array.from({ length: 1000 }, (_, index) => Math.round(index * 33.3667) / 1000),
  ],
  ['alone', [5]],
  ['of none', []],
  ['all at once', [1, 1, 1]],
])('frames %s have no times of their own', (_, seconds) => {
  expect(frameTimesOf(seconds)).toBeNull();
});

test('one frame dropped in the middle makes frames uneven', () => {
  const seconds = Array.from({ length: 100 }, (_, index) => (index + (index >= 50 ? 1.2 : 0)) / 25);
  expect(frameTimesOf(seconds)).toHaveLength(100);
});

test('the average of uneven frames is that of the whole', () => {
  expect(averageOf([0, 20, 100])).toEqual({ num: 2_000_000, den: 100_000 });
});
