import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { instantOfWall, wallAsUtc, wallIn } from '../../../../src/domain/time/wall-time.ts';

describe('a wall time', () => {
  test.each([
    ['Europe/London', '2026-07-02T14:22:07', '2026-07-02T13:22:07.000Z'],
    ['Europe/London', '2026-12-02 14:22', '2026-12-02T14:22:00.000Z'],
    ['America/New_York', '2026-03-08T01:59:59.5', '2026-03-08T06:59:59.500Z'],
    // Put forward: 02:30 never was. Put back: 01:30 was twice.
    ['America/New_York', '2026-03-08T02:30', '2026-03-08T07:30:00.000Z'],
    ['America/New_York', '2026-11-01T01:30', '2026-11-01T05:30:00.000Z'],
    ['America/New_York', '2026-11-01T02:30', '2026-11-01T07:30:00.000Z'],
  ])('in %s, %s, is the instant %s', (zone, wall, instant) => {
    expect(new Date(instantOfWall(zone, wall) ?? 0).toISOString()).toBe(instant);
  });

  test.each(['', 'noon', '2026-02-30T10:00', '2026-01-01T24:00', '2026-13-01T10:00', '2026-01-01'])(
    'that reads “%s” is none',
    (wall) => {
      expect(wallAsUtc(wall)).toBeNull();
      expect(instantOfWall('UTC', wall)).toBeNull();
    },
  );

  test('of any instant leads back to that wall time', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('Europe/London', 'America/New_York', 'Asia/Kolkata', 'Australia/Lord_Howe'),
        fc.integer({ min: 946_684_800, max: 2_000_000_000 }),
        (zone, seconds) => {
          const wall = wallIn(zone, seconds * 1000);
          expect(wallIn(zone, instantOfWall(zone, wall) ?? 0)).toBe(wall);
        },
      ),
    );
  });
});
