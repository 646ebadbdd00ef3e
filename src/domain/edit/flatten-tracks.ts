import type Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { type Segment, type Stretch, trimSegment } from './edit.ts';

/** Something on a picture track: a segment, or a stretch that hides what is below it and shows no clip. */
export interface Layer {
  readonly record: Stretch;
  /** The segment; null for black and other generated pictures. */
  readonly segment: Segment | null;
}

interface Ranked extends Layer {
  readonly rank: number;
}

/** The place of a rank in layers sorted by it. */
function placeOf(active: readonly Ranked[], rank: number): number {
  let [low, high] = [0, active.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((active[middle]?.rank ?? 0) < rank) low = middle + 1;
    else high = middle;
  }
  return low;
}

/**
 * What is seen of pictures that lie over each other.
 * @param layers from the lowest up; of two at one moment the later one is seen
 * @param rate of the episode, in whose frames the records are
 * @returns the seen stretches in order, no two at one moment, and the segments of which nothing is seen
 */
export function flattenTracks(
  layers: readonly Layer[],
  rate: Rate,
): { readonly seen: Segment[]; readonly hidden: Segment[] } {
  const ranked = layers.map((layer, rank): Ranked => ({ ...layer, rank }));
  const edges = ranked
    .filter(({ record }) => record.out.compare(record.in) > 0)
    .flatMap((layer) => [
      { at: layer.record.in, layer, begins: true },
      { at: layer.record.out, layer, begins: false },
    ])
    .sort((a, b) => a.at.compare(b.at));
  const active: Ranked[] = [];
  const seen: Segment[] = [];
  const shown = new Set<Ranked>();
  let top: Ranked | null = null;
  let since: Fraction | null = null;
  const close = (at: Fraction) => {
    if (top?.segment != null && since !== null && at.compare(since) > 0) {
      seen.push(trimSegment(top.segment, since, at, rate));
      shown.add(top);
    }
  };
  for (const [index, edge] of edges.entries()) {
    const place = placeOf(active, edge.layer.rank);
    if (edge.begins) active.splice(place, 0, edge.layer);
    else active.splice(place, 1);
    const next = edges[index + 1];
    const now = active.at(-1) ?? null;
    // Nothing changes hands until every edge at this moment is counted.
    if (now === top || next?.at.equals(edge.at) === true) continue;
    close(edge.at);
    [top, since] = [now, edge.at];
  }
  const hidden = ranked.filter((layer) => layer.segment !== null && !shown.has(layer));
  return { seen, hidden: hidden.flatMap(({ segment }) => segment ?? []) };
}
