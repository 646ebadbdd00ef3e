import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { LISTED_RATES, type Rate } from '../time/rate.ts';
import { rateOf } from './edit.ts';

/** An object of a timeline: its schema stands under OTIO_SCHEMA, such as Clip.2. */
export type OtioObject = Readonly<Record<string, unknown>>;

/** A timeline that cannot be read. Thrown inside the reader, which gives its sentence. */
export class OtioFault extends Error {}

/** The largest count of frames or seconds that is believed. Our own limit: more is a slip or a broken file. */
const MOST_TIME = 1e12;
const MOST_RATE = 1_000_000;

export function isObject(value: unknown): value is OtioObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The kind of an object, without the version of its schema: Clip, Track. */
export function schemaOf(object: OtioObject): string {
  const schema = object['OTIO_SCHEMA'];
  return typeof schema === 'string' ? schema.replace(/\.\d+$/, '') : '';
}

/** A name that an object bears; empty where it bears none. */
export function nameOf(object: OtioObject): string {
  return typeof object['name'] === 'string' ? object['name'].trim() : '';
}

/** The lists inside an object, such as its children; empty where there is none. */
export function listIn(object: OtioObject, field: string): readonly unknown[] {
  const list = object[field];
  return Array.isArray(list) ? list : [];
}

/** What an object is called in a sentence. */
export function sayObject(object: OtioObject): string {
  const schema = schemaOf(object) || 'object';
  return nameOf(object) === '' ? `A ${schema.toLowerCase()} without a name` : `“${nameOf(object)}”`;
}

/** A number of a timeline as a rate: the listed one beside it, or the simplest fraction. */
function readRate(value: unknown, owner: OtioObject): Rate {
  if (typeof value !== 'number' || !Number.isFinite(value) || value <= 0 || value > MOST_RATE)
    throw new OtioFault(`${sayObject(owner)} counts in ${String(value)} frames a second.`);
  if (Number.isInteger(value)) return { num: value, den: 1 };
  const listed = LISTED_RATES.find((rate) => Math.abs(value - rate.num / rate.den) < value * 1e-4);
  const exact = new Fraction(value);
  return listed ?? { num: Number(exact.n), den: Number(exact.d) };
}

/** A time in seconds, and what it is counted in. */
export interface OtioTime {
  readonly seconds: Fraction;
  readonly rate: Rate;
}

function readTime(value: unknown, owner: OtioObject): OtioTime {
  const count = isObject(value) ? value['value'] : null;
  if (!isObject(value) || typeof count !== 'number' || !Number.isFinite(count) || Math.abs(count) > MOST_TIME)
    throw new OtioFault(`${sayObject(owner)} has a time that is no number.`);
  const rate = readRate(value['rate'], owner);
  return { seconds: new Fraction(count).div(rateOf(rate)), rate };
}

/** A stretch of time as a timeline has it. */
export interface OtioRange {
  readonly start: OtioTime;
  readonly duration: OtioTime;
}

/** @returns null where the field is empty */
export function readRange(owner: OtioObject, field: string): OtioRange | null {
  const range = owner[field];
  if (range === null || range === undefined) return null;
  if (!isObject(range)) throw new OtioFault(`${sayObject(owner)} has a range that is none.`);
  const duration = readTime(range['duration'], owner);
  if (duration.seconds.compare(0) < 0) throw new OtioFault(`${sayObject(owner)} is shorter than nothing.`);
  return { start: readTime(range['start_time'], owner), duration };
}

/** How far a transition reaches to one side of its cut, in seconds. */
export function readOffset(transition: OtioObject, field: 'in_offset' | 'out_offset'): Fraction {
  const offset = transition[field];
  if (offset === null || offset === undefined) return new Fraction(0);
  const { seconds } = readTime(offset, transition);
  return seconds.compare(0) < 0 ? new Fraction(0) : seconds;
}

/** The media that a clip shows: of Clip.2 the active one, of Clip.1 the only one. */
export function mediaOf(clip: OtioObject): OtioObject | null {
  const all = clip['media_references'];
  const key = clip['active_media_reference_key'];
  if (isObject(all) && typeof key === 'string' && isObject(all[key])) return all[key];
  return isObject(clip['media_reference']) ? clip['media_reference'] : null;
}

/** The last line that was read when JSON broke, from 1. */
function lineOfFault(text: string, message: string): number {
  const [, position] = /position (\d+)/.exec(message) ?? [];
  const read = position === undefined ? text.trimEnd() : text.slice(0, Number(position));
  return read.split(/\r\n|\r|\n/).length;
}

/** A timeline's text as objects, with those that others point to by their mark. */
export function parseOtio(
  text: string,
): Answer<{ readonly root: OtioObject; readonly marked: ReadonlyMap<string, OtioObject> }> {
  let root: unknown;
  try {
    root = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (error) {
    const message = error instanceof Error ? error.message : '';
    const line = String(lineOfFault(text, message));
    return wrong(`Line ${line}: the timeline is no JSON from here on. It may have been cut off.`);
  }
  if (!isObject(root) || schemaOf(root) === '') return wrong('This is JSON, but no OpenTimelineIO timeline.');
  const marked = new Map<string, OtioObject>();
  const open: unknown[] = [root];
  while (open.length > 0) {
    const value = open.pop();
    if (Array.isArray(value)) for (const one of value) open.push(one);
    else if (isObject(value)) {
      const mark = value['OTIO_REF_ID'];
      if (typeof mark === 'string') marked.set(mark, value);
      for (const one of Object.values(value)) if (typeof one === 'object' && one !== null) open.push(one);
    }
  }
  return right({ root, marked });
}
