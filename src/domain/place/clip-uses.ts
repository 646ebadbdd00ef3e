import type Fraction from 'fraction.js';
import { clipNameKey } from '../edit/clip-names.ts';
import { lengthOf, rateOf, type Segment } from '../edit/edit.ts';
import { type Rate } from '../time/rate.ts';

/** A stretch of a clip that an episode shows or sounds, in seconds of the clip. */
export interface ClipUse {
  readonly segment: Segment;
  readonly in: Fraction;
  /** The first moment that is not in. */
  readonly out: Fraction;
  /** Seen only while one picture is dissolved into another. */
  readonly dissolving: boolean;
}

/** The uses of each clip, in the order of the clip, found by any name that the edit has for it. */
export type ClipUses = (clip: string) => readonly ClipUse[];

function add(map: Map<string, ClipUse[]>, name: string, use: ClipUse): void {
  const there = map.get(name);
  if (there === undefined) map.set(name, [use]);
  else if (there.at(-1) !== use) there.push(use);
}

/**
 * Where the clips of an edit are used. A clip is looked for by the name that the list calls it, then by that name
 * without its media ending, then by its file and reel.
 */
export function indexClipUses(segments: readonly Segment[], dissolved: readonly Segment[] = []): ClipUses {
  const maps = [0, 1, 2].map(() => new Map<string, ClipUse[]>());
  const [exact, plain, others] = maps as [
    Map<string, ClipUse[]>,
    Map<string, ClipUse[]>,
    Map<string, ClipUse[]>,
  ];
  const all = [
    ...segments.map((segment) => useOf(segment, false)),
    ...dissolved.map((segment) => useOf(segment, true)),
  ].sort((a, b) => a.in.compare(b.in));
  for (const use of all) {
    add(exact, use.segment.clip, use);
    add(plain, clipNameKey(use.segment.clip), use);
    for (const name of use.segment.alsoCalled) add(others, clipNameKey(name), use);
  }
  return (clip) => exact.get(clip) ?? plain.get(clipNameKey(clip)) ?? others.get(clipNameKey(clip)) ?? [];
}

function useOf(segment: Segment, dissolving: boolean): ClipUse {
  const rate = rateOf(segment.clipRate);
  return { segment, in: segment.source.in.div(rate), out: segment.source.out.div(rate), dissolving };
}

/** The last frame of the episode that a use fills. */
function lastFrame({ record }: Segment): Fraction {
  const last = record.out.sub(1);
  return last.compare(record.in) > 0 ? last : record.in;
}

/**
 * The moment of the episode at which a moment of the clip is seen, or the edge of the use nearest to it.
 * @param at seconds of the clip from its label 00:00:00:00
 * @param rate of the episode, in whose frames the answer is
 */
export function recordOf({ segment, in: start, out }: ClipUse, at: Fraction, rate: Rate): Fraction {
  const { record, speed, clipRate } = segment;
  if (speed.equals(0)) return record.in;
  // Played backwards, the last frame comes first; a moment inside it is seen with it.
  const lead = speed.compare(0) > 0 ? at.sub(start) : out.sub(at).sub(rateOf(clipRate).inverse());
  if (lead.compare(0) < 0) return record.in;
  const moment = record.in.add(lead.div(speed.abs()).mul(rateOf(rate)));
  return moment.compare(record.out) < 0 ? moment : lastFrame(segment);
}

/** The better use first: one that is seen by itself, then the longest, then the earliest. */
export function byImportance(a: ClipUse, b: ClipUse): number {
  return (
    Number(a.dissolving) - Number(b.dissolving) ||
    lengthOf(b.segment.record).compare(lengthOf(a.segment.record)) ||
    a.segment.record.in.compare(b.segment.record.in)
  );
}
