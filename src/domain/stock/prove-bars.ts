import { type BestPattern, bestPatterns, isTabled } from './best-pattern.ts';
import { countNew, isPlan, newBar, type Pattern, type UnitProblem } from './cutting.ts';
import { fillBars, fillFullest, fillLongestFirst } from './fill-bars.ts';
import { type LinearColumn, type SolveLinear } from './linear-model.ts';

/**
 * Fewest new bars, after P. C. Gilmore and R. E. Gomory, A Linear Programming Approach to the Cutting-Stock Problem,
 * Operations Research 9 (1961): patterns are added as long as they lower the linear programme; its value, rounded up,
 * is a bound, and whole numbers of the patterns are a plan. The bound is taken in whole numbers from any prices, after
 * A. A. Farley (1990), so that no rounding of the solver can make it too high.
 */
export interface Proven {
  readonly plan: readonly Pattern[];
  /** No plan takes fewer new bars. */
  readonly lowerBound: number;
}

interface Tools {
  readonly solve: SolveLinear;
  /** Seconds left. */
  readonly secondsLeft: () => number;
}

/** Prices are taken to a millionth of a bar. */
const PRICE_SCALE = 1_000_000;
const ROUNDS_AT_MOST = 2000;

function columnOf(problem: UnitProblem, { bar, counts }: Pattern): LinearColumn {
  const { pieces, bars } = problem;
  const offcuts = bars.filter(({ offcut }) => offcut).length;
  return {
    cost: bars[bar]?.offcut === true ? 0 : 1,
    most: Number.POSITIVE_INFINITY,
    entries: [
      ...counts.flatMap((count, at) => (count > 0 ? [[at, count] as const] : [])),
      // Offcuts stand first among the bars; each has a row that says how many there are.
      ...(bar < offcuts ? [[pieces.length + bar, 1] as const] : []),
    ],
  };
}

function rowsOf(problem: UnitProblem, demand: readonly number[], used: readonly number[]) {
  return [
    ...demand.map((least) => ({ least, most: Number.POSITIVE_INFINITY })),
    ...problem.bars.flatMap(({ offcut, quantity }, bar) =>
      offcut ? [{ least: 0, most: quantity - (used[bar] ?? 0) }] : [],
    ),
  ];
}

/** A bound from prices of the pieces, in whole numbers throughout. */
function boundFrom(
  problem: UnitProblem,
  demand: readonly number[],
  prices: readonly number[],
  best: readonly BestPattern[],
): number {
  const top = best[newBar(problem)]?.worth ?? 0;
  if (top <= 0) return 0;
  let worth = 0;
  demand.forEach((count, at) => (worth += count * (prices[at] ?? 0)));
  problem.bars.forEach(({ offcut, quantity }, bar) => {
    if (offcut) worth -= quantity * (best[bar]?.worth ?? 0);
  });
  return Math.max(0, Math.ceil(worth / top - 1e-12));
}

/** Volume alone: what offcuts cannot hold, in new bars. */
function volumeBound(problem: UnitProblem): number {
  const sum = problem.pieces.reduce((all, { size, quantity }) => all + size * quantity, 0);
  const free = problem.bars.reduce(
    (all, { offcut, quantity, capacity }) => all + (offcut ? quantity * capacity : 0),
    0,
  );
  return Math.max(0, Math.ceil((sum - free) / (problem.bars[newBar(problem)]?.capacity ?? 1) - 1e-12));
}

interface Relaxed {
  readonly patterns: readonly Pattern[];
  readonly values: readonly number[];
  readonly bound: number;
}

/** Adds patterns until none lowers the linear programme, or the time is over. */
function relax(
  problem: UnitProblem,
  start: readonly Pattern[],
  tools: Tools,
  demand: readonly number[],
  used: readonly number[],
): Relaxed | null {
  const patterns = [...start];
  const seen = new Set(patterns.map(({ bar, counts }) => `${String(bar)}:${counts.join()}`));
  const sizes = problem.pieces.map(({ size }) => size);
  const capacities = problem.bars.map(({ capacity }) => capacity);
  // Beside the best filling the best around each piece: many patterns a round, so fewer rounds.
  const room = capacities[newBar(problem)] ?? 0;
  const rooms = isTabled({ sizes }, room) ? sizes.map((size) => Math.max(0, room - size)) : [];
  let [values, bound]: [readonly number[], number] = [[], 0];
  for (let round = 0; round < ROUNDS_AT_MOST && tools.secondsLeft() > 0; round += 1) {
    const solved = tools.solve({
      columns: patterns.map((pattern) => columnOf(problem, pattern)),
      rows: rowsOf(problem, demand, used),
      whole: false,
      secondsAtMost: tools.secondsLeft(),
    });
    if (solved?.best !== true) break;
    values = solved.values;
    const prices = sizes.map((_, at) => Math.max(0, Math.floor((solved.duals[at] ?? 0) * PRICE_SCALE)));
    const found = bestPatterns({ sizes, worths: prices, most: demand }, [...capacities, ...rooms]);
    if (found === null) break;
    const best = found.slice(0, capacities.length);
    bound = Math.max(bound, boundFrom(problem, demand, prices, best));
    const around = found.slice(capacities.length).flatMap(({ worth, counts }, piece) =>
      (counts[piece] ?? 0) < (demand[piece] ?? 0)
        ? [
            {
              bar: newBar(problem),
              worth: worth + (prices[piece] ?? 0),
              counts: counts.map((count, at) => (at === piece ? count + 1 : count)),
            },
          ]
        : [],
    );
    const offered = [...best.map((pattern, bar) => ({ ...pattern, bar })), ...around];
    const added = offered.flatMap(({ worth, counts, bar }) => {
      const { offcut = false } = problem.bars[bar] ?? {};
      // An offcut's own price stands in its row; a new bar costs one.
      const cost = offcut ? -(solved.duals[problem.pieces.length + bar] ?? 0) : 1;
      const key = `${String(bar)}:${counts.join()}`;
      if (worth <= cost * PRICE_SCALE + 2 || seen.has(key)) return [];
      seen.add(key);
      return [{ bar, counts }];
    });
    if (added.length === 0 || Math.ceil(solved.cost - 1e-6) <= bound) break;
    patterns.push(...added);
  }
  return values.length === 0 ? null : { patterns: patterns.slice(0, values.length), values, bound };
}

/** A plan without the pieces that it has too many of. */
function trim(problem: UnitProblem, plan: readonly Pattern[]): readonly Pattern[] {
  const left = problem.pieces.map(({ quantity }) => quantity);
  const cut = plan.map(({ bar, counts }) => ({
    bar,
    counts: counts.map((count, at) => {
      const kept = Math.min(count, left[at] ?? 0);
      left[at] = (left[at] ?? 0) - kept;
      return kept;
    }),
  }));
  return cut.filter(({ counts }) => counts.some((count) => count > 0));
}

/** Whole numbers of the patterns, the fewest new bars that they allow. */
function choose(problem: UnitProblem, patterns: readonly Pattern[], tools: Tools, seconds: number) {
  const demand = problem.pieces.map(({ quantity }) => quantity);
  const solved = tools.solve({
    columns: patterns.map((pattern) => columnOf(problem, pattern)),
    rows: rowsOf(problem, demand, []),
    whole: true,
    secondsAtMost: Math.min(seconds, Math.max(0.1, tools.secondsLeft())),
  });
  if (solved === null) return null;
  const plan = patterns.flatMap((pattern, at) =>
    Array.from({ length: Math.round(solved.values[at] ?? 0) }, () => pattern),
  );
  return { plan: trim(problem, plan), best: solved.best, cost: solved.cost };
}

/** Takes the sure part of the linear programme, then solves what is left, again and again. */
function dive(problem: UnitProblem, start: Relaxed, tools: Tools): readonly Pattern[] | null {
  const demand = problem.pieces.map(({ quantity }) => quantity);
  const used = problem.bars.map(() => 0);
  const plan: Pattern[] = [];
  let relaxed: Relaxed | null = start;
  const take = (pattern: Pattern): boolean => {
    const counts = pattern.counts.map((count, at) => Math.min(count, demand[at] ?? 0));
    if (counts.every((count) => count === 0)) return false;
    if ((used[pattern.bar] ?? 0) >= (problem.bars[pattern.bar]?.quantity ?? 0)) return false;
    counts.forEach((count, at) => (demand[at] = (demand[at] ?? 0) - count));
    used[pattern.bar] = (used[pattern.bar] ?? 0) + 1;
    plan.push({ bar: pattern.bar, counts });
    return true;
  };
  while (relaxed !== null && demand.some((count) => count > 0) && tools.secondsLeft() > 0) {
    const ranked = relaxed.patterns
      .map((pattern, at) => ({ pattern, value: relaxed?.values[at] ?? 0 }))
      .filter(({ value }) => value > 1e-6)
      .sort((a, b) => b.value - Math.floor(b.value) - (a.value - Math.floor(a.value)));
    let taken = 0;
    for (const { pattern, value } of ranked)
      for (let copy = 1; copy <= Math.floor(value + 1e-6); copy += 1) taken += take(pattern) ? 1 : 0;
    const [next] = ranked;
    if (taken === 0 && (next === undefined || !take(next.pattern))) break;
    if (demand.every((count) => count === 0)) break;
    const fitting = relaxed.patterns.filter(({ counts }) =>
      counts.every((count, at) => count <= (demand[at] ?? 0)),
    );
    relaxed = relax(problem, [...fitting, ...single(problem, demand)], tools, demand, used);
  }
  const rest = fillBars(problem, fillFullest, demand, used);
  return rest === null ? null : [...plan, ...rest];
}

/** A new bar for each piece, filled with as many of it as go: together they can always cut everything. */
function single(problem: UnitProblem, demand: readonly number[]): readonly Pattern[] {
  const bar = newBar(problem);
  const capacity = problem.bars[bar]?.capacity ?? 0;
  return problem.pieces.flatMap(({ size }, at) => {
    const count = Math.min(demand[at] ?? 0, Math.floor(capacity / size));
    return count === 0 ? [] : [{ bar, counts: problem.pieces.map((_, other) => (other === at ? count : 0)) }];
  });
}

/** How many fillings are still listed one by one. */
const PATTERNS_AT_MOST = 6000;

/** Every filling to which no piece can be added, of every bar; null where they are too many. */
function allPatterns(problem: UnitProblem): readonly Pattern[] | null {
  const { pieces, bars } = problem;
  const smallest = pieces.at(-1)?.size ?? 1;
  const found: Pattern[] = [];
  const counts = pieces.map(() => 0);
  let steps = 0;
  const list = (bar: number, at: number, room: number): boolean => {
    steps += 1;
    if (steps > 50 * PATTERNS_AT_MOST || found.length > PATTERNS_AT_MOST) return false;
    const piece = pieces[at];
    if (piece === undefined || room < smallest) {
      found.push({ bar, counts: [...counts] });
      return true;
    }
    for (let count = Math.min(piece.quantity, Math.floor(room / piece.size)); count >= 0; count -= 1) {
      counts[at] = count;
      if (!list(bar, at + 1, room - count * piece.size)) return false;
    }
    counts[at] = 0;
    return true;
  };
  const whole = bars.every(({ capacity }, bar) => list(bar, 0, capacity));
  return whole ? found.filter(({ counts: some }) => some.some((count) => count > 0)) : null;
}

/**
 * The fewest new bars, with proof where the time allows.
 * @throws RangeError where a piece is longer than the new bar
 */
export function proveBars(problem: UnitProblem, tools: Tools): Proven {
  const quick = [fillFullest, fillLongestFirst].flatMap((fill) => fillBars(problem, fill) ?? []);
  const plans = [fillBars(problem, fillFullest), fillBars(problem, fillLongestFirst)];
  let best = plans
    .filter((plan) => plan !== null)
    .reduce<readonly Pattern[] | null>(
      (least, plan) => (least === null || countNew(problem, plan) < countNew(problem, least) ? plan : least),
      null,
    );
  if (best === null) throw new RangeError('A piece is longer than the bar.');
  let lowerBound = volumeBound(problem);
  const offer = (plan: readonly Pattern[] | null): void => {
    if (
      plan !== null &&
      best !== null &&
      isPlan(problem, plan) &&
      countNew(problem, plan) < countNew(problem, best)
    )
      best = plan;
  };
  const open = () => best !== null && countNew(problem, best) > lowerBound && tools.secondsLeft() > 0;
  const demand = problem.pieces.map(({ quantity }) => quantity);
  if (open()) {
    const relaxed = relax(problem, [...quick, ...single(problem, demand)], tools, demand, []);
    if (relaxed !== null) {
      lowerBound = Math.max(lowerBound, relaxed.bound);
      if (open()) offer(dive(problem, relaxed, tools));
      if (open()) offer(choose(problem, relaxed.patterns, tools, 10)?.plan ?? null);
    }
  }
  const all = open() ? allPatterns(problem) : null;
  if (all !== null) {
    const chosen = choose(problem, all, tools, tools.secondsLeft());
    offer(chosen?.plan ?? null);
    if (chosen?.best === true) lowerBound = Math.max(lowerBound, Math.ceil(chosen.cost - 1e-6));
  }
  return { plan: best, lowerBound };
}
