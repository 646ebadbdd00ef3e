export type PlacedMark = {
  /** Pixels from its anchor, to one side or the other. */
  readonly shift: number;
  /** 0 is the row next to the rule. */
  readonly row: number;
};

/**
 * Moves marks apart that would lie on each other, each as little as possible, in their order; takes
 * further rows when one row is too short for all.
 *
 * The shifts hold on any rule wider than `width` too: anchors only move further apart there.
 *
 * @param anchors 0 to 1 along the rule, rising
 * @param width of the rule in pixels
 * @param gap least distance between two marks of a row, centre to centre, in pixels
 */
export function placeMarks(anchors: readonly number[], width: number, gap: number): readonly PlacedMark[] {
  const perRow = Math.max(1, Math.floor(width / gap) + 1);
  const rows = Math.max(1, Math.ceil(anchors.length / perRow));
  const placed: PlacedMark[] = anchors.map((_, index) => ({ shift: 0, row: index % rows }));
  for (let row = 0; row < rows; row += 1) {
    const members = anchors.flatMap((anchor, index) => (index % rows === row ? [{ anchor, index }] : []));
    const wanted = members.map(({ anchor }, place) => anchor * width - place * gap);
    const highest = width - (members.length - 1) * gap;
    nearestRising(wanted).forEach((value, place) => {
      const member = members[place];
      if (member === undefined) return;
      const position = Math.min(Math.max(value, 0), Math.max(0, highest)) + place * gap;
      placed[member.index] = { shift: Math.round((position - member.anchor * width) * 10) / 10, row };
    });
  }
  return placed;
}

/** The rising sequence nearest to the given one in least squares (pool adjacent violators). */
function nearestRising(values: readonly number[]): number[] {
  const pools: { sum: number; count: number }[] = [];
  for (const value of values) {
    let pool = { sum: value, count: 1 };
    for (
      let last = pools.at(-1);
      last && last.sum / last.count > pool.sum / pool.count;
      last = pools.at(-1)
    ) {
      pools.pop();
      pool = { sum: last.sum + pool.sum, count: last.count + pool.count };
    }
    pools.push(pool);
  }
  return pools.flatMap(({ sum, count }) => Array.from({ length: count }, () => sum / count));
}
