/** A linear programme to be minimised: columns with costs, rows of least values. */
export interface LinearModel {
  readonly columns: readonly LinearColumn[];
  /** Of each row, the least and the most that its sum may be. */
  readonly rows: readonly { readonly least: number; readonly most: number }[];
  /** Whether the columns have to be whole numbers. */
  readonly whole: boolean;
  readonly secondsAtMost: number;
}

/** One variable, at least zero: its cost, its most, and its coefficient in some rows. */
export interface LinearColumn {
  readonly cost: number;
  readonly most: number;
  readonly entries: readonly (readonly [row: number, coefficient: number])[];
}

export interface LinearSolution {
  /** Whether it is the best there is; else the best that was found in the time. */
  readonly best: boolean;
  readonly values: readonly number[];
  /** What one more of each row would cost; means something only where columns need not be whole. */
  readonly duals: readonly number[];
  readonly cost: number;
}

/** Solves a linear programme; null where nothing was found in the time. Handed in, because it is no pure function. */
export type SolveLinear = (model: LinearModel) => LinearSolution | null;
