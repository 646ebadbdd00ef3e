import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { inMillimetres } from '../../domain/lengths/length.ts';
import { parseLength } from '../../domain/lengths/parse-length.ts';
import { type CuttingPlan, planCuts } from '../../domain/stock/cutting-plan.ts';
import { type SolveLinear } from '../../domain/stock/linear-model.ts';
import { readPieceRows, readPiecesCsv } from '../../domain/stock/read-pieces.ts';
import { loadSolver } from '../../server/solver/load-solver.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE =
  'stock --length 6000 [--length 3000] --kerf 2.5 [--trim 5] [--offcut 2400] [--lastcut] [--seconds 20] pieces.csv';

const size = z
  .union([z.number(), z.string()], 'A length is a number of millimetres, or text.')
  .transform(String);
const sizes = z.union([size.transform((one) => [one]), z.array(size)], 'Give lengths as a number or a list.');
const StockRequest = z.object({
  length: sizes,
  kerf: size.default('0'),
  trim: size.default('0'),
  offcuts: sizes.default([]),
  lastcut: z.boolean('lastcut is true or false.').default(false),
  seconds: z.coerce
    .number()
    .min(0, 'Seconds are from 0 to 600.')
    .max(600, 'Seconds are from 0 to 600.')
    .default(20),
  pieces: z.union(
    [
      z.string(),
      z.array(
        z.union([
          z.tuple([size, size]),
          z.tuple([size, size, z.string()]),
          z.object({ length: size, quantity: size.default('1'), name: z.string().optional() }),
        ]),
      ),
    ],
    'Give the pieces as a list of length and quantity.',
  ),
});
type Asked = z.output<typeof StockRequest>;

function readLengths(texts: readonly string[], what: string) {
  const lengths = [];
  for (const text of texts) {
    const read = parseLength(text, 'mm');
    if (!read.ok) return wrong(`${what}: ${read.error}`);
    lengths.push(inMillimetres(read.value));
  }
  return right(lengths);
}

function readPieces(pieces: Asked['pieces']) {
  if (typeof pieces === 'string') return readPiecesCsv(pieces);
  return readPieceRows(
    pieces.map((row) =>
      Array.isArray(row) ? [row[0], row[1], row[2]] : [row.length, row.quantity, row.name],
    ),
  );
}

function present({ bars, bought, lowerBound }: CuttingPlan) {
  const named = bars.some(({ pieces }) => pieces.some(({ name }) => name !== null));
  return {
    bars: bought,
    lowerBound,
    optimal: bought === lowerBound,
    plan: bars.map(({ stock, offcut, pieces, left }) => ({
      stock: stock.valueOf(),
      ...(offcut ? { offcut } : {}),
      pieces: pieces.map(({ length }) => length.valueOf()),
      ...(named ? { names: pieces.map(({ name }) => name) } : {}),
      marks: pieces.map(({ mark }) => mark.valueOf()),
      left: left.valueOf(),
    })),
  };
}

let solver: SolveLinear | null = null;

function run(asked: Asked, solve: SolveLinear): Answer<unknown> {
  const stock = readLengths(asked.length, 'Bar');
  if (!stock.ok) return stock;
  if (stock.value.some((length) => length.lte(0))) return wrong('Bar: a length is above zero.');
  const offcuts = readLengths(asked.offcuts, 'Offcut');
  if (!offcuts.ok) return offcuts;
  const saw = readLengths([asked.kerf, asked.trim], 'Kerf and trim');
  if (!saw.ok) return saw;
  const [kerf, trim] = saw.value;
  if (kerf === undefined || trim === undefined) throw new RangeError('Two lengths give two lengths.');
  const pieces = readPieces(asked.pieces);
  if (!pieces.ok) return pieces;
  const end = performance.now() + asked.seconds * 1000;
  const job = {
    pieces: pieces.value,
    stock: stock.value,
    offcuts: offcuts.value,
    kerf,
    trim,
    lastCut: asked.lastcut,
  };
  const plan = planCuts(job, { solve, secondsLeft: () => (end - performance.now()) / 1000 });
  return plan.ok ? right(present(plan.value)) : plan;
}

/** A cutting plan; bars counts those that have to be bought, marks run from the end that the tape hooks on. */
export const stockTool: Tool = {
  usage: USAGE,
  prepare: async () => {
    solver ??= await loadSolver();
  },
  fromArguments: (args, read) => {
    const found = readArguments(
      args,
      {
        length: { type: 'string', multiple: true },
        offcut: { type: 'string', multiple: true },
        kerf: { type: 'string' },
        trim: { type: 'string' },
        seconds: { type: 'string' },
        lastcut: { type: 'boolean' },
      },
      USAGE,
    );
    if (!found.ok) return found;
    const { options, bare } = found.value;
    const [path, ...more] = bare;
    if (path === undefined || more.length > 0) return wrong(`Give one list of pieces. Usage: ${USAGE}`);
    if (options['length'] === undefined) return wrong(`Give the length of the bars. Usage: ${USAGE}`);
    const { offcut = [], ...others } = options;
    const pieces = read(path);
    return pieces.ok ? right({ ...others, offcuts: offcut, pieces: pieces.value }) : pieces;
  },
  run: (request) => {
    const asked = readRequest(StockRequest, request);
    if (!asked.ok) return asked;
    if (solver === null) throw new Error('The solver has to be loaded before it is used.');
    return run(asked.value, solver);
  },
};
