import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  convertEndFrame,
  convertFrame,
  frameToMilliseconds,
  frameToSeconds,
  mediaTimeToFrame,
  millisecondsToFrame,
  secondsToFrame,
} from '../../../../src/domain/time/frames.ts';
import { LISTED_RATES, type Rate } from '../../../../src/domain/time/rate.ts';

const VIDEO = { num: 30000, den: 1001 };
const rates = fc.constantFrom(...LISTED_RATES, { num: 1000, den: 1 }, { num: 25, den: 2 });
const frames = fc.nat(10_000_000);

describe('frameToSeconds', () => {
  it.each<[number, Rate, number]>([
    [108_000, VIDEO, 3603.6], // One hour of labels without drop frame; computed.
    [86_400, { num: 24000, den: 1001 }, 3603.6], // Computed.
    [2_589_408, VIDEO, 86_399.9136], // A day of drop frame; computed.
    [1800, VIDEO, 60.06],
    [3, { num: 25, den: 1 }, 0.12],
  ])('frame %i begins at its exact time', (frame, rate, seconds) => {
    expect(frameToSeconds(frame, rate)).toBe(seconds);
  });
});

describe('secondsToFrame', () => {
  it('takes the frame that has begun, not the nearest', () => {
    expect(secondsToFrame(0.0399, { num: 25, den: 1 })).toBe(0);
    expect(secondsToFrame(0.04, { num: 25, den: 1 })).toBe(1);
  });

  it('takes a time that was cut to a microsecond for the frame it came from', () => {
    expect(secondsToFrame(0.033366, VIDEO)).toBe(1);
    expect(secondsToFrame(0.03336, VIDEO)).toBe(0);
  });

  it('comes back from every frame', () => {
    fc.assert(
      fc.property(frames, rates, (frame, rate) => {
        expect(secondsToFrame(frameToSeconds(frame, rate), rate)).toBe(frame);
      }),
    );
  });

  it.each([-1, Number.NaN, Number.POSITIVE_INFINITY])('throws for %d', (seconds) => {
    expect(() => secondsToFrame(seconds, VIDEO)).toThrow(RangeError);
  });
});

describe('mediaTimeToFrame', () => {
  it('finds the frame when the file keeps times to a millisecond', () => {
    fc.assert(
      fc.property(fc.nat(1_000_000), fc.constantFrom(...LISTED_RATES), (frame, rate) => {
        const cut = Math.floor(frameToSeconds(frame, rate) * 1000) / 1000;
        expect(mediaTimeToFrame(cut, rate)).toBe(frame);
      }),
    );
  });
});

describe('Milliseconds', () => {
  it('come back to the frame they were taken from', () => {
    fc.assert(
      fc.property(frames, rates, (frame, rate) => {
        expect(millisecondsToFrame(frameToMilliseconds(frame, rate), rate)).toBe(frame);
      }),
    );
  });

  it('of frame 1 at 30000/1001 are 34: at 33 frame 0 still shows', () => {
    expect(frameToMilliseconds(1, VIDEO)).toBe(34);
    expect(millisecondsToFrame(33, VIDEO)).toBe(0);
  });
});

describe('convertFrame', () => {
  it('gives the frame that shows the same instant', () => {
    fc.assert(
      fc.property(frames, rates, rates, (frame, from, to) => {
        const there = BigInt(convertFrame(frame, from, to));
        // start(there) <= instant < start(there + 1), in whole numbers.
        const instant = BigInt(frame) * BigInt(from.den) * BigInt(to.num);
        const unit = BigInt(to.den) * BigInt(from.num);
        expect(there * unit <= instant && instant < (there + 1n) * unit).toBe(true);
      }),
    );
  });

  it('goes down where the nearest frame has not begun', () => {
    expect(convertFrame(1, { num: 24, den: 1 }, { num: 50, den: 1 })).toBe(2);
    expect(convertFrame(3, { num: 25, den: 1 }, { num: 24, den: 1 })).toBe(2);
  });

  it('leaves no stretch empty when its end goes up', () => {
    fc.assert(
      fc.property(frames, fc.integer({ min: 1, max: 100 }), rates, rates, (start, length, from, to) => {
        expect(convertEndFrame(start + length, from, to)).toBeGreaterThan(convertFrame(start, from, to));
      }),
    );
  });

  it.each([0.5, Number.MAX_SAFE_INTEGER + 1])('throws for frame %d', (frame) => {
    expect(() => convertFrame(frame, VIDEO, VIDEO)).toThrow(RangeError);
  });
});
