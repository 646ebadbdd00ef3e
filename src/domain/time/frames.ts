import { type Rate, requireRate } from './rate.ts';

const NANOSECONDS = 1_000_000_000n;

/**
 * How far before a frame's first instant a time may lie and still mean that frame, in nanoseconds. Browsers
 * and probes give times to a microsecond, cut off, so the start of frame 1 at 30000/1001 comes as 0.033366.
 */
const EARLY = 1000n;

function requireFrame(frame: number): void {
  if (!Number.isSafeInteger(frame)) throw new RangeError(`${String(frame)} is no whole number of frames.`);
}

function requireTime(time: number): void {
  if (!Number.isFinite(time) || time < 0) throw new RangeError(`${String(time)} is no time from a start.`);
}

function floorDivide(dividend: bigint, divisor: bigint): bigint {
  const quotient = dividend / divisor;
  return dividend % divisor < 0n ? quotient - 1n : quotient;
}

function ceilDivide(dividend: bigint, divisor: bigint): bigint {
  return -floorDivide(-dividend, divisor);
}

/** The first instant of a frame, in seconds: the double nearest to the exact quotient. */
export function frameToSeconds(frame: number, rate: Rate): number {
  requireFrame(frame);
  requireRate(rate);
  return (frame * rate.den) / rate.num;
}

/**
 * The frame that shows an instant: the last one that has begun. An instant up to a microsecond before a
 * frame's start belongs to it, so that frameToSeconds comes back to the frame it left.
 * @param seconds from the first frame, not negative, read to a nanosecond
 */
export function secondsToFrame(seconds: number, rate: Rate): number {
  requireTime(seconds);
  requireRate(rate);
  const instant = BigInt(Math.round(seconds * 1e9)) + EARLY;
  return Number((instant * BigInt(rate.num)) / (BigInt(rate.den) * NANOSECONDS));
}

/**
 * The frame that a browser says it shows. requestVideoFrameCallback reports the frame's own start, rounded to
 * the time base of the file (a millisecond in Matroska), so the nearest frame is meant, not the one begun.
 * @param mediaTime seconds, as the callback's metadata carries it
 */
export function mediaTimeToFrame(mediaTime: number, rate: Rate): number {
  requireTime(mediaTime);
  requireRate(rate);
  return Math.round((mediaTime * rate.num) / rate.den);
}

/** The first whole millisecond that lies in a frame, so that millisecondsToFrame comes back to it. */
export function frameToMilliseconds(frame: number, rate: Rate): number {
  requireFrame(frame);
  requireRate(rate);
  return Number(ceilDivide(BigInt(frame) * BigInt(rate.den) * 1000n, BigInt(rate.num)));
}

/** The frame that shows a whole millisecond, exactly: the last one that has begun. */
export function millisecondsToFrame(milliseconds: number, rate: Rate): number {
  requireFrame(milliseconds);
  requireRate(rate);
  return Number(floorDivide(BigInt(milliseconds) * BigInt(rate.num), BigInt(rate.den) * 1000n));
}

/**
 * The frame of another rate that shows the first instant of a frame: rounded down, never to the nearest, since
 * the nearest may not have begun yet. Going there and back can land one frame early: positions are kept at
 * the rate they were made in and converted from there each time.
 */
export function convertFrame(frame: number, from: Rate, to: Rate): number {
  requireFrame(frame);
  requireRate(from);
  requireRate(to);
  const exact = BigInt(frame) * BigInt(to.num) * BigInt(from.den);
  return Number(floorDivide(exact, BigInt(to.den) * BigInt(from.num)));
}

/**
 * The end of a half-open stretch at another rate: rounded up, so that a stretch that shows something never
 * becomes empty.
 */
export function convertEndFrame(endFrame: number, from: Rate, to: Rate): number {
  return 0 - convertFrame(-endFrame, from, to);
}
