import { sayPace } from '../../../domain/footage/pace.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { wallIn } from '../../../domain/time/wall-time.ts';
import { paths } from '../../../paths.ts';
import { type ShownClip } from '../day.ts';

/** A time of the shop's clock: 14:22:07. */
export function sayShopTime(at: number, timeZone: string): string {
  return wallIn(timeZone, at).slice(11);
}

/** What says when a clip began. */
export const STARTED_BY: Readonly<Record<ShownClip['by'], string>> = {
  hand: 'set by hand',
  camera: 'by its camera',
  slate: 'by its slate',
  before: 'goes on from the clip before',
  nothing: 'not known',
};

/** Length, rate and pace in a line. */
export function sayClip({ length, rate, pace }: ShownClip): string {
  const fps = rate.num / rate.den;
  return [
    length === null ? 'length not known' : formatClock(length),
    rate.num === 1000 && rate.den === 1 ? 'uneven frames' : `${String(Math.round(fps * 1000) / 1000)} fps`,
    sayPace(pace),
  ]
    .filter((fact) => fact !== null)
    .join(' · ');
}

/** Where a clip's small picture is; null where it has none. */
export function pictureOf(clip: ShownClip, workshop: string, build: string): string | null {
  if (clip.hasFilm && clip.fileId !== null) return paths.media(clip.fileId, 'thumb');
  return clip.hasPicture ? paths.api.inBuild(workshop, build, `footage/clips/${clip.id}/thumbnail`) : null;
}

/** An offset or drift with its sign, in seconds: 12.4, 0.8. */
function saySeconds(seconds: number): string {
  return String(Math.round(Math.abs(seconds) * 10) / 10);
}

/** How far a camera's clock is off, in a sentence. */
export function sayClockError({
  offset,
  drift,
}: {
  readonly offset: number | null;
  readonly drift: number | null;
}): string {
  if (offset === null) return 'No slate filmed yet: its clock is believed.';
  const seconds = saySeconds(offset);
  const now =
    seconds === '0'
      ? 'This camera’s clock is right'
      : `This camera is ${seconds} s ${offset > 0 ? 'behind' : 'ahead'}`;
  if (drift === null) return `${now}. Film a second slate, and its drift is known too.`;
  const daily = saySeconds(drift);
  if (daily === '0') return `${now}, and it neither gains nor loses.`;
  return `${now}, and ${drift > 0 ? 'loses' : 'gains'} ${daily} s a day.`;
}
