import { type Appearance } from '../domain/appearances/appearance.ts';
import { partsAt } from '../domain/appearances/parts-at.ts';
import { type Rate } from '../domain/time/rate.ts';

/** What a companion page carries as data, kept short: all positions are frames of the one rate. */
export interface CompanionData {
  readonly rate: readonly [num: number, den: number];
  /** Seconds; null while nobody knows. */
  readonly seconds: number | null;
  /** Which part of the page's list, from when to when. */
  readonly appearances: readonly (readonly [part: number, from: number, to: number])[];
  /** First frames of the chapters, rising. */
  readonly chapters: readonly number[];
  /** Where each note of the page's list begins and stops holding, rising. */
  readonly notes: readonly (readonly [from: number, to: number])[];
}

/** The same, as the domain counts. */
export interface Course {
  readonly rate: Rate;
  readonly seconds: number | null;
  readonly appearances: readonly Appearance[];
  readonly chapters: readonly number[];
  readonly notes: readonly (readonly [from: number, to: number])[];
}

/** What holds at a frame: lists are named by their index on the page. */
export interface Now {
  readonly frame: number;
  readonly seconds: number;
  readonly parts: readonly { readonly index: number; readonly filled: boolean }[];
  /** The newest of the notes that hold; null between notes. */
  readonly note: number | null;
}

/** A part is named by its place in the page's list, as text, which is what the domain's function takes. */
export function readCourse({ rate: [num, den], appearances, ...rest }: CompanionData): Course {
  return {
    ...rest,
    rate: { num, den },
    appearances: appearances.map(([part, from, to]) => ({ partId: String(part), from, to })),
  };
}

/** What holds at a frame of the course. @param seconds the instant, as clocks and addresses say it */
export function nowAt(course: Course, frame: number, seconds: number): Now {
  const note = course.notes.findLastIndex(([from, to]) => from <= frame && frame < to);
  return {
    frame,
    seconds,
    parts: partsAt(frame, course.appearances, course.chapters).map(({ partId, filled }) => ({
      index: Number(partId),
      filled,
    })),
    note: note === -1 ? null : note,
  };
}

/** The instant that an address asks for by ?t=221, in seconds; null when it asks for none. */
export function askedSeconds(search: string): number | null {
  const asked = new URLSearchParams(search).get('t') ?? '';
  return /^\d{1,6}(\.\d{1,3})?$/.test(asked) ? Number(asked) : null;
}
