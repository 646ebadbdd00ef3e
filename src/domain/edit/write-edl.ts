import type Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { formatTimecode, hasTimecode } from '../time/timecode.ts';
import { type Edit, inRecordOrder, type Marker, rateOf, type Segment } from './edit.ts';

/** Where the record of a list begins: at one hour, so that a lead-in has room before it. Common practice. */
const RECORD_HOUR = 3600;

/** What a mark is drawn in where it has no colour of its own; a list needs one. */
const MARK_COLOUR = 'RED';

/** Anything a person wrote as a remark of a list: on one line, so that it can never be read as an event. */
function remark(text: string): string {
  return text.replace(/[\s\p{Cc}\u2028\u2029]+/gu, ' ').trim();
}

/** A reel's name as all readers take it: eight letters and digits at most; the clip's own name follows as a remark. */
function reelOf(clip: string): string {
  const reel = clip.replace(/\.[a-z0-9]{2,4}$/i, '').toUpperCase();
  return /^[A-Z0-9_]{1,8}$/.test(reel) && !/^(?:BL|BLACK|BARS)$/.test(reel) ? reel : 'AX';
}

function whole(frames: Fraction): number {
  return Math.round(frames.valueOf());
}

/** A speed in frames a second, 047.6, of the whole rate that labels count in; below zero backwards. Common practice. */
function writeSpeed(speed: Fraction, { num, den }: Rate): string {
  const fps = speed.mul(Math.round(num / den));
  const digits = fps.abs().mul(10).d === 1n ? 1 : 4;
  return `${fps.compare(0) < 0 ? '-' : ''}${fps
    .abs()
    .valueOf()
    .toFixed(digits)
    .padStart(digits + 4, '0')}`;
}

const columns = (number: number, reel: string, track: string) =>
  `${String(number).padStart(3, '0')}  ${reel.padEnd(8)} ${track.padEnd(5)} C        `;

function channelOf(track: string): string {
  return track === 'V1' ? 'V' : track === 'A1' ? 'A' : track;
}

/**
 * Why an edit cannot be written as a list: it counts in something that has no labels, or shows frames before the first.
 * @returns a sentence; null where it can be written
 */
export function whyNoEdl(edit: Edit): string | null {
  const segments = [...edit.picture, ...edit.sound];
  if (![edit.rate, ...segments.map(({ clipRate }) => clipRate)].every(hasTimecode))
    return 'An edit list writes timecode, and not every rate of this edit has any. Take the timeline.';
  if (segments.some(({ source }) => source.in.compare(0) < 0))
    return 'The edit shows frames before a clip’s label 00:00:00:00, which a list cannot write. Take the timeline.';
  return null;
}

/**
 * An edit as an edit list of the CMX 3600 kind: cuts and speeds, with marks below the event that holds them. Frames are
 * whole there; what is not is rounded to the nearest. A clip's labels are at its own rate.
 * Source: the layout of SMPTE 258M lists as the samples of OpenTimelineIO's CMX 3600 adapter show it.
 * @throws RangeError for an edit that `whyNoEdl` has a sentence for
 * @param drop whether the record's labels drop; only at the rates that have such labels
 */
export function writeEdl(edit: Edit, drop = false): string {
  const { rate, title, markers } = edit;
  const begin = Math.round(RECORD_HOUR * rateOf(rate).valueOf());
  const record = (frames: Fraction) => formatTimecode(begin + whole(frames), rate, drop);
  const events = inRecordOrder([...edit.picture, ...edit.sound]);
  const lines = [`TITLE: ${remark(title)}`, `FCM: ${drop ? '' : 'NON-'}DROP FRAME`, ''];
  let number = 0;
  const [first] = events;
  // A list begins with its first event: what comes before it must be one.
  if (first === undefined || first.record.in.compare(0) > 0) {
    const end = first?.record.in ?? edit.frames;
    number += 1;
    const zero = formatTimecode(0, rate, drop);
    lines.push(
      `${columns(number, 'BL', 'V')}${zero} ${formatTimecode(whole(end), rate, drop)} ${record(end.sub(end))} ${record(end)}`,
    );
  }
  const left = [...markers];
  for (const segment of events) {
    number += 1;
    lines.push(...writeEvent(number, segment, record));
    for (const marker of takeMarks(left, segment)) lines.push(writeMark(marker, record));
  }
  for (const marker of left) lines.push(writeMark(marker, record));
  return `${lines.join('\r\n')}\r\n`;
}

function writeEvent(number: number, segment: Segment, record: (frames: Fraction) => string): string[] {
  const { clip, alsoCalled, source, clipRate, speed, track } = segment;
  const label = (frames: Fraction) => formatTimecode(whole(frames), clipRate);
  const reel = reelOf(clip);
  const times = [label(source.in), label(source.out), record(segment.record.in), record(segment.record.out)];
  const lines = [`${columns(number, reel, channelOf(track))}${times.join(' ')}`];
  if (!speed.equals(1))
    lines.push(`M2   ${reel.padEnd(8)} ${writeSpeed(speed, clipRate)}    ${label(source.in)}`);
  lines.push(`* FROM CLIP NAME: ${remark(clip)}`);
  const [file] = alsoCalled;
  if (file !== undefined) lines.push(`* SOURCE FILE: ${remark(file)}`);
  return lines;
}

/** The marks that an event holds, taken out of those left. */
function takeMarks(left: Marker[], { record, track }: Segment): Marker[] {
  if (!track.startsWith('V')) return [];
  const own = left.filter(({ record: at }) => record.in.compare(at) <= 0 && at.compare(record.out) < 0);
  for (const marker of own) left.splice(left.indexOf(marker), 1);
  return own;
}

function writeMark({ record: at, name, colour }: Marker, record: (frames: Fraction) => string): string {
  const ink = (colour ?? MARK_COLOUR).toUpperCase().replace(/[^A-Z]/g, '');
  return `* LOC: ${record(at)} ${(ink === '' ? MARK_COLOUR : ink).padEnd(7)} ${remark(name)}`.trimEnd();
}
