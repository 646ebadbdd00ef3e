import { type Answer, right, wrong } from '../answer.ts';

/** Seconds of the shop that a second of a clip shows, as an exact fraction: 1/1 as filmed, 20/1, 1/4. */
export interface Pace {
  readonly num: number;
  readonly den: number;
}

export const AS_FILMED: Pace = { num: 1, den: 1 };
/** Our own limit: a picture an hour, played at 25 a second, is 90,000 times as fast. */
const FASTEST = 100_000;
const SLOWEST = 1000;

const HOW = 'Write 1:20 for time-lapse that plays 20 times as fast, 1/4 for slow motion.';

/**
 * A pace as it is written: 1 or nothing as filmed, 1:20 or 20 for time-lapse, 1/4 or 4:1 for slow motion.
 * @returns the fraction, or a sentence that says how to write it
 */
export function parsePace(text: string): Answer<Pace> {
  const written = text.trim().replace(/\s*([:/])\s*/, '$1');
  if (written === '') return right(AS_FILMED);
  const [, clip, shop] = /^(\d{1,6}):(\d{1,6})$/.exec(written) ?? [];
  const [, num, den = '1'] = /^(\d{1,6})(?:\/(\d{1,6}))?$/.exec(written) ?? [];
  const pace = { num: Number(shop ?? num), den: Number(clip ?? den) };
  if (!(pace.num > 0 && pace.den > 0)) return wrong(`There is no pace “${written.slice(0, 40)}”. ${HOW}`);
  if (pace.num / pace.den > FASTEST || pace.den / pace.num > SLOWEST)
    return wrong(
      `The pace “${written}” is out of range: 1:${String(FASTEST)} to 1/${String(SLOWEST)} are taken. ${HOW}`,
    );
  return right(pace);
}

/** A pace as it is written, so that parsePace reads it back. */
export function writePace({ num, den }: Pace): string {
  if (num === den) return '';
  return num > den ? `${String(den)}:${String(num)}` : `${String(num)}/${String(den)}`;
}

/** A pace in words; null as filmed. */
export function sayPace(pace: Pace): string | null {
  if (pace.num === pace.den) return null;
  return `${pace.num > pace.den ? 'time-lapse' : 'slow motion'} ${writePace(pace)}`;
}
