import { type Edit, lengthOf, rateOf, type Segment } from '../edit/edit.ts';
import type Fraction from 'fraction.js';
import { type ClipMoment, type Sense } from './place-notes.ts';

function holds({ record }: Segment, at: Fraction): boolean {
  return record.in.compare(at) <= 0 && at.compare(record.out) < 0;
}

/** The picture at a moment; pictures lie in order and none over another. */
function pictureAt(picture: readonly Segment[], at: Fraction): Segment | undefined {
  let [low, high] = [0, picture.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (picture[middle] !== undefined && picture[middle].record.in.compare(at) <= 0) low = middle + 1;
    else high = middle;
  }
  const found = picture[low - 1];
  return found !== undefined && holds(found, at) ? found : undefined;
}

/** What is seen, or heard, at a moment of the episode; of mixed sounds the longest. Null in black. */
export function segmentUnder(edit: Edit, at: Fraction, sense: Sense): Segment | null {
  const bySound = sense === 'sound' && edit.sound.length > 0;
  const segment = bySound
    ? edit.sound
        .filter((one) => holds(one, at))
        .sort((a, b) => lengthOf(b.record).compare(lengthOf(a.record)))[0]
    : pictureAt(edit.picture, at);
  return segment ?? null;
}

/**
 * The moment of a clip that lies beneath a moment of the episode, so that a note typed there follows the next edit.
 * @param at frames of the episode
 * @returns null where no clip lies, such as in black; of mixed sounds the longest is taken
 */
export function clipMomentUnder(edit: Edit, at: Fraction, sense: Sense): ClipMoment | null {
  const segment = segmentUnder(edit, at, sense);
  return segment === null ? null : { clip: segment.clip, at: momentIn(segment, at, edit), sense };
}

/** The moment of its clip that a segment shows at a moment of the episode, in seconds from label 00:00:00:00. */
export function momentIn({ record, source, speed, clipRate }: Segment, at: Fraction, edit: Edit): Fraction {
  const clipFrames = rateOf(clipRate);
  const since = at.sub(record.in).div(rateOf(edit.rate)).mul(speed.abs());
  const start = source.in.div(clipFrames);
  // Played backwards, the last frame is the first one seen.
  const moment = speed.compare(0) < 0 ? source.out.sub(1).div(clipFrames).sub(since) : start.add(since);
  return moment.compare(start) < 0 ? start : moment;
}
