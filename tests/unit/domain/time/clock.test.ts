import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatClock } from '../../../../src/domain/time/format-clock.ts';
import { formatIsoDuration } from '../../../../src/domain/time/format-iso-duration.ts';
import { parseClock } from '../../../../src/domain/time/parse-clock.ts';

describe('formatClock', () => {
  it.each([
    [0, '0:00'],
    [58.9, '0:58'],
    [221, '3:41'],
    [848, '14:08'],
    [3599, '59:59'], // Common practice of chapter lists: hours are written from the first one on.
    [3600, '1:00:00'],
    [3723, '1:02:03'],
    [36_000, '10:00:00'],
  ])('writes %d s as %s', (seconds, text) => {
    expect(formatClock(seconds)).toBe(text);
  });

  it('throws for a time before the start', () => {
    expect(() => formatClock(-1)).toThrow(RangeError);
  });
});

describe('parseClock', () => {
  it.each([
    // Podlove Simple Chapters 1.2, normal play times; the seconds are computed.
    ['01:35:52', 5752],
    ['7:48', 468],
    ['35:12.250', 2112.25],
    ['05:12:03.5', 18_723.5],
    ['37', 37],
    // As people type them.
    ['3:41', 221],
    ['1:02:03.5', 3723.5],
    ['221', 221],
    ['3m41s', 221],
    ['3 min 41 sec', 221],
    ['1h2m3s', 3723],
    ['2h', 7200],
    ['41s', 41],
    ['90:00', 5400],
    [' 0:07,5 ', 7.5],
  ])('reads %s as %d s', (text, seconds) => {
    expect(parseClock(text)).toEqual({ ok: true, value: seconds });
  });

  it.each(['', ' ', '3:61', '1:60:00', '3:4:5:6', '-3', 'noon', '3m41', 'm', '100:00:00', '1:2:', 'h'])(
    'says why %j is no time',
    (text) => {
      const read = parseClock(text);
      expect(read.ok ? '' : read.error).toMatch(/\.$/);
    },
  );

  it('reads what formatClock writes', () => {
    fc.assert(
      fc.property(fc.nat(359_999), (seconds) => {
        expect(parseClock(formatClock(seconds))).toEqual({ ok: true, value: seconds });
      }),
    );
  });
});

describe('formatIsoDuration', () => {
  it.each([
    [0, 'PT0S'],
    [848, 'PT14M8S'],
    [3600, 'PT1H'],
    [3600.5, 'PT1H0.5S'],
    [61.2345, 'PT1M1.235S'],
    [90_061, 'PT25H1M1S'],
  ])('writes %d s as %s (ISO 8601-1)', (seconds, text) => {
    expect(formatIsoDuration(seconds)).toBe(text);
  });
});
