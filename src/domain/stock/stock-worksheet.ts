import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { inMillimetres } from '../lengths/length.ts';
import { parseLength } from '../lengths/parse-length.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { flagField, lengthField, optional, textField, withDefault } from '../worksheets/fields.ts';
import { type Field, type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { type CuttingPlan, planCuts, type WantedPiece } from './cutting-plan.ts';
import { type SolveLinear } from './linear-model.ts';
import { readPiecesCsv } from './read-pieces.ts';

/** A plan as it is drawn; millimetres. */
export interface StockResult {
  readonly bars: readonly {
    readonly stock: number;
    readonly offcut: boolean;
    readonly pieces: readonly {
      readonly length: number;
      readonly name: string | null;
      readonly mark: number;
    }[];
    readonly left: number;
  }[];
  readonly bought: number;
  readonly lowerBound: number;
}

/** What a plan is made with: a solver, and how long it may take. */
export interface PlanTools {
  readonly solve: SolveLinear;
  readonly secondsLeft: () => number;
}

const MOST_BARS = 20;
/** Some hundred lines; a longer list is planned on the command line. */
const PIECES_TEXT_LENGTH = 4000;

function lengthsField(label: string, example: string): Field<readonly Fraction[]> {
  return {
    ...textField(label, example),
    read: (given) => {
      const text = typeof given === 'string' ? given : '';
      const words = text.split(',').filter((word) => word.trim() !== '');
      if (words.length === 0) return wrong(`Give it, such as ${example}.`);
      if (words.length > MOST_BARS) return wrong(`It takes at most ${String(MOST_BARS)} lengths.`);
      const lengths: Fraction[] = [];
      for (const word of words) {
        const read = parseLength(word.trim(), 'mm');
        if (!read.ok) return read;
        const mm = inMillimetres(read.value);
        if (mm.lte(0)) return wrong('A length is above zero.');
        lengths.push(mm);
      }
      return right(lengths);
    },
  };
}

const piecesField: Field<readonly WantedPiece[]> = {
  label: 'Pieces, a line each: length, how many, name',
  example: '1200, 4, rail',
  lines: true,
  read: (given) => {
    const text = typeof given === 'string' ? given.trim() : '';
    if (text === '') return wrong('Give the pieces, a line each, such as 1200, 4, rail.');
    if (text.length > PIECES_TEXT_LENGTH)
      return wrong(`The list takes at most ${String(PIECES_TEXT_LENGTH)} characters.`);
    return readPiecesCsv(text);
  },
};

export const STOCK_INPUTS = {
  pieces: piecesField,
  length: lengthsField('Bars that can be bought', '6000, 3000'),
  offcuts: optional(lengthsField('Offcuts that lie there', '2400, 800')),
  kerf: withDefault(lengthField('What the saw takes', '2.5', { zero: true }), new Fraction(0), 'nothing'),
  trim: withDefault(
    lengthField('Squared off the first end', '5', { zero: true }),
    new Fraction(0),
    'nothing',
  ),
  lastcut: flagField('Cut the last piece off even where it ends with the bar'),
};

function toResult({ bars, bought, lowerBound }: CuttingPlan): StockResult {
  return {
    bought,
    lowerBound,
    bars: bars.map(({ stock, offcut, pieces, left }) => ({
      stock: stock.valueOf(),
      offcut,
      pieces: pieces.map(({ length, name, mark }) => ({
        length: length.valueOf(),
        name,
        mark: mark.valueOf(),
      })),
      left: left.valueOf(),
    })),
  };
}

function compute(
  { pieces, length, offcuts, kerf, trim, lastcut }: ValuesOf<typeof STOCK_INPUTS>,
  tools: PlanTools,
): Answer<Worked<StockResult>> {
  const job = { pieces, stock: length, offcuts: offcuts ?? [], kerf, trim, lastCut: lastcut };
  const plan = planCuts(job, tools);
  if (!plan.ok) return plan;
  const result = toResult(plan.value);
  const { bought, lowerBound, bars } = result;
  const needed = pieces.reduce((sum, piece) => sum.add(piece.length.mul(piece.quantity)), new Fraction(0));
  const count = pieces.reduce((sum, { quantity }) => sum + quantity, 0);
  return right({
    result,
    working: [
      {
        what: 'Pieces',
        formula: 'their lengths together',
        numbers: `${String(count)} pieces`,
        value: `${formatNumber(needed.valueOf(), 7)} mm`,
      },
      {
        what: 'No plan buys fewer than',
        formula: 'a bound by linear programming, rounded up',
        numbers: `${String(bars.filter(({ offcut }) => offcut).length)} offcuts used`,
        value: `${String(lowerBound)} bars`,
      },
      {
        what: bought === lowerBound ? 'Bars to buy, proven least' : 'Bars to buy, not proven least',
        formula: 'this plan',
        numbers: '',
        value: `${String(bought)} bars`,
      },
    ],
    sources: [
      {
        title: 'P. C. Gilmore and R. E. Gomory, A Linear Programming Approach to the Cutting-Stock Problem',
        clause: 'Operations Research 9 (1961)',
        standing: 'published',
      },
    ],
    limits: [
      'Straight cuts across one length of bar; the saw takes its kerf at each.',
      'The number of bars is proven as far as the time allows; what is left over is gathered, not proven.',
    ],
    notChecked: [
      'Whether the bars are as long as they should be: measure before the first cut.',
      'Bends, ends that are not square, and the direction of the grain.',
    ],
    warnings:
      bought === lowerBound
        ? []
        : [
            `It is not proven that ${String(bought)} is the fewest: ${String(lowerBound)} could not be ruled out in the time.`,
          ],
    cautions: ['rotating', 'eyes'],
  });
}

/** A cutting plan with the fewest bought bars. @param tools see planCuts */
export function stockWorksheet(tools: PlanTools) {
  return worksheet({
    id: 'stock',
    title: 'Cutting plan',
    inputs: STOCK_INPUTS,
    compute: (values) => compute(values, tools),
  });
}
