import { type CameraTime } from '../probe.ts';

/**
 * A camera's wall clock beside the zone it is taken to have stood in.
 * @param zone of the workshop, taken where the camera says nothing
 */
export function assumeZone(
  time: { readonly wallTime: string; readonly offset: string | null },
  zone: string,
): CameraTime {
  return { ...time, assumedZone: time.offset === null ? zone : null };
}

const LOCAL = /^(\d{4}-\d{2}-\d{2})[T ](\d{2}:\d{2}:\d{2})(?:\.\d+)?([+-]\d{2}:?\d{2}|Z)?$/;

/**
 * When a film or sound was taken, by the tags in it; null when they do not say.
 * @param tags by lower-case name
 */
export function filmTime(tags: Readonly<Record<string, string>>, zone: string): CameraTime | null {
  const [written, withZone] =
    tags['com.apple.quicktime.creationdate'] === undefined
      ? [tags['creation_time'] ?? tags['date'], false]
      : [tags['com.apple.quicktime.creationdate'], true];
  const [, day, time, offset] = LOCAL.exec(written ?? '') ?? [];
  // A clock that was never set stands at the beginning of one of the two epochs.
  if (day === undefined || time === undefined || day < '1990') return null;
  const wallTime = `${day}T${time}`;
  if (withZone && offset !== undefined && offset !== 'Z')
    return { wallTime, offset: offset.replace(/^(...):?(..)$/, '$1:$2'), assumedZone: null };
  // The field is for UTC, and many cameras put their own clock into it: taken as it is meant, until set right.
  return { wallTime, offset: null, assumedZone: offset === 'Z' ? 'UTC' : zone };
}
