import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { lengthOf, type Pattern, type UnitProblem } from './cutting.ts';
import { type SolveLinear } from './linear-model.ts';
import { proveBars } from './prove-bars.ts';

/** A piece to be cut, millimetres. */
export interface WantedPiece {
  readonly length: Fraction;
  readonly quantity: number;
  readonly name: string | null;
}

/** What is to be cut, from what, with which saw; millimetres. */
export interface CuttingJob {
  readonly pieces: readonly WantedPiece[];
  /** Lengths that can be bought, any number of each. */
  readonly stock: readonly Fraction[];
  /** What lies there already; used first. */
  readonly offcuts: readonly Fraction[];
  /** What each cut of the saw takes. */
  readonly kerf: Fraction;
  /** What is squared off the first end of each bar, on top of the cut. */
  readonly trim: Fraction;
  /** Whether the last piece is cut off even where it ends with the bar. */
  readonly lastCut: boolean;
}

/** One bar, in cutting order, marked from the end that the tape hooks on. */
export interface PlannedBar {
  readonly stock: Fraction;
  readonly offcut: boolean;
  readonly pieces: readonly {
    readonly length: Fraction;
    readonly name: string | null;
    readonly mark: Fraction;
  }[];
  /** What is left in one length, after the last cut. */
  readonly left: Fraction;
}

export interface CuttingPlan {
  readonly bars: readonly PlannedBar[];
  /** Bars that have to be bought. */
  readonly bought: number;
  /** No plan buys fewer. */
  readonly lowerBound: number;
}

/** The most pieces in one plan, and the most that one line may ask for. */
export const PIECES_AT_MOST = 5000;
/** The most units that a bar is divided into, so that every size is a whole number of them. */
const UNITS_AT_MOST = 50_000_000;

const ZERO = new Fraction(0);

/** What a bar can hold: each piece carries a kerf, and the last needs none where it ends with the bar. */
function capacityOf(bar: Fraction, { kerf, trim, lastCut }: CuttingJob): Fraction {
  const squared = trim.gt(0) ? bar.sub(trim).sub(kerf) : bar;
  return lastCut ? squared : squared.add(kerf);
}

/** The size of a unit in which all sizes are whole numbers. */
function commonUnit(sizes: readonly Fraction[]): Fraction {
  return sizes.filter((size) => size.gt(0)).reduce((unit, size) => unit.gcd(size));
}

interface Kind {
  readonly length: Fraction;
  readonly names: readonly (string | null)[];
}

/** Pieces of one length together, from the longest; each with the names of its pieces in order. */
function kindsOf(pieces: readonly WantedPiece[]): readonly Kind[] {
  const kinds = new Map<string, { length: Fraction; names: (string | null)[] }>();
  for (const { length, quantity, name } of pieces) {
    const kind = kinds.get(length.toFraction()) ?? { length, names: [] };
    for (let copy = 0; copy < quantity; copy += 1) kind.names.push(name);
    kinds.set(length.toFraction(), kind);
  }
  return [...kinds.values()].sort((a, b) => b.length.compare(a.length));
}

function check(job: CuttingJob): string | null {
  const { pieces, stock, offcuts, kerf, trim } = job;
  const [longestPiece] = kindsOf(pieces);
  if (longestPiece === undefined) return 'There are no pieces to cut.';
  if (pieces.reduce((sum, { quantity }) => sum + quantity, 0) > PIECES_AT_MOST)
    return `A plan takes at most ${String(PIECES_AT_MOST)} pieces.`;
  if (stock.length === 0) return 'Give the length of the bars.';
  if (kerf.lt(0) || trim.lt(0)) return 'Kerf and trim are not below zero.';
  const longest = [...stock, ...offcuts].reduce((most, bar) => (bar.gt(most) ? bar : most));
  const bought = stock.reduce((most, bar) => (bar.gt(most) ? bar : most));
  if (longestPiece.length.add(kerf).gt(capacityOf(bought, job)))
    return longestPiece.length.add(kerf).gt(capacityOf(longest, job))
      ? `A piece of ${longestPiece.length.toString()} mm is longer than any bar leaves room for: ${longest.toString()} mm.`
      : `A piece of ${longestPiece.length.toString()} mm fits only an offcut; give a bar to buy that is long enough.`;
  return null;
}

/** Moves pieces out of the bar with most left, so that what is left over is one long length, and offcuts fill first. */
function gatherLeft(problem: UnitProblem, plan: readonly Pattern[]): readonly Pattern[] {
  const spare = problem.bars.flatMap(({ offcut, quantity }, bar) =>
    offcut
      ? Array.from({ length: quantity - plan.filter((pattern) => pattern.bar === bar).length }, () => ({
          bar,
          counts: problem.pieces.map(() => 0),
        }))
      : [],
  );
  const bars = [...plan, ...spare].map(({ bar, counts }) => ({ bar, counts: [...counts] }));
  const room = (at: { bar: number; counts: number[] }) =>
    (problem.bars[at.bar]?.capacity ?? 0) - lengthOf(problem, at.counts);
  const bought = bars.filter(({ bar }) => problem.bars[bar]?.offcut === false);
  const emptiest = [...bought].sort((a, b) => room(b) - room(a))[0];
  if (emptiest === undefined) return plan;
  for (const [piece, { size }] of problem.pieces.entries()) {
    while ((emptiest.counts[piece] ?? 0) > 0) {
      const [tightest] = bars
        .filter((other) => other !== emptiest && room(other) >= size)
        .sort((a, b) => room(a) - room(b));
      if (tightest === undefined) break;
      tightest.counts[piece] = (tightest.counts[piece] ?? 0) + 1;
      emptiest.counts[piece] = (emptiest.counts[piece] ?? 0) - 1;
    }
  }
  return bars.filter(({ counts }) => counts.some((count) => count > 0));
}

function layOut(
  job: CuttingJob,
  stock: Fraction,
  offcut: boolean,
  cut: readonly { length: Fraction; name: string | null }[],
) {
  const { kerf, trim } = job;
  let at = trim.gt(0) ? trim.add(kerf) : ZERO;
  const pieces = cut.map(({ length, name }, index) => {
    const mark = at.add(index === 0 ? 0 : kerf).add(length);
    at = mark;
    return { length, name, mark };
  });
  const rest = stock.sub(at);
  return { stock, offcut, pieces, left: rest.lte(kerf) ? ZERO : rest.sub(kerf) };
}

/**
 * A cutting plan with the fewest bought bars: offcuts first, then bars; each bought bar the shortest that holds its
 * pieces. The number of bars is proven as far as the time allows; the lengths left over are not.
 * @param tools a solver, and the seconds that are left for it
 */
export function planCuts(
  job: CuttingJob,
  tools: { readonly solve: SolveLinear; readonly secondsLeft: () => number },
): Answer<CuttingPlan> {
  const fault = check(job);
  if (fault !== null) return wrong(fault);
  const kinds = kindsOf(job.pieces);
  const stock = [...job.stock].sort((a, b) => a.compare(b));
  const longest = stock.at(-1) ?? ZERO;
  const offcuts = [...new Map(job.offcuts.map((length) => [length.toFraction(), length])).values()].sort(
    (a, b) => a.compare(b),
  );
  const usable = offcuts.filter((length) => capacityOf(length, job).gt(0));
  const capacities = [...usable, longest].map((length) => capacityOf(length, job));
  const sizes = kinds.map(({ length }) => length.add(job.kerf));
  const unit = commonUnit([...sizes, ...capacities]);
  if (longest.div(unit).gt(UNITS_AT_MOST))
    return wrong('These sizes are too fine beside the bar. Round them.');
  const problem: UnitProblem = {
    pieces: sizes.map((size, at) => ({
      size: size.div(unit).valueOf(),
      quantity: kinds[at]?.names.length ?? 0,
    })),
    bars: capacities.map((capacity, at) => ({
      capacity: capacity.div(unit).valueOf(),
      offcut: at < usable.length,
      quantity:
        at < usable.length
          ? job.offcuts.filter((length) => usable[at]?.equals(length) === true).length
          : Number.POSITIVE_INFINITY,
    })),
  };
  const proven = proveBars(problem, tools);
  const names = kinds.map(({ names: all }) => [...all]);
  const bars = gatherLeft(problem, proven.plan).map(({ bar, counts }) => {
    const cut = kinds.flatMap(({ length }, kind) =>
      Array.from({ length: counts[kind] ?? 0 }, () => ({ length, name: names[kind]?.shift() ?? null })),
    );
    const needed = lengthOf(problem, counts);
    const offcut = usable[bar];
    const shortest = stock.find((length) => capacityOf(length, job).div(unit).gte(needed)) ?? longest;
    return layOut(job, offcut ?? shortest, offcut !== undefined, cut);
  });
  const bought = bars.filter(({ offcut }) => !offcut).length;
  return right({ bars, bought, lowerBound: proven.lowerBound });
}
