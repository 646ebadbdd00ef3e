import Fraction from 'fraction.js';
import { type Edit, type Marker, rateOf, type Segment } from '../edit/edit.ts';
import { type Rate } from '../time/rate.ts';

/** A clip with what was noted on it. */
export interface MarkedClip {
  readonly clip: string;
  /** Its file, where that is known. */
  readonly file: string | null;
  readonly rate: Rate;
  /** The frame that its first label stands for, counted from 00:00:00:00. */
  readonly start: number;
  readonly frames: number;
  /** Frames since its first one. */
  readonly marks: readonly {
    readonly frame: number;
    readonly name: string;
    readonly colour: string | null;
  }[];
}

/**
 * Whole clips one after another with their marks, so that an editor has what was noted in the shop before the first
 * cut. Marks outside of their clip are left out.
 * @param rate of the timeline
 */
export function stringOut(title: string, clips: readonly MarkedClip[], rate: Rate): Edit {
  let at = new Fraction(0);
  const picture: Segment[] = [];
  const markers: Marker[] = [];
  for (const { clip, file, rate: clipRate, start, frames, marks } of clips) {
    const step = rateOf(rate).div(rateOf(clipRate));
    const begin = at;
    at = begin.add(step.mul(frames));
    picture.push({
      clip,
      alsoCalled: file === null ? [] : [file],
      clipRate,
      source: { in: new Fraction(start), out: new Fraction(start + frames) },
      record: { in: begin, out: at },
      speed: new Fraction(1),
      track: 'V1',
    });
    for (const { frame, name, colour } of marks)
      if (frame >= 0 && frame < frames) markers.push({ record: begin.add(step.mul(frame)), name, colour });
  }
  markers.sort((a, b) => a.record.compare(b.record));
  return { title, rate, drop: false, frames: at, picture, sound: [], dissolved: [], markers, warnings: [] };
}
