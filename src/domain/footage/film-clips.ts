import Fraction from 'fraction.js';
import { type Answer, right } from '../answer.ts';
import { MILLISECOND_RATE, type Rate, sameRate } from '../time/rate.ts';
import { instantOfWall, wallAsUtc } from '../time/wall-time.ts';
import { type CameraClock, cameraClock, type SlateReading } from './camera-clock.ts';
import { type CreationMeans } from './clip-facts.ts';
import { clipStart } from './creation-time.ts';

/** What a clip's file says, and what a person set. */
export interface ClipFacts {
  readonly id: string;
  readonly cameraId: string | null;
  /** Length in frames at the rate; null until known. */
  readonly frames: number | null;
  readonly rate: Rate;
  readonly pace: Fraction;
  /** The file's wall time of creation, and how far it says that is from UTC, in minutes. */
  readonly createdWall: string | null;
  readonly createdOffset: number | null;
  /** Shop time of the first frame as set by hand, in milliseconds since 1970. */
  readonly startSetAt: number | null;
  /** When frames begin, in milliseconds since the first, where they do not come at a constant rate. */
  readonly frameTimes: readonly number[] | null;
  /** The clip that this one goes on from without a gap, where the camera split what it filmed. */
  readonly continuesId: string | null;
}

/** What the files of a camera mean by their times. */
export interface CameraFacts {
  readonly id: string;
  readonly creationMeans: CreationMeans;
  readonly localAsUtc: boolean;
  /** IANA zone; null for the workshop's. */
  readonly timeZone: string | null;
}

/** A slate as it was read. */
export interface SlateFacts {
  readonly clipId: string;
  readonly frame: number;
  /** Milliseconds since 1970. */
  readonly shopAt: number;
}

/** When a clip began, and by which clock. */
export interface ClipTiming {
  /** Its first frame by the clock, in milliseconds since 1970; null when nothing says so. */
  readonly start: Fraction | null;
  readonly clock: CameraClock;
  /** What says when it began. */
  readonly by: 'hand' | 'camera' | 'slate' | 'before' | 'nothing';
  /** Why the file's own time is no use; null where it is. */
  readonly problem: string | null;
}

/**
 * Seconds since a clip's first frame at which a frame begins: by its timestamps where it has them. A clip that counts in
 * milliseconds counts time already.
 */
export function clipTimeOfFrame(
  { rate, frameTimes }: Pick<ClipFacts, 'rate' | 'frameTimes'>,
  frame: number,
): Fraction {
  const at = sameRate(rate, MILLISECOND_RATE) ? undefined : frameTimes?.[frame];
  return at === undefined ? new Fraction(frame).mul(rate.den).div(rate.num) : new Fraction(at).div(1000);
}

/** How long a clip plays, in seconds; null until known. */
export function clipLength({ frames, rate }: Pick<ClipFacts, 'frames' | 'rate'>): Fraction | null {
  return frames === null ? null : new Fraction(frames).mul(rate.den).div(rate.num);
}

/** The instant that a file's time of creation means, in milliseconds since 1970; null where it says nothing. */
export function createdAt(
  { createdWall, createdOffset }: Pick<ClipFacts, 'createdWall' | 'createdOffset'>,
  camera: CameraFacts | null,
  timeZone: string,
): number | null {
  if (createdWall === null) return null;
  const wallIsLocal = createdOffset === null || (createdOffset === 0 && camera?.localAsUtc === true);
  if (wallIsLocal) return instantOfWall(camera?.timeZone ?? timeZone, createdWall);
  const plain = wallAsUtc(createdWall);
  return plain === null ? null : plain - createdOffset * 60_000;
}

/** Where a clip began by its camera's own clock, or why that is not known. */
function cameraStart(clip: ClipFacts, camera: CameraFacts | null, timeZone: string, now: number) {
  const ran = (clipLength(clip) ?? new Fraction(0)).mul(clip.pace);
  return clipStart(createdAt(clip, camera, timeZone), camera?.creationMeans ?? 'start', ran, now);
}

/** Clips in an order in which each comes after the one it goes on from; where they go in a circle, in any. */
function inChains(clips: readonly ClipFacts[]): ClipFacts[] {
  const byId = new Map(clips.map((clip) => [clip.id, clip]));
  const ordered = new Set<ClipFacts>();
  for (const clip of clips) {
    const chain = new Set<ClipFacts>();
    let next: ClipFacts | undefined = clip;
    while (next !== undefined && !ordered.has(next) && !chain.has(next)) {
      chain.add(next);
      next = next.continuesId === null ? undefined : byId.get(next.continuesId);
    }
    for (const one of [...chain].reverse()) ordered.add(one);
  }
  return [...ordered];
}

/** How long a clip ran, in milliseconds of the shop; null until its length is known. */
function ranFor(clip: ClipFacts): Fraction | null {
  return clipLength(clip)?.mul(clip.pace).mul(1000) ?? null;
}

/** Milliseconds of the shop from a clip's first frame to another. */
function shopTimeOfFrame(clip: ClipFacts, frame: number): Fraction {
  return clipTimeOfFrame(clip, frame).mul(clip.pace).mul(1000);
}

/**
 * When each clip began: as set by hand; else where the clip before it ended, which it goes on from; else by its
 * camera's clock, which the slates of all its clips set right; else by a slate of its own.
 * @param options.timeZone the workshop's, an IANA name
 * @param options.now milliseconds since 1970
 */
export function timeClips(
  clips: readonly ClipFacts[],
  cameras: readonly CameraFacts[],
  slates: readonly SlateFacts[],
  { timeZone, now }: { readonly timeZone: string; readonly now: number },
): Map<string, ClipTiming> {
  const byId = new Map(clips.map((clip) => [clip.id, clip]));
  const cameraOf = new Map(cameras.map((camera) => [camera.id, camera]));
  const slatesOf = new Map<string, SlateFacts[]>();
  for (const slate of slates) slatesOf.set(slate.clipId, [...(slatesOf.get(slate.clipId) ?? []), slate]);
  const ordered = inChains(clips);

  const starts = new Map<string, Answer<Fraction>>();
  const readings = new Map<string, SlateReading[]>();
  for (const clip of ordered) {
    const camera = clip.cameraId === null ? null : (cameraOf.get(clip.cameraId) ?? null);
    const start = startAfter(clip, byId, starts) ?? cameraStart(clip, camera, timeZone, now);
    starts.set(clip.id, start);
    if (!start.ok) continue;
    const own = (slatesOf.get(clip.id) ?? []).map(({ frame, shopAt }) => ({
      camera: start.value.add(shopTimeOfFrame(clip, frame)),
      shop: new Fraction(shopAt),
    }));
    const key = clip.cameraId ?? clip.id;
    readings.set(key, [...(readings.get(key) ?? []), ...own]);
  }
  const clocks = new Map([...readings].map(([key, list]) => [key, cameraClock(list)]));

  const timings = new Map<string, ClipTiming>();
  for (const clip of ordered) {
    const start = starts.get(clip.id);
    const problem = start?.ok === false ? start.error : null;
    const before = clip.continuesId === null ? undefined : byId.get(clip.continuesId);
    const endOfBefore = before === undefined ? null : ranFor(before);
    const timeOfBefore = timings.get(before?.id ?? '');
    const [slate] = slatesOf.get(clip.id) ?? [];
    if (clip.startSetAt !== null)
      timings.set(clip.id, { start: new Fraction(clip.startSetAt), clock: [], by: 'hand', problem });
    else if (endOfBefore !== null && timeOfBefore?.start != null)
      timings.set(clip.id, {
        start: timeOfBefore.start.add(endOfBefore),
        clock: timeOfBefore.clock,
        by: 'before',
        problem,
      });
    else if (start?.ok === true)
      timings.set(clip.id, {
        start: start.value,
        clock: clocks.get(clip.cameraId ?? clip.id) ?? [],
        by: 'camera',
        problem,
      });
    else if (slate !== undefined) {
      const at = new Fraction(slate.shopAt).sub(shopTimeOfFrame(clip, slate.frame));
      timings.set(clip.id, { start: at, clock: [], by: 'slate', problem });
    } else timings.set(clip.id, { start: null, clock: [], by: 'nothing', problem });
  }
  return timings;
}

/** By the camera's clock, the end of the clip that this one goes on from; null where that is not known. */
function startAfter(
  clip: ClipFacts,
  byId: ReadonlyMap<string, ClipFacts>,
  starts: ReadonlyMap<string, Answer<Fraction>>,
): Answer<Fraction> | null {
  const before = clip.continuesId === null ? undefined : byId.get(clip.continuesId);
  const start = starts.get(before?.id ?? '');
  const ran = before === undefined ? null : ranFor(before);
  return start?.ok === true && ran !== null ? right(start.value.add(ran)) : null;
}
