import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
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
  readonly by: 'hand' | 'camera' | 'slate' | 'nothing';
  /** Why the file's own time is no use; null where it is. */
  readonly problem: string | null;
}

/** Seconds since a clip's first frame at which a frame begins: by its timestamps where it has them. */
export function clipTimeOfFrame(
  { rate, frameTimes }: Pick<ClipFacts, 'rate' | 'frameTimes'>,
  frame: number,
): Fraction {
  const at = frameTimes?.[frame];
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

/**
 * When each clip began: as set by hand; else by its camera's clock, which the slates of all its clips set right; else
 * by a slate of its own.
 * @param options.timeZone the workshop's, an IANA name
 * @param options.now milliseconds since 1970
 */
export function timeClips(
  clips: readonly ClipFacts[],
  cameras: readonly CameraFacts[],
  slates: readonly SlateFacts[],
  { timeZone, now }: { readonly timeZone: string; readonly now: number },
): Map<string, ClipTiming> {
  const cameraOf = new Map(cameras.map((camera) => [camera.id, camera]));
  const slatesOf = new Map<string, SlateFacts[]>();
  for (const slate of slates) slatesOf.set(slate.clipId, [...(slatesOf.get(slate.clipId) ?? []), slate]);
  const starts = new Map(
    clips.map((clip) => {
      const camera = clip.cameraId === null ? null : (cameraOf.get(clip.cameraId) ?? null);
      return [clip.id, cameraStart(clip, camera, timeZone, now)];
    }),
  );
  const readings = new Map<string, SlateReading[]>();
  for (const clip of clips) {
    const start = starts.get(clip.id);
    if (start?.ok !== true) continue;
    const own = (slatesOf.get(clip.id) ?? []).map(({ frame, shopAt }) => ({
      camera: start.value.add(clipTimeOfFrame(clip, frame).mul(clip.pace).mul(1000)),
      shop: new Fraction(shopAt),
    }));
    const key = clip.cameraId ?? clip.id;
    readings.set(key, [...(readings.get(key) ?? []), ...own]);
  }
  const clocks = new Map([...readings].map(([key, list]) => [key, cameraClock(list)]));
  return new Map(
    clips.map((clip): [string, ClipTiming] => {
      const start = starts.get(clip.id);
      const problem = start?.ok === false ? start.error : null;
      if (clip.startSetAt !== null)
        return [clip.id, { start: new Fraction(clip.startSetAt), clock: [], by: 'hand', problem }];
      if (start?.ok === true) {
        const clock = clocks.get(clip.cameraId ?? clip.id) ?? [];
        return [clip.id, { start: start.value, clock, by: 'camera', problem }];
      }
      const [slate] = slatesOf.get(clip.id) ?? [];
      if (slate === undefined) return [clip.id, { start: null, clock: [], by: 'nothing', problem }];
      const before = clipTimeOfFrame(clip, slate.frame).mul(clip.pace).mul(1000);
      return [clip.id, { start: new Fraction(slate.shopAt).sub(before), clock: [], by: 'slate', problem }];
    }),
  );
}
