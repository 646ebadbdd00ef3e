import Fraction from 'fraction.js';

/** A clock slate that was filmed: what the camera's clock said at that frame, and the shop time it showed. */
export interface SlateReading {
  /** Milliseconds since 1970 by the camera's clock; exact, for a frame need not begin on one. */
  readonly camera: Fraction;
  /** Milliseconds since 1970, as the slate shows them. */
  readonly shop: Fraction;
}

/** How a camera's clock goes, from its slates in the order of the camera. Without any it is believed. */
export type CameraClock = readonly SlateReading[];

const DAY_MS = 86_400_000;

/**
 * The most that a clock is believed to gain or lose, in seconds a day; a clock that differs by more was set between
 * the two slates. Our own choice: a quartz clock stays within a few seconds.
 */
export const MOST_DRIFT = 60;

/** A camera's clock from its slates. Of two at one camera time the later one in the list counts. */
export function cameraClock(readings: readonly SlateReading[]): CameraClock {
  const byTime = new Map(readings.map((reading) => [reading.camera.toFraction(), reading]));
  return [...byTime.values()].sort((a, b) => a.camera.compare(b.camera));
}

/** Seconds a day that the shop's time runs ahead of the camera's between two slates. */
function driftBetween(a: SlateReading, b: SlateReading): Fraction {
  const camera = b.camera.sub(a.camera);
  return b.shop
    .sub(a.shop)
    .sub(camera)
    .div(camera)
    .mul(DAY_MS / 1000);
}

/** The two slates around a camera time, or the two nearest; and the nearest of them. */
function slatesFor(clock: CameraClock, at: Fraction): readonly [SlateReading, SlateReading | null] | null {
  const after = clock.findIndex(({ camera }) => camera.compare(at) > 0);
  const high = after === -1 ? clock.length - 1 : Math.max(after, 1);
  const [a, b] = [clock[high - 1], clock[high]];
  const only = a ?? b;
  if (only === undefined) return null;
  if (a === undefined || b === undefined) return [only, null];
  const nearest = at.sub(a.camera).abs().compare(at.sub(b.camera).abs()) <= 0 ? a : b;
  const set = driftBetween(a, b).abs().compare(MOST_DRIFT) > 0;
  return set ? [nearest, null] : [a, b];
}

/**
 * The shop time at a time of the camera's clock: through the two slates around it, or by the nearest one where there
 * is no other or the clock was set between them.
 * @param camera milliseconds since 1970 by the camera's clock
 * @returns milliseconds since 1970, exact
 */
export function shopTimeAt(clock: CameraClock, camera: Fraction): Fraction {
  const slates = slatesFor(clock, camera);
  if (slates === null) return camera;
  const [a, b] = slates;
  const pace = b === null ? new Fraction(1) : b.shop.sub(a.shop).div(b.camera.sub(a.camera));
  return a.shop.add(camera.sub(a.camera).mul(pace));
}

/** What a camera's clock is off by, as it is shown. */
export interface ClockError {
  /** Seconds that the shop's time is ahead of the camera's. */
  readonly offset: Fraction;
  /** Seconds a day that this grows by; null with one slate, or where the clock was set between two. */
  readonly drift: Fraction | null;
}

/** How far a camera's clock is off at a time of its own. */
export function clockErrorAt(clock: CameraClock, camera: Fraction): ClockError {
  const slates = slatesFor(clock, camera);
  const offset = shopTimeAt(clock, camera).sub(camera).div(1000);
  const b = slates?.[1] ?? null;
  return { offset, drift: slates === null || b === null ? null : driftBetween(slates[0], b) };
}
