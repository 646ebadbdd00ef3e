import { clipNameKey } from './clip-names.ts';
import { type Edit, rateOf, type Segment, type Stretch } from './edit.ts';
import type Fraction from 'fraction.js';

/** same: source and place are unchanged; moved: only the place; trimmed: other source of the clip, wherever it lies. */
export type SegmentChange = 'same' | 'moved' | 'trimmed' | 'new' | 'dropped';

export interface ComparedSegment {
  readonly change: SegmentChange;
  readonly before: Segment | null;
  readonly after: Segment | null;
}

function key({ clip, source, clipRate, speed }: Segment): string {
  const rate = rateOf(clipRate);
  const times = [source.in.div(rate), source.out.div(rate), speed];
  return [clipNameKey(clip), ...times.map((time) => time.toFraction())].join('\n');
}

function groupBy(segments: readonly Segment[], name: (segment: Segment) => string): Map<string, Segment[]> {
  const groups = new Map<string, Segment[]>();
  for (const segment of segments) {
    const group = groups.get(name(segment));
    if (group === undefined) groups.set(name(segment), [segment]);
    else group.push(segment);
  }
  return groups;
}

/** How much two segments of one clip have in common, in seconds of the clip; below 0 when they lie apart. */
function shared(a: Segment, b: Segment): Fraction {
  const seconds = ({ source, clipRate }: Segment): Stretch => ({
    in: source.in.div(rateOf(clipRate)),
    out: source.out.div(rateOf(clipRate)),
  });
  const [one, two] = [seconds(a), seconds(b)];
  const start = one.in.compare(two.in) > 0 ? one.in : two.in;
  const end = one.out.compare(two.out) < 0 ? one.out : two.out;
  return end.sub(start);
}

/** Pairs uses of one clip that show some of the same, those first that have most in common. */
function pairAlike(news: readonly Segment[], olds: readonly Segment[], pairs: Map<Segment, Segment>): void {
  const alike = news.flatMap((after) =>
    olds
      .map((before) => ({ after, before, common: shared(before, after) }))
      .filter(({ common }) => common.compare(0) > 0),
  );
  const taken = new Set<Segment>();
  for (const { after, before } of alike.sort((a, b) => b.common.compare(a.common))) {
    if (pairs.has(after) || taken.has(before)) continue;
    pairs.set(after, before);
    taken.add(before);
  }
}

function samePlace(a: Segment, before: Edit, b: Segment, after: Edit): boolean {
  return a.record.in.div(rateOf(before.rate)).equals(b.record.in.div(rateOf(after.rate)));
}

/**
 * What a new edit does to the pictures of an old one. Equal uses are paired in their order; then what is left of a
 * clip by how much of it both show.
 * @returns the new edit's segments in order, then the dropped ones
 */
export function compareEdits(before: Edit, after: Edit): ComparedSegment[] {
  const equal = groupBy(before.picture, key);
  const pairs = new Map<Segment, Segment>();
  for (const segment of after.picture) {
    const other = equal.get(key(segment))?.shift();
    if (other !== undefined) pairs.set(segment, other);
  }
  const same = new Set(pairs.keys());
  const nameOf = ({ clip }: Segment) => clipNameKey(clip);
  const olds = groupBy([...equal.values()].flat(), nameOf);
  const news = groupBy(
    after.picture.filter((segment) => !same.has(segment)),
    nameOf,
  );
  for (const [clip, group] of news) pairAlike(group, olds.get(clip) ?? [], pairs);
  const kept = new Set(pairs.values());
  return [
    ...after.picture.map((segment): ComparedSegment => {
      const other = pairs.get(segment) ?? null;
      if (other === null) return { change: 'new', before: null, after: segment };
      if (!same.has(segment)) return { change: 'trimmed', before: other, after: segment };
      const change = samePlace(other, before, segment, after) ? 'same' : 'moved';
      return { change, before: other, after: segment };
    }),
    ...before.picture
      .filter((segment) => !kept.has(segment))
      .map((segment): ComparedSegment => ({ change: 'dropped', before: segment, after: null })),
  ];
}
