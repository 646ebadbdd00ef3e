import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';

/** A half-open stretch of frames: the first one in it, and the first one after it. Exact; whole in most lists. */
export interface Stretch {
  readonly in: Fraction;
  readonly out: Fraction;
}

/** One use of a clip in an episode. */
export interface Segment {
  /** The clip as the list names it. */
  readonly clip: string;
  /** Other names that the list has for it: its reel, its file. */
  readonly alsoCalled: readonly string[];
  /** What the source is counted in. */
  readonly clipRate: Rate;
  /** Frames of the clip, counted from its label 00:00:00:00; in is before out when it plays backwards too. */
  readonly source: Stretch;
  /** Frames of the episode at the rate of the edit, counted from the first event. */
  readonly record: Stretch;
  /** Seconds of the clip that a second of the episode shows: 0 holds one frame, below 0 plays backwards. */
  readonly speed: Fraction;
  /** The track it lies on, such as V1 or A2. */
  readonly track: string;
}

/** A remark that an editing program keeps at a moment. */
export interface Marker {
  /** Frames of the episode. */
  readonly record: Fraction;
  readonly name: string;
  readonly colour: string | null;
}

/** What a reader could not take as it stands, and what it did instead. */
export interface EditWarning {
  /** Line of the list, counted from 1; null where it has none to name. */
  readonly line: number | null;
  readonly sentence: string;
}

/** The segments of clips that make an episode. */
export interface Edit {
  readonly title: string;
  readonly rate: Rate;
  /** Whether the list says that its labels drop, however they are written. */
  readonly drop: boolean;
  /** Where the last event ends, in frames of the episode. */
  readonly frames: Fraction;
  /** What is seen, in order, no two at one time: a higher track hides those below it. */
  readonly picture: readonly Segment[];
  /** What is heard, in order; several at one time where tracks are mixed. */
  readonly sound: readonly Segment[];
  /** What is seen beside the picture while one is dissolved into the other: the end of one clip, the start of the next. */
  readonly dissolved: readonly Segment[];
  readonly markers: readonly Marker[];
  readonly warnings: readonly EditWarning[];
}

/** How to read a list that says less than is needed. */
export interface ReadEditOptions {
  /** The rate of the episode. An edit list does not say it; a timeline does. */
  readonly rate: Rate | null;
  /** Rates of clips that differ from the episode's, by name. */
  readonly clipRates?: ReadonlyMap<string, Rate>;
}

/** A rate as a fraction. */
export function rateOf(rate: Rate): Fraction {
  return new Fraction(rate.num, rate.den);
}

/** How many frames of the clip a frame of the episode moves on by. */
export function framesPerFrame(segment: Pick<Segment, 'clipRate' | 'speed'>, rate: Rate): Fraction {
  return segment.speed.mul(rateOf(segment.clipRate)).div(rateOf(rate));
}

/** How long a stretch is, in its own frames. */
export function lengthOf(stretch: Stretch): Fraction {
  return stretch.out.sub(stretch.in);
}

/** Segments in the order of the episode; at one moment as they came. */
export function inRecordOrder(segments: readonly Segment[]): Segment[] {
  return [...segments].sort((a, b) => a.record.in.compare(b.record.in));
}

/** What is left of a segment between two moments of the episode that lie in it. */
export function trimSegment(segment: Segment, from: Fraction, to: Fraction, rate: Rate): Segment {
  const { record, source, speed } = segment;
  if (from.equals(record.in) && to.equals(record.out)) return segment;
  const step = framesPerFrame(segment, rate);
  const head = from.sub(record.in).mul(step.abs());
  const tail = record.out.sub(to).mul(step.abs());
  // What is left keeps the list's own source where it is not cut, however the speed was rounded.
  const [first, last] = speed.compare(0) < 0 ? [tail, head] : [head, tail];
  const out = source.out.sub(last);
  return {
    ...segment,
    record: { in: from, out: to },
    source: { in: source.in.add(first), out: out.compare(source.in.add(first)) > 0 ? out : source.out },
  };
}

/** A warning as one line. */
export function sayWarning({ line, sentence }: EditWarning): string {
  return line === null ? sentence : `Line ${String(line)}: ${sentence}`;
}
