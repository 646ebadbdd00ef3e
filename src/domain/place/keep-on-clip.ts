import Fraction from 'fraction.js';
import { type Edit, rateOf, type Segment } from '../edit/edit.ts';
import { type Position } from '../positions.ts';
import { type Rate } from '../time/rate.ts';
import { momentIn, segmentUnder } from './clip-moment-under.ts';
import { type Sense } from './place-notes.ts';

/** A moment or a stretch of the episode, kept on the clips beneath it. */
export interface KeptOnClip {
  readonly clip: string;
  /** Frames since the clip's first, at a rate at which they are whole. */
  readonly frame: number;
  readonly endFrame: number | null;
  /** The clip that the end lies on, counted from its first frame; null where the stretch ends in the segment it began in. */
  readonly endClip: string | null;
  readonly rate: Rate;
}

/** What has to be known of a clip to count on it. */
export interface CountedClip {
  readonly rate: Rate;
  /** What its first label stands for, in seconds from 00:00:00:00. */
  readonly label: Fraction;
}

/** Where no whole number of frames will do at any rate that can be kept. */
const MICROSECONDS: Rate = { num: 1_000_000, den: 1 };
/** The largest whole number that the rate of a position is kept as (PostgreSQL integer). */
const MOST_RATE = 2_147_483_647;
/** A stretch is half-open: its end is looked for by an instant just inside, in frames of the episode. */
const JUST_INSIDE = new Fraction(1, 1_000_000);

function leastCommonMultiple(a: bigint, b: bigint): bigint {
  const divisor = (x: bigint, y: bigint): bigint => (y === 0n ? x : divisor(y, x % y));
  return (a / divisor(a, b)) * b;
}

/** A multiple of the clip's rate at which every one of some moments, in seconds, is a whole number of frames. */
function wholeRate(rate: Rate, moments: readonly Fraction[]): Rate {
  const times = moments.reduce((all, at) => leastCommonMultiple(all, at.mul(rateOf(rate)).d), 1n);
  const num = BigInt(rate.num) * times;
  return num <= BigInt(MOST_RATE) ? { num: Number(num), den: rate.den } : MICROSECONDS;
}

/**
 * Keeps a position of the episode on the clips beneath it, so that every edit takes it along. Placed by the same edit
 * it comes back to the same frames, unless the moment is used twice.
 * @param edit with its clips called by their ids
 * @param clips what is known of them
 * @returns null where no clip of the footage lies beneath its start, such as in black
 */
export function keepOnClip(
  edit: Edit,
  clips: ReadonlyMap<string, CountedClip>,
  { frame, endFrame, rate }: Position,
  sense: Sense,
): KeptOnClip | null {
  const inEdit = (frames: number) => new Fraction(frames).mul(rateOf(edit.rate)).div(rateOf(rate));
  const begun = inEdit(frame);
  const segment = segmentUnder(edit, begun, sense);
  const clip = segment === null ? undefined : clips.get(segment.clip);
  if (segment === null || clip === undefined) return null;
  const at = momentIn(segment, begun, edit).sub(clip.label);
  const end = endFrame === null ? null : endOn(edit, clips, { segment, at, begun }, inEdit(endFrame), sense);
  const whole = wholeRate(clip.rate, end === null ? [at] : [at, end.at]);
  const frames = (moment: Fraction) => Number(moment.mul(rateOf(whole)).ceil().valueOf());
  const kept = { clip: segment.clip, frame: frames(at), endClip: end?.clip ?? null, rate: whole };
  return { ...kept, endFrame: end === null ? null : frames(end.at) };
}

function endOn(
  edit: Edit,
  clips: ReadonlyMap<string, CountedClip>,
  start: { readonly segment: Segment; readonly at: Fraction; readonly begun: Fraction },
  ended: Fraction,
  sense: Sense,
): { readonly clip: string | null; readonly at: Fraction } {
  const last = segmentUnder(edit, ended.sub(JUST_INSIDE), sense);
  const known = last === null ? undefined : clips.get(last.clip);
  const natural = { clip: null, at: start.at.add(ended.sub(start.begun).div(rateOf(edit.rate))) };
  // Held or played backwards, a clip does not say where a stretch of it ends.
  if (last === null || known === undefined || last.speed.compare(0) <= 0) return natural;
  const at = momentIn(last, ended, edit).sub(known.label);
  return { clip: last === start.segment ? null : last.clip, at };
}
