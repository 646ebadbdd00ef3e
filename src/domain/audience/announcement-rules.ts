const DAY_MS = 24 * 60 * 60 * 1000;

/** An episode that came out longer ago is announced only when the owner says so. */
export const NEWS_DAYS = 7;

/**
 * How long ago a day was, in whole days; negative for one to come.
 * @param day as 2026-11-12
 * @param today the same, where the workshop is
 */
export function daysSince(day: string, today: string): number {
  return Math.round((Date.parse(today) - Date.parse(day)) / DAY_MS);
}

/** How often a message is tried before it counts as failed. */
export const MESSAGE_TRIES = 8;

const FIRST_WAIT_SECONDS = 10;

/**
 * How long a message that did not go out waits before it is tried again: 10 seconds, then three times as long each
 * time, as RFC 5321 (4.5.4.1) asks of a retry strategy that it grow.
 * @param tries how often it was tried, from 1
 * @returns seconds; null once it is tried no more
 */
export function waitAfterTry(tries: number): number | null {
  return tries >= MESSAGE_TRIES ? null : FIRST_WAIT_SECONDS * 3 ** (tries - 1);
}

/**
 * A pace as a count in a short stretch of time, so that mail leaves evenly and not in one burst.
 * @param perMinute whole, from 1
 * @returns the same pace: so many in so many seconds
 */
export function evenPace(perMinute: number): { readonly count: number; readonly seconds: number } {
  const shared = greatestDivisor(perMinute, 60);
  return { count: perMinute / shared, seconds: 60 / shared };
}

function greatestDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestDivisor(b, a % b);
}
