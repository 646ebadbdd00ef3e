const MINUTE_MS = 60_000;
const WALL = /^(\d{4})-(\d{2})-(\d{2})[T ](\d{2}):(\d{2})(?::(\d{2})(?:[.,](\d{1,3})\d*)?)?$/;

const formats = new Map<string, Intl.DateTimeFormat>();

function formatIn(timeZone: string): Intl.DateTimeFormat {
  let format = formats.get(timeZone);
  if (format === undefined) {
    // Swedish writes dates as ISO 8601 does.
    format = new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'medium' });
    formats.set(timeZone, format);
  }
  return format;
}

/**
 * A wall time read as if it were UTC.
 * @param wall 2026-11-02T14:22:07, with or without seconds and parts of them
 * @returns milliseconds since 1970; null for what is no such time
 */
export function wallAsUtc(wall: string): number | null {
  const [, year, month, day, hour, minute, second = '00', part = '0'] = WALL.exec(wall.trim()) ?? [];
  if (year === undefined) return null;
  const [m, d, h, min, s] = [month, day, hour, minute, second].map(Number) as [
    number,
    number,
    number,
    number,
    number,
  ];
  if (h > 23 || min > 59 || s > 59) return null;
  const at = new Date(0);
  at.setUTCFullYear(Number(year), m - 1, d);
  at.setUTCHours(h, min, s, Number(part.padEnd(3, '0')));
  return at.getUTCMonth() === m - 1 && at.getUTCDate() === d ? at.getTime() : null;
}

/** What the clocks of a zone show at an instant: 2026-11-02T14:22:07. @param at milliseconds since 1970 */
export function wallIn(timeZone: string, at: number): string {
  return formatIn(timeZone).format(at).replace(' ', 'T');
}

/** How far a zone is from UTC at an instant, in milliseconds. */
function offsetAt(timeZone: string, at: number): number {
  const whole = Math.floor(at / 1000) * 1000;
  return (wallAsUtc(wallIn(timeZone, whole)) ?? whole) - whole;
}

/**
 * The instant at which the clocks of a zone show a wall time: of two, when they are put back, the first; a time that is
 * skipped when they are put forward is read as if they had not been yet.
 * @returns milliseconds since 1970; null for what is no wall time
 */
export function instantOfWall(timeZone: string, wall: string): number | null {
  const plain = wallAsUtc(wall);
  if (plain === null) return null;
  // The offset of the day before holds for both cases named above; after a change long past, the later one agrees.
  const before = plain - offsetAt(timeZone, plain - 24 * 60 * MINUTE_MS);
  if (plain - before === offsetAt(timeZone, before)) return before;
  const after = plain - offsetAt(timeZone, plain + 24 * 60 * MINUTE_MS);
  return plain - after === offsetAt(timeZone, after) ? after : before;
}
