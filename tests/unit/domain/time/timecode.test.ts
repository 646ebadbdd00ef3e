import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Rate } from '../../../../src/domain/time/rate.ts';
import { formatTimecode, hasDropFrame, parseTimecode } from '../../../../src/domain/time/timecode.ts';

const FILM = { num: 24000, den: 1001 };
const VIDEO = { num: 30000, den: 1001 };
const FAST = { num: 60000, den: 1001 };
const rate = (num: number): Rate => ({ num, den: 1 });

// OpenTimelineIO, tests/test_opentime.py; computed again by an independent implementation.
const AT_29_97: readonly [number, string, string][] = [
  [0, '00:00:00;00', '00:00:00:00'],
  [1799, '00:00:59;29', '00:00:59:29'],
  [1800, '00:01:00;02', '00:01:00:00'],
  [3597, '00:01:59;29', '00:01:59:27'],
  [3598, '00:02:00;02', '00:01:59:28'],
  [10789, '00:05:59;29', '00:05:59:19'],
  [10790, '00:06:00;02', '00:05:59:20'],
  [17981, '00:09:59;29', '00:09:59:11'],
  [17982, '00:10:00;00', '00:09:59:12'],
  [17984, '00:10:00;02', '00:09:59:14'],
  [107891, '00:59:59;29', '00:59:56:11'],
  [107892, '01:00:00;00', '00:59:56:12'],
  [108000, '01:00:03;18', '01:00:00:00'],
  [1084319, '10:03:00;05', '10:02:23:29'],
  [2589407, '23:59:59;29', '23:58:33:17'],
];

// The same source; the last one computed.
const AT_59_94: readonly [number, string][] = [
  [3599, '00:00:59;59'],
  [3600, '00:01:00;04'],
  [35963, '00:09:59;59'],
  [35964, '00:10:00;00'],
  [215784, '01:00:00;00'],
  [1084319, '05:01:30;03'],
  [5178815, '23:59:59;59'],
];

// Frames in a day: nominal rate times 86 400, less the labels that drop frame leaves out. Computed.
const DAYS: readonly [string, Rate, boolean, number][] = [
  ['29.97 drop', VIDEO, true, 2_589_408],
  ['59.94 drop', FAST, true, 5_178_816],
  ['23.976', FILM, false, 2_073_600],
  ['24', rate(24), false, 2_073_600],
  ['25', rate(25), false, 2_160_000],
  ['29.97', VIDEO, false, 2_592_000],
  ['30', rate(30), false, 2_592_000],
  ['50', rate(50), false, 4_320_000],
  ['60', rate(60), false, 5_184_000],
];

describe('Timecode at 30000/1001', () => {
  it.each(AT_29_97)('labels frame %i %s with drop frame and %s without', (frame, drop, plain) => {
    expect(formatTimecode(frame, VIDEO, true)).toBe(drop);
    expect(formatTimecode(frame, VIDEO)).toBe(plain);
    expect(parseTimecode(drop, VIDEO)).toEqual({ ok: true, value: { frame, drop: true } });
    expect(parseTimecode(plain, VIDEO)).toEqual({ ok: true, value: { frame, drop: false } });
  });
});

describe('Timecode at 60000/1001', () => {
  it.each(AT_59_94)('labels frame %i %s with drop frame', (frame, label) => {
    expect(formatTimecode(frame, FAST, true)).toBe(label);
    expect(parseTimecode(label, FAST)).toEqual({ ok: true, value: { frame, drop: true } });
  });
});

describe('A day of labels', () => {
  it.each(DAYS)('at %s ends and begins again', (_name, at, drop, frames) => {
    expect(formatTimecode(frames - 1, at, drop)).toMatch(/^23:59:59[:;]/);
    expect(formatTimecode(frames, at, drop)).toMatch(/^00:00:00[:;]00$/);
  });
});

const counted = fc.constantFrom<[Rate, boolean]>(
  [FILM, false],
  [rate(24), false],
  [rate(25), false],
  [VIDEO, false],
  [VIDEO, true],
  [{ num: 48000, den: 1001 }, false],
  [rate(48), false],
  [rate(30), false],
  [rate(50), false],
  [FAST, false],
  [FAST, true],
  [rate(60), false],
  [rate(120), false],
);

describe('Every label', () => {
  it('comes back to its frame', () => {
    fc.assert(
      fc.property(counted, fc.nat(2_000_000), ([at, drop], frame) => {
        const read = parseTimecode(formatTimecode(frame, at, drop), at);
        expect(read).toEqual({ ok: true, value: { frame, drop } });
      }),
    );
  });

  it('rises with its frame through the day', () => {
    const digits = (label: string) => label.replace(/[:;]/g, '');
    fc.assert(
      fc.property(counted, fc.nat(2_000_000), ([at, drop], frame) => {
        const [one, next] = [formatTimecode(frame, at, drop), formatTimecode(frame + 1, at, drop)];
        expect(digits(one) < digits(next)).toBe(true);
      }),
    );
  });

  it('with drop frame stays within two frames of the clock on the wall', () => {
    // SMPTE ST 12-1: labels are left out to that end. A day is 86.4 ms short, so the first hour is asked.
    fc.assert(
      fc.property(fc.nat(107_891), (frame) => {
        const [, minutes, seconds, frames] = formatTimecode(frame, VIDEO, true).split(/[:;]/).map(Number);
        const label = minutes! * 60 + seconds! + frames! / 30;
        expect(Math.abs(label - (frame * 1001) / 30000)).toBeLessThan(2.1 / 30);
      }),
    );
  });
});

describe('A label that is none', () => {
  it.each([
    ['01:00:13:24', rate(24), 'frames beyond 23'], // OpenTimelineIO, tests/test_opentime.py
    ['00:01:00;00', VIDEO, 'does not exist'],
    ['00:01:00;01', VIDEO, 'does not exist'],
    ['00:11:00;03', FAST, 'does not exist'],
    ['00:01:00;02', rate(24), 'only'], // The same file: ';' at 24 is an error.
    ['00:01:00;02', FILM, 'only'], // The same file: no drop frame at 23.976.
    ['24:00:00:00', rate(25), 'past the end'],
    ['00:60:00:00', rate(25), 'past the end'],
    ['1:02:03', rate(25), 'no timecode'],
    ['', rate(25), 'no timecode'],
    ['00:00:00:00', { num: 25, den: 2 }, 'whole frames'],
  ])('%s is refused with a sentence', (text, at, sentence) => {
    const read = parseTimecode(text, at);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });

  it('is one with ; where the list says that nothing is dropped', () => {
    expect(parseTimecode('00:01:00;02', VIDEO, false).ok).toBe(false);
  });

  it('is not one with : where the list says that labels drop', () => {
    expect(parseTimecode('00:01:00:02', VIDEO, true)).toEqual({
      ok: true,
      value: { frame: 1800, drop: true },
    });
  });
});

describe('formatTimecode', () => {
  it.each([
    [-1, VIDEO, false],
    [1.5, VIDEO, false],
    [0, rate(25), true],
    [0, FILM, true],
  ])('throws for frame %d, which cannot be labelled', (frame, at, drop) => {
    expect(() => formatTimecode(frame, at, drop)).toThrow(RangeError);
  });

  it('has drop frame at 29.97 and 59.94 alone', () => {
    expect([FILM, rate(24), VIDEO, rate(30), FAST].map(hasDropFrame)).toEqual([
      false,
      false,
      true,
      false,
      true,
    ]);
  });
});
