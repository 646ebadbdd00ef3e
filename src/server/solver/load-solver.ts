import loadHighs from 'highs';
import { type LinearModel, type LinearSolution, type SolveLinear } from '../../domain/stock/linear-model.ts';

/** HiGHS, model status "optimal". */
const OPTIMAL = 7;
/** HiGHS, primal solution status "feasible". */
const FEASIBLE = 2;
/** HiGHS, variable types. */
const [CONTINUOUS, INTEGER] = [0, 1] as const;

function columnwise({ columns, rows }: LinearModel) {
  const starts = [0];
  const indices: number[] = [];
  const values: number[] = [];
  for (const { entries } of columns) {
    for (const [row, coefficient] of entries) {
      indices.push(row);
      values.push(coefficient);
    }
    starts.push(indices.length);
  }
  return { format: 'csc' as const, numRows: rows.length, numCols: columns.length, starts, indices, values };
}

/** The HiGHS solver, compiled to WebAssembly: takes about half a second to load, then solves on this thread. */
export async function loadSolver(): Promise<SolveLinear> {
  const highs = await loadHighs();
  return (wanted): LinearSolution | null => {
    const { columns, rows, whole, secondsAtMost } = wanted;
    if (columns.length === 0) return null;
    const model = highs.createModel({
      numCols: columns.length,
      numRows: rows.length,
      colCost: columns.map(({ cost }) => cost),
      colLower: columns.map(() => 0),
      colUpper: columns.map(({ most }) => most),
      rowLower: rows.map(({ least }) => least),
      rowUpper: rows.map(({ most }) => most),
      matrix: columnwise(wanted),
      integrality: columns.map(() => (whole ? INTEGER : CONTINUOUS)),
    });
    try {
      model.options.set({ output_flag: false, time_limit: secondsAtMost });
      model.run();
      const best = model.getModelStatus() === OPTIMAL;
      if (!best && model.info.get('primal_solution_status') !== FEASIBLE) return null;
      const { colValue, rowDual } = model.getSolution();
      const values = [...colValue];
      const cost = values.reduce((sum, value, at) => sum + value * (columns[at]?.cost ?? 0), 0);
      const covered = rows.map(() => 0);
      columns.forEach(({ entries }, at) => {
        for (const [row, coefficient] of entries)
          covered[row] = (covered[row] ?? 0) + coefficient * (values[at] ?? 0);
      });
      const feasible = rows.every(
        ({ least, most }, row) => (covered[row] ?? 0) >= least - 1e-6 && (covered[row] ?? 0) <= most + 1e-6,
      );
      return feasible ? { best, values, duals: [...rowDual], cost } : null;
    } finally {
      model.dispose();
    }
  };
}
