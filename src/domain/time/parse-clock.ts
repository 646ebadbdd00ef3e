import { type Answer, right, wrong } from '../answer.ts';

/** The longest time that is read, in hours. Our own limit: more is a slip of the finger. */
export const MOST_CLOCK_HOURS = 100;

const WITH_COLONS = /^(?:(\d{1,3}):)?(\d{1,4}):(\d{1,2}(?:[.,]\d{1,6})?)$/;
const WITH_LETTERS =
  /^(?:(\d{1,3})\s*(?:h|hours?)\s*)?(?:(\d{1,4})\s*(?:m|mins?|minutes?)\s*)?(?:(\d{1,6}(?:[.,]\d{1,6})?)\s*(?:s|secs?|seconds?))?$/i;
const BARE = /^\d{1,6}(?:[.,]\d{1,6})?$/;

function toNumber(digits: string | undefined): number {
  return Number((digits ?? '0').replace(',', '.'));
}

function inSeconds(hours: number, minutes: number, seconds: number): number {
  // Whole microseconds first, so that 0.1 and 0.2 of a second add up as written.
  return hours * 3600 + minutes * 60 + Math.round(seconds * 1e6) / 1e6;
}

/**
 * A time as people type it: 3:41, 1:02:03.5, 3m41s, 1 h 2 min, 221 (seconds).
 * @returns seconds, to a microsecond; an error says how to write it
 */
export function parseClock(text: string): Answer<number> {
  const typed = text.trim();
  if (typed === '') return wrong('Write a time, such as 3:41 or 1:02:03.');
  const colons = WITH_COLONS.exec(typed);
  if (colons) {
    const [hours, minutes, seconds] = [colons[1], colons[2], colons[3]].map(toNumber) as [
      number,
      number,
      number,
    ];
    if (seconds >= 60) return wrong(`${typed} has ${String(Math.floor(seconds))} seconds in a minute.`);
    if (colons[1] !== undefined && minutes >= 60)
      return wrong(`${typed} has ${String(minutes)} minutes in an hour.`);
    return within(inSeconds(hours, minutes, seconds), typed);
  }
  if (BARE.test(typed)) return within(inSeconds(0, 0, toNumber(typed)), typed);
  const letters = WITH_LETTERS.exec(typed);
  if (letters) {
    const [hours, minutes, seconds] = [letters[1], letters[2], letters[3]].map(toNumber) as [
      number,
      number,
      number,
    ];
    return within(inSeconds(hours, minutes, seconds), typed);
  }
  return wrong(`${typed.slice(0, 40)} is no time. Write it as 3:41 or 1:02:03.`);
}

function within(seconds: number, typed: string): Answer<number> {
  return seconds < MOST_CLOCK_HOURS * 3600
    ? right(seconds)
    : wrong(`${typed} is longer than ${String(MOST_CLOCK_HOURS)} hours.`);
}
