/** Cutting in whole units, the form in which plans are made and proven: pieces already carry their kerf. */

/** Pieces of one length. */
export interface UnitPiece {
  readonly size: number;
  readonly quantity: number;
}

/** Bars of one length. An offcut costs nothing and there are only so many; new bars cost one each. */
export interface UnitBar {
  readonly capacity: number;
  readonly quantity: number;
  readonly offcut: boolean;
}

export interface UnitProblem {
  /** In falling size, each size once. */
  readonly pieces: readonly UnitPiece[];
  /** Offcuts first, from the shortest; then the new bar. */
  readonly bars: readonly UnitBar[];
}

/** How often each piece is cut from one bar of a kind. */
export interface Pattern {
  readonly bar: number;
  readonly counts: readonly number[];
}

/** The bar that is bought. @throws RangeError where there is none */
export function newBar({ bars }: UnitProblem): number {
  const at = bars.findIndex(({ offcut }) => !offcut);
  if (at === -1) throw new RangeError('There has to be a bar that can be bought.');
  return at;
}

/** How many new bars a plan takes. */
export function countNew(problem: UnitProblem, plan: readonly Pattern[]): number {
  return plan.filter(({ bar }) => problem.bars[bar]?.offcut === false).length;
}

/** What a pattern takes of its bar. */
export function lengthOf({ pieces }: UnitProblem, counts: readonly number[]): number {
  return counts.reduce((sum, count, at) => sum + count * (pieces[at]?.size ?? 0), 0);
}

/** Whether a plan cuts every piece, from bars that are there, with nothing cut past an end. */
export function isPlan(problem: UnitProblem, plan: readonly Pattern[]): boolean {
  const { pieces, bars } = problem;
  const fits = plan.every(({ bar, counts }) => lengthOf(problem, counts) <= (bars[bar]?.capacity ?? -1));
  const there = bars.every(({ quantity }, at) => plan.filter(({ bar }) => bar === at).length <= quantity);
  const cut = pieces.every(
    ({ quantity }, at) => plan.reduce((sum, { counts }) => sum + (counts[at] ?? 0), 0) === quantity,
  );
  return fits && there && cut;
}
