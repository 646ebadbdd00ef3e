/** A stretch of shop time, half-open, in milliseconds since 1970. */
export interface ShopStretch {
  readonly from: number;
  readonly until: number;
}

/** Shorter gaps are the camera being picked up. Our own choice, in milliseconds. */
export const LEAST_GAP_MS = 60_000;

/** The stretches between the first clip and the last in which none ran. */
export function findGaps(clips: readonly ShopStretch[], least = LEAST_GAP_MS): ShopStretch[] {
  const gaps: ShopStretch[] = [];
  let end: number | null = null;
  for (const { from, until } of clips.toSorted((a, b) => a.from - b.from)) {
    if (end !== null && from - end >= least) gaps.push({ from: end, until: from });
    end = Math.max(end ?? until, until);
  }
  return gaps;
}
