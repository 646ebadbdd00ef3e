import * as fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  daysSince,
  evenPace,
  MESSAGE_TRIES,
  waitAfterTry,
} from '../../../../src/domain/audience/announcement-rules.ts';

test('days are counted by the calendar, across months and clock changes', () => {
  expect(daysSince('2026-11-30', '2026-12-01')).toBe(1);
  expect(daysSince('2026-03-28', '2026-03-30')).toBe(2);
  expect(daysSince('2026-12-02', '2026-12-01')).toBe(-1);
});

test('each wait is longer than the one before, all together some hours, and then there is none', () => {
  const waits = Array.from({ length: MESSAGE_TRIES }, (_, index) => waitAfterTry(index + 1));
  expect(waits.at(-1)).toBeNull();
  const seconds = waits.slice(0, -1).map(Number);
  expect(seconds).toEqual([...seconds].sort((a, b) => a - b));
  const hours = seconds.reduce((sum, wait) => sum + wait, 0) / 3600;
  expect(hours).toBeGreaterThan(2);
  expect(hours).toBeLessThan(6);
});

test('a pace is the same pace in the shortest stretch of whole seconds', () => {
  expect(evenPace(600)).toEqual({ count: 10, seconds: 1 });
  expect(evenPace(90)).toEqual({ count: 3, seconds: 2 });
  expect(evenPace(7)).toEqual({ count: 7, seconds: 60 });
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 100_000 }), (perMinute) => {
      const { count, seconds } = evenPace(perMinute);
      expect(count * 60).toBe(perMinute * seconds);
      expect(seconds).toBeLessThanOrEqual(60);
    }),
  );
});
