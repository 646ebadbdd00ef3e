import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { type Marker, type Segment, trimSegment } from './edit.ts';
import { type Layer } from './flatten-tracks.ts';

export const ZERO = new Fraction(0);
export const ONE = new Fraction(1);

/** What an item shows in its own time: frames of the episode's rate from its own start. */
export interface Shown {
  readonly length: Fraction;
  readonly layers: readonly Layer[];
  readonly sound: readonly Segment[];
  readonly dissolved: readonly Segment[];
  readonly markers: readonly Marker[];
}

export const NOTHING: Shown = { length: ZERO, layers: [], sound: [], dissolved: [], markers: [] };

type Change = (segment: Segment) => Segment | null;

/** Every stretch of an item changed alike; a stretch without a clip is changed as if it had one. */
function changeAll(shown: Shown, length: Fraction, change: Change, move: (at: Fraction) => Fraction): Shown {
  const all = (segments: readonly Segment[]) => segments.flatMap((segment) => change(segment) ?? []);
  const layers = shown.layers.flatMap(({ record, segment }): Layer[] => {
    const changed = change(segment ?? { ...STAND_IN, record });
    return changed === null ? [] : [{ record: changed.record, segment: segment === null ? null : changed }];
  });
  const markers = shown.markers
    .map((marker) => ({ ...marker, record: move(marker.record) }))
    .filter(({ record }) => record.compare(0) >= 0 && record.compare(length) <= 0);
  return { length, layers, sound: all(shown.sound), dissolved: all(shown.dissolved), markers };
}

const STAND_IN: Omit<Segment, 'record'> = {
  clip: '',
  alsoCalled: [],
  clipRate: { num: 1, den: 1 },
  source: { in: ZERO, out: ONE },
  speed: ZERO,
  track: '',
};

/** An item that begins later, or earlier for a negative number. */
export function moveBy(shown: Shown, by: Fraction): Shown {
  const move = (at: Fraction) => at.add(by);
  const length = shown.length.add(by);
  return changeAll(
    shown,
    length,
    (segment) => ({ ...segment, record: { in: move(segment.record.in), out: move(segment.record.out) } }),
    move,
  );
}

/** What is shown of an item from one moment of it on, for a time. */
export function cutOut(shown: Shown, from: Fraction, length: Fraction, rate: Rate): Shown {
  const to = from.add(length);
  const cut: Change = (segment) => {
    const start = segment.record.in.compare(from) > 0 ? segment.record.in : from;
    const end = segment.record.out.compare(to) < 0 ? segment.record.out : to;
    return end.compare(start) > 0 ? trimSegment(segment, start, end, rate) : null;
  };
  const kept = changeAll(shown, to, cut, (at) => at);
  return { ...moveBy(kept, from.neg()), length };
}

/** What is shown of an item at another speed. What is short of its end by less than a frame lasts until it. */
export function playAt(shown: Shown, speed: Fraction, length: Fraction): Shown {
  const move = (at: Fraction) => at.div(speed);
  const change: Change = (segment) => {
    const end = move(segment.record.out);
    const short = length.sub(end);
    const out = short.compare(0) > 0 && short.compare(ONE) < 0 ? length : end;
    return { ...segment, speed: segment.speed.mul(speed), record: { in: move(segment.record.in), out } };
  };
  return changeAll(shown, length, change, move);
}

/** One frame of an item, held. */
export function hold(shown: Shown, length: Fraction, rate: Rate): Shown {
  const frame = cutOut(shown, ZERO, ONE, rate);
  const change: Change = (segment) => ({
    ...segment,
    speed: ZERO,
    source: { in: segment.source.in, out: segment.source.in.add(1) },
    record: { in: ZERO, out: length },
  });
  return { ...changeAll(frame, length, change, (at) => at), sound: [], dissolved: [] };
}

/** Several items seen at once, or one after the other. */
export function together(parts: readonly Shown[], length: Fraction): Shown {
  return {
    length,
    layers: parts.flatMap(({ layers }) => layers),
    sound: parts.flatMap(({ sound }) => sound),
    dissolved: parts.flatMap(({ dissolved }) => dissolved),
    markers: parts.flatMap(({ markers }) => markers),
  };
}
