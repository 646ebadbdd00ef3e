import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { type CameraClock, shopTimeAt } from './camera-clock.ts';

/** A clip as its camera made it. */
export interface FilmedClip {
  readonly id: string;
  /** Its first frame by the camera's clock, milliseconds since 1970; null until known: no shop time lies on it then. */
  readonly start: Fraction | null;
  /** How long it plays, in seconds; null until known: no shop time lies on it then. */
  readonly length: Fraction | null;
  readonly rate: Rate;
  /** Seconds of the shop that a second of it shows: 1 as filmed, 20 for time-lapse 1:20, 1/4 for slow motion. */
  readonly pace: Fraction;
  readonly clock: CameraClock;
}

/** How far outside of a clip a note still goes to its edge, in seconds of the shop. Our own choice. */
export const EDGE_SECONDS = 10;
/** How far clips are offered. Our own choice. */
export const NEAR_SECONDS = 300;

/** A moment of a clip. */
export interface OnClip {
  readonly id: string;
  /** Seconds since the clip's first frame. */
  readonly at: Fraction;
  /** Seconds of the shop between the note and the clip; 0 when it was running. */
  readonly apart: Fraction;
}

/**
 * running: the clips that ran, one for each camera; edge: the nearest edge within 10 s; near: what may be offered
 * within five minutes, nearest first; none.
 */
export interface ClipPlaces {
  readonly status: 'running' | 'edge' | 'near' | 'none';
  readonly clips: readonly OnClip[];
}

/** A clip that is known to have run from one moment to another. */
export type TimedClip = FilmedClip & { readonly start: Fraction; readonly length: Fraction };

interface Ran {
  readonly clip: TimedClip;
  readonly from: Fraction;
  readonly to: Fraction;
  /** The same as doubles, for what is plainly too far. */
  readonly roughly: readonly [number, number];
}

const ZERO = new Fraction(0);

/** Whether it is known when a clip ran. */
export function isTimed(clip: FilmedClip): clip is TimedClip {
  return clip.start !== null && clip.length !== null;
}

/** When a clip ran, in shop time, half-open: milliseconds since 1970. */
export function shopStretch({
  start,
  length,
  pace,
  clock,
}: Omit<TimedClip, 'id' | 'rate'>): readonly [Fraction, Fraction] {
  const end = start.add(length.mul(pace).mul(1000));
  return [shopTimeAt(clock, start), shopTimeAt(clock, end)];
}

function momentOf({ clip, from, to }: Ran, shop: Fraction): OnClip {
  const { id, length, rate } = clip;
  const before = from.sub(shop);
  if (before.compare(0) > 0) return { id, at: ZERO, apart: before.div(1000) };
  const after = shop.sub(to);
  if (after.compare(0) >= 0) {
    const last = length.sub(new Fraction(rate.den, rate.num));
    return { id, at: last.compare(0) > 0 ? last : ZERO, apart: after.div(1000) };
  }
  return { id, at: shop.sub(from).mul(length).div(to.sub(from)), apart: ZERO };
}

/** The clips that a moment may lie on or near. @param latestEnds up to each clip, the latest end so far */
function aroundMoment(ran: readonly Ran[], latestEnds: readonly number[], about: number): Ran[] {
  const reach = NEAR_SECONDS * 1000 + 1;
  let [low, high] = [0, ran.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((ran[middle]?.roughly[0] ?? 0) - reach <= about) low = middle + 1;
    else high = middle;
  }
  const found: Ran[] = [];
  for (let index = low - 1; index >= 0 && (latestEnds[index] ?? 0) + reach >= about; index -= 1) {
    const one = ran[index];
    if (one !== undefined && one.roughly[1] + reach >= about) found.push(one);
  }
  return found.reverse();
}

/**
 * Where moments of the shop lie on its clips.
 * @param moments milliseconds since 1970
 * @returns for each, in the same order, the clips it lies on or near
 */
export function placeOnClips(clips: readonly FilmedClip[], moments: readonly Fraction[]): ClipPlaces[] {
  const ran = clips
    .filter(isTimed)
    .map((clip): Ran => {
      const [from, to] = shopStretch(clip);
      return { clip, from, to, roughly: [from.valueOf(), to.valueOf()] };
    })
    .sort((a, b) => a.roughly[0] - b.roughly[0]);
  const latestEnds: number[] = [];
  for (const { roughly } of ran) latestEnds.push(Math.max(roughly[1], latestEnds.at(-1) ?? roughly[1]));
  return moments.map((shop) => {
    const found = aroundMoment(ran, latestEnds, shop.valueOf())
      .map((one) => ({
        ...momentOf(one, shop),
        holds: one.from.compare(shop) <= 0 && shop.compare(one.to) < 0,
      }))
      .sort((a, b) => a.apart.compare(b.apart));
    const strip = ({ id, at, apart }: OnClip): OnClip => ({ id, at, apart });
    const running = found.filter(({ holds }) => holds);
    if (running.length > 0) return { status: 'running', clips: running.map(strip) };
    const [nearest] = found;
    if (nearest !== undefined && nearest.apart.compare(EDGE_SECONDS) <= 0)
      return { status: 'edge', clips: [strip(nearest)] };
    const near = found.filter(({ apart }) => apart.compare(NEAR_SECONDS) <= 0);
    return { status: near.length > 0 ? 'near' : 'none', clips: near.map(strip) };
  });
}
