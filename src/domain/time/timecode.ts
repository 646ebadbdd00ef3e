import { type Answer, right, wrong } from '../answer.ts';
import { LISTED_RATES, type Rate, requireRate, sameRate } from './rate.ts';

/** Rates that have drop-frame labels, and the labels left out each minute (SMPTE ST 12-1:2014). */
const DROPPED: readonly { readonly rate: Rate; readonly labels: number }[] = [
  { rate: { num: 30000, den: 1001 }, labels: 2 },
  { rate: { num: 60000, den: 1001 }, labels: 4 },
];

/** Timecode labels a clock of one day and then begins again (SMPTE ST 12-1). */
const HOURS = 24;

/** Whether timecode is defined for a rate at all: for 12.5 and 1000 it is not (SMPTE ST 12-1:2014). */
export function hasTimecode(rate: Rate): boolean {
  return LISTED_RATES.some((listed) => sameRate(listed, rate));
}

/** How many frames a day of labels has. @throws RangeError for a rate without such labels */
export function framesADay(rate: Rate, drop = false): number {
  const counting = countingOf(rate, drop);
  if (counting === null) throw new RangeError(noCounting(rate, drop));
  return 6 * HOURS * (600 * counting.nominal - 9 * counting.labels);
}

/** How labels are given to frames: the whole number that a second counts to, and the labels left out. */
interface Counting {
  readonly nominal: number;
  readonly labels: number;
}

/** Whether labels at this rate may leave numbers out, so as to keep step with the clock on the wall. */
export function hasDropFrame(rate: Rate): boolean {
  return DROPPED.some((entry) => sameRate(entry.rate, rate));
}

/** @returns null where timecode counts no whole frames a second, such as 12.5 */
function countingOf(rate: Rate, drop: boolean): Counting | null {
  requireRate(rate);
  const whole = rate.num / rate.den;
  // A rate over 1001 is labelled as the whole rate beside it: 23.976 counts like 24.
  const nominal = Number.isInteger(whole) ? whole : Math.round((rate.num * 1001) / (rate.den * 1000));
  const exact = BigInt(rate.num) * 1001n === BigInt(nominal) * 1000n * BigInt(rate.den);
  if (!Number.isInteger(whole) && !exact) return null;
  const dropped = DROPPED.find((entry) => sameRate(entry.rate, rate));
  if (drop && dropped === undefined) return null;
  return { nominal, labels: drop ? (dropped?.labels ?? 0) : 0 };
}

function sayRate({ num, den }: Rate): string {
  return den === 1 ? String(num) : `${String(num)}/${String(den)}`;
}

function noCounting(rate: Rate, drop: boolean): string {
  return drop
    ? `Drop-frame labels are for 30000/1001 and 60000/1001 only, not for ${sayRate(rate)}.`
    : `Timecode counts whole frames a second; ${sayRate(rate)} is none of its rates.`;
}

/**
 * The label of a frame: 00:01:00:00, or with drop frame 00:01:00;02. Labels run through one day.
 * @param frame counted from label 00:00:00:00, not negative
 * @throws RangeError for a rate without such labels
 */
export function formatTimecode(frame: number, rate: Rate, drop = false): string {
  const counting = countingOf(rate, drop);
  if (counting === null) throw new RangeError(noCounting(rate, drop));
  if (!Number.isSafeInteger(frame) || frame < 0) throw new RangeError(`${String(frame)} has no label.`);
  const { nominal, labels } = counting;
  const perMinute = 60 * nominal - labels;
  const perTenMinutes = 600 * nominal - 9 * labels;
  const today = frame % framesADay(rate, drop);
  const tens = Math.floor(today / perTenMinutes);
  const rest = today % perTenMinutes;
  // The tenth minute leaves nothing out: the first of each ten is longer by the labels.
  const minutes = Math.max(0, Math.floor((rest - labels) / perMinute));
  const label = today + labels * (9 * tens + minutes);
  const pad = (number: number) => String(number % 60).padStart(2, '0');
  const seconds = Math.floor(label / nominal);
  const frames = String(label % nominal).padStart(Math.max(2, String(nominal - 1).length), '0');
  const hours = String(Math.floor(seconds / 3600)).padStart(2, '0');
  return `${hours}:${pad(Math.floor(seconds / 60))}:${pad(seconds)}${drop ? ';' : ':'}${frames}`;
}

/** A label as read: the frame counted from label 00:00:00:00, and whether it is a drop-frame one. */
export interface Timecode {
  readonly frame: number;
  readonly drop: boolean;
}

/**
 * Reads a label. ';' or '.' before the frames says drop frame; a list that says so elsewhere may write ':'.
 * @param drop what the list says, where it says so; else the label's own separator decides
 */
export function parseTimecode(text: string, rate: Rate, drop?: boolean): Answer<Timecode> {
  const typed = text.trim();
  const [, ...found] = /^(\d{1,2}):(\d{2}):(\d{2})([:;.])(\d{2,3})$/.exec(typed) ?? [];
  const [hours, minutes, seconds, separator, frames] = found;
  if (frames === undefined) return wrong(`${typed.slice(0, 40)} is no timecode. Write it as 00:01:02:03.`);
  if (drop === false && separator !== ':')
    return wrong(`${typed} is a drop-frame label; the frames here are counted without drop.`);
  const dropped = drop ?? separator !== ':';
  const counting = countingOf(rate, dropped);
  if (counting === null) return wrong(noCounting(rate, dropped));
  const { nominal, labels } = counting;
  const [h, m, s, f] = [hours, minutes, seconds, frames].map(Number) as [number, number, number, number];
  if (h >= HOURS || m >= 60 || s >= 60) return wrong(`${typed} is past the end of a day, hour or minute.`);
  if (f >= nominal) return wrong(`${typed} has frames beyond ${String(nominal - 1)}.`);
  const totalMinutes = h * 60 + m;
  if (s === 0 && f < labels && totalMinutes % 10 !== 0)
    return wrong(`${typed} does not exist: drop frame leaves that label out.`);
  const label = (totalMinutes * 60 + s) * nominal + f;
  return right({ frame: label - labels * (totalMinutes - Math.floor(totalMinutes / 10)), drop: dropped });
}
