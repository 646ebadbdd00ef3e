/** The worth of pieces in one bar, found exactly: a bounded knapsack in whole numbers. */
export interface Knapsack {
  readonly sizes: readonly number[];
  /** Whole numbers, at least zero. */
  readonly worths: readonly number[];
  readonly most: readonly number[];
}

/** The best filling of each capacity asked for. */
export interface BestPattern {
  readonly worth: number;
  readonly counts: readonly number[];
}

/** How many cells, of two bytes, a table may have; beyond it the search goes piece by piece. */
const CELLS_AT_MOST = 40_000_000;
/** How many steps that search may take. */
const STEPS_AT_MOST = 3_000_000;

/** Whether one table answers for every capacity at once, so that asking for many costs no more. */
export function isTabled({ sizes }: Pick<Knapsack, 'sizes'>, largest: number): boolean {
  return (largest + 1) * sizes.length <= CELLS_AT_MOST;
}

/**
 * The fillings of greatest worth for several capacities.
 * @returns null where it cannot be found in a bounded number of steps
 */
export function bestPatterns(
  knapsack: Knapsack,
  capacities: readonly number[],
): readonly BestPattern[] | null {
  const largest = Math.max(...capacities);
  if (isTabled(knapsack, largest)) return byTable(knapsack, capacities, largest);
  const found: BestPattern[] = [];
  for (const capacity of capacities) {
    const best = bySearch(knapsack, capacity);
    if (best === null) return null;
    found.push(best);
  }
  return found;
}

function byTable(
  { sizes, worths, most }: Knapsack,
  capacities: readonly number[],
  largest: number,
): BestPattern[] {
  const best = new Float64Array(largest + 1);
  // taken[piece][capacity]: how many of the piece stand in the best filling with the pieces up to it.
  const taken = sizes.map(() => new Uint16Array(largest + 1));
  for (const [piece, size] of sizes.entries()) {
    const worth = worths[piece] ?? 0;
    const counts = taken[piece];
    const bound = Math.min(most[piece] ?? 0, Math.floor(largest / size));
    if (worth <= 0 || counts === undefined || bound === 0) continue;
    const before = best.slice();
    for (let capacity = size; capacity <= largest; capacity += 1) {
      let top = before[capacity] ?? 0;
      for (let count = 1; count <= bound && count * size <= capacity; count += 1) {
        const value = (before[capacity - count * size] ?? 0) + count * worth;
        if (value <= top) continue;
        top = value;
        counts[capacity] = count;
      }
      best[capacity] = top;
    }
  }
  return capacities.map((capacity) => {
    const counts = sizes.map(() => 0);
    let room = capacity;
    for (let piece = sizes.length - 1; piece >= 0; piece -= 1) {
      const count = taken[piece]?.[room] ?? 0;
      counts[piece] = count;
      room -= count * (sizes[piece] ?? 0);
    }
    return { worth: best[capacity] ?? 0, counts };
  });
}

function bySearch({ sizes, worths, most }: Knapsack, capacity: number): BestPattern | null {
  const order = sizes
    .map((size, piece) => ({ piece, size, worth: worths[piece] ?? 0, most: most[piece] ?? 0 }))
    .filter(({ worth }) => worth > 0)
    .sort((a, b) => b.worth * a.size - a.worth * b.size);
  const counts = sizes.map(() => 0);
  let best: BestPattern = { worth: 0, counts: [...counts] };
  let steps = 0;
  const search = (at: number, room: number, worth: number): void => {
    if (worth > best.worth) best = { worth, counts: [...counts] };
    const next = order[at];
    steps += 1;
    if (next === undefined || steps > STEPS_AT_MOST) return;
    // Nothing that follows is worth more for its length, so this is a bound on all of it.
    if (worth + Math.floor((room * next.worth) / next.size + 1e-9) <= best.worth) return;
    for (let count = Math.min(next.most, Math.floor(room / next.size)); count >= 0; count -= 1) {
      counts[next.piece] = count;
      search(at + 1, room - count * next.size, worth + count * next.worth);
    }
    counts[next.piece] = 0;
  };
  search(0, capacity, 0);
  return steps > STEPS_AT_MOST ? null : best;
}
