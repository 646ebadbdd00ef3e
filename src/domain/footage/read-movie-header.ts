import { MILLISECOND_RATE, type Rate } from '../time/rate.ts';

/** What the header of an MP4 or MOV file says of its film. */
export interface MovieHeader {
  /** Wall time of creation, which the format means as UTC; null for one before 1970. */
  readonly createdWall: string | null;
  readonly rate: Rate;
  /** Frames at the rate. */
  readonly frames: number;
  /** When frames begin, in milliseconds since the first; null where they come evenly. */
  readonly frameTimes: readonly number[] | null;
}

/** Seconds from 1904 to 1970 (ISO/IEC 14496-12, section 8.2.2: creation_time counts from 1904 in UTC). */
const EPOCH_SECONDS = 2_082_844_800;
/** Frames of a film whose times are taken one by one; of a longer one the average is. Our own limit. */
const MOST_FRAMES = 1_000_000;

interface Box {
  readonly type: string;
  readonly from: number;
  readonly until: number;
}

function boxesIn(view: DataView, from: number, until: number): Box[] {
  const boxes: Box[] = [];
  let at = from;
  while (at + 8 <= until && boxes.length < 1000) {
    const short = view.getUint32(at);
    const long = short === 1 && at + 16 <= until;
    const size = long ? Number(view.getBigUint64(at + 8)) : short === 0 ? until - at : short;
    const head = long ? 16 : 8;
    if (size < head || at + size > until) break;
    const code = [0, 1, 2, 3].map((index) => view.getUint8(at + 4 + index));
    boxes.push({ type: String.fromCharCode(...code), from: at + head, until: at + size });
    at += size;
  }
  return boxes;
}

function findBox(view: DataView, within: Box, ...path: readonly string[]): Box | null {
  return path.reduce<Box | null>(
    (box, type) =>
      box === null ? null : (boxesIn(view, box.from, box.until).find((one) => one.type === type) ?? null),
    within,
  );
}

/** Creation time in seconds since 1904, and units a second, of a movie or media header of version 0 or 1. */
function readTimes(view: DataView, { from, until }: Box): { created: number; scale: number } | null {
  const version = view.getUint8(from);
  if (until - from < (version === 1 ? 32 : 20)) return null;
  return version === 1
    ? { created: Number(view.getBigUint64(from + 4)), scale: view.getUint32(from + 20) }
    : { created: view.getUint32(from + 4), scale: view.getUint32(from + 12) };
}

/** How often a frame lasts how long, in units of the track (ISO/IEC 14496-12, section 8.6.1.2). */
function readDurations(view: DataView, { from, until }: Box): { count: number; lasts: number }[] {
  const entries = Math.min(view.getUint32(from + 4), Math.floor((until - from - 8) / 8));
  return Array.from({ length: entries }, (_, index) => ({
    count: view.getUint32(from + 8 + index * 8),
    lasts: view.getUint32(from + 12 + index * 8),
  }));
}

/**
 * Reads the header of an MP4 or MOV file (ISO/IEC 14496-12).
 * @param bytes the whole `moov` box
 * @param snap gives the listed rate near an average one
 * @returns null for a file without a film, or one whose header is cut off
 */
export function readMovieHeader(bytes: Uint8Array, snap: (average: Rate) => Rate): MovieHeader | null {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const [movie] = boxesIn(view, 0, bytes.byteLength);
  if (movie?.type !== 'moov') return null;
  const head = findBox(view, movie, 'mvhd');
  const track = boxesIn(view, movie.from, movie.until).find((box) => {
    const handler = box.type === 'trak' ? findBox(view, box, 'mdia', 'hdlr') : null;
    return (
      handler !== null &&
      handler.until - handler.from >= 12 &&
      view.getUint32(handler.from + 8) === 0x76696465
    );
  });
  const media = track === undefined ? null : findBox(view, track, 'mdia', 'mdhd');
  const times = track === undefined ? null : findBox(view, track, 'mdia', 'minf', 'stbl', 'stts');
  if (media === null || times === null || times.until - times.from < 8) return null;
  const scale = readTimes(view, media)?.scale ?? 0;
  const durations = readDurations(view, times);
  const samples = durations.reduce((sum, { count }) => sum + count, 0);
  const length = durations.reduce((sum, { count, lasts }) => sum + count * lasts, 0);
  if (scale === 0 || samples === 0 || length === 0) return null;
  const rate = snap({ num: samples * scale, den: length });
  const even = durations.every(
    ({ count, lasts }) => count * Math.abs(lasts * samples - length) <= length * 2,
  );
  return {
    createdWall: wallOf(head === null ? null : readTimes(view, head)),
    rate,
    frames: Math.round((length / scale) * (rate.num / rate.den)),
    frameTimes: even || rate === MILLISECOND_RATE || samples > MOST_FRAMES ? null : timesOf(durations, scale),
  };
}

function wallOf(times: { readonly created: number } | null): string | null {
  if (times === null || times.created === 0) return times === null ? null : '1904-01-01T00:00:00';
  const at = new Date((times.created - EPOCH_SECONDS) * 1000);
  return Number.isNaN(at.getTime()) || at.getUTCFullYear() > 9999 || at.getUTCFullYear() < 1904
    ? null
    : at.toISOString().slice(0, 19);
}

function timesOf(durations: readonly { count: number; lasts: number }[], scale: number): number[] {
  const times: number[] = [];
  let at = 0;
  for (const { count, lasts } of durations)
    for (let index = 0; index < count; index += 1) {
      times.push(Math.round((at * 1000 * 1000) / scale) / 1000);
      at += lasts;
    }
  return times;
}
