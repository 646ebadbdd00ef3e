import fc from 'fast-check';
import Fraction from 'fraction.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { type CuttingJob, type CuttingPlan, planCuts } from '../../../../src/domain/stock/cutting-plan.ts';
import { countNew } from '../../../../src/domain/stock/cutting.ts';
import { fillBars, fillLongestFirst } from '../../../../src/domain/stock/fill-bars.ts';
import { type SolveLinear } from '../../../../src/domain/stock/linear-model.ts';
import { proveBars } from '../../../../src/domain/stock/prove-bars.ts';
import { readPiecesCsv } from '../../../../src/domain/stock/read-pieces.ts';
import { loadSolver } from '../../../../src/server/solver/load-solver.ts';

let solve: SolveLinear;
beforeAll(async () => {
  solve = await loadSolver();
});

type Sizes = readonly (number | string)[];
const job = (pieces: Sizes, stock: Sizes, rest: Partial<CuttingJob> = {}): CuttingJob => ({
  pieces: pieces.map((length) => ({ length: new Fraction(length), quantity: 1, name: null })),
  stock: stock.map((length) => new Fraction(length)),
  offcuts: [],
  kerf: new Fraction(0),
  trim: new Fraction(0),
  lastCut: false,
  ...rest,
});
function plan(wanted: CuttingJob, secondsLeft = () => 60): CuttingPlan {
  const made = planCuts(wanted, { solve, secondsLeft });
  if (!made.ok) throw new Error(made.error);
  return made.value;
}
const count = ({ bought, lowerBound }: CuttingPlan) => [bought, lowerBound];
const refusal = (wanted: CuttingJob) => {
  const made = planCuts(wanted, { solve, secondsLeft: () => 60 });
  return made.ok ? '' : made.error;
};

/** The length that a bar's pieces and cuts take, from the end that is squared to the last mark. */
const taken = ({ pieces }: CuttingPlan['bars'][number], { kerf, trim }: CuttingJob) =>
  pieces
    .reduce((sum, { length }) => sum.add(length), new Fraction(0))
    .add(kerf.mul(pieces.length - 1))
    .add(trim.gt(0) ? trim.add(kerf) : 0);

describe('A cutting plan', () => {
  it('beats first-fit decreasing where that is not the best', () => {
    // BPPLib PM_u010_05, capacity 150: 4 by an exact search of its own; first-fit decreasing takes 5.
    const pieces = [97, 42, 100, 77, 28, 80, 23, 40, 58, 25];
    expect(count(plan(job(pieces, [150])))).toEqual([4, 4]);
    const sizes = [...pieces].sort((a, b) => b - a).map((size) => ({ size, quantity: 1 }));
    const problem = {
      pieces: sizes,
      bars: [{ capacity: 150, quantity: Number.POSITIVE_INFINITY, offcut: false }],
    };
    expect(countNew(problem, fillBars(problem, fillLongestFirst)!)).toBe(5);
  });

  it('proves 120 pieces in triplets that fill their bars', () => {
    // Forty triplets that each add up to the bar: 40 bars by construction, none with anything left.
    const triplets = Array.from({ length: 40 }, (_, at) => {
      const [first, second] = [200 + ((at * 37) % 160), 250 + ((at * 53) % 90)];
      return [first, second, 1000 - first - second];
    });
    expect(count(plan(job(triplets.flat(), [1000])))).toEqual([40, 40]);
  }, 60_000);

  it('needs no cut after a piece that ends with the bar', () => {
    // Two pieces and one kerf: 2 × 998.75 + 2.5 = 2000.
    const kerf = new Fraction('2.5');
    expect(count(plan(job(['998.75', '998.75'], [2000], { kerf })))).toEqual([1, 1]);
    expect(count(plan(job(['998.75', '998.75'], [2000], { kerf, lastCut: true })))).toEqual([2, 2]);
    expect(count(plan(job(['998.76', '998.75'], [2000], { kerf })))).toEqual([2, 2]);
  });

  it('takes a bar that is just as long as the piece, and squares its end where that is asked for', () => {
    expect(count(plan(job([2000], [2000], { kerf: new Fraction(3) })))).toEqual([1, 1]);
    const squared = job([1900], [2000], { kerf: new Fraction(3), trim: new Fraction(5) });
    const [bar] = plan(squared).bars;
    // 5 trim + 3 cut + 1900, then 3 for the last cut: 89 is left.
    expect([bar?.pieces[0]?.mark.valueOf(), bar?.left.valueOf()]).toEqual([1908, 89]);
    expect(refusal(job([1995], [2000], { kerf: new Fraction(3), trim: new Fraction(5) }))).toContain(
      'longer',
    );
  });

  it('uses offcuts first', () => {
    const made = plan(job([1200, 1200, 1200, 1200], [6000], { offcuts: [new Fraction(5000)] }));
    expect([count(made), made.bars.map(({ offcut }) => offcut)]).toEqual([[0, 0], [true]]);
  });

  it('takes the shortest bar that holds the pieces', () => {
    const made = plan(job([2900, 2900, 2900], [6000, 3000]));
    expect(made.bars.map(({ stock }) => stock.valueOf()).sort()).toEqual([3000, 6000]);
  });

  it('keeps what is left in one length', () => {
    const made = plan(job([500, 500, 500, 500, 500], [1200]));
    expect(made.bars.map(({ left }) => left.valueOf()).sort((a, b) => b - a)).toEqual([700, 200, 200]);
  });

  it('reckons inches and millimetres together, exactly', () => {
    // 240 in = 6096 mm exactly, twenty pieces of a foot.
    expect(
      count(
        plan(
          job(
            Array.from({ length: 20 }, () => '304.8'),
            [6096],
          ),
        ),
      ),
    ).toEqual([1, 1]);
  });

  it('says that it has not proven when there is no time, and plans all the same', () => {
    const made = plan(job([97, 42, 100, 77, 28, 80, 23, 40, 58, 25], [150]), () => 0);
    expect(made.bought).toBeGreaterThanOrEqual(made.lowerBound);
    expect(made.bars.flatMap(({ pieces }) => pieces)).toHaveLength(10);
  });

  it('plans a thousand different pieces', () => {
    const pieces = Array.from({ length: 1000 }, (_, at) => 200 + ((at * 7919) % 2700) + at / 1000);
    const made = plan(job(pieces, [6000], { kerf: new Fraction('2.5') }), () => 0);
    expect(made.bars.flatMap(({ pieces: cut }) => cut)).toHaveLength(1000);
    expect(made.lowerBound).toBeLessThanOrEqual(made.bought);
  }, 60_000);

  const lengths = fc.array(fc.integer({ min: 1, max: 995 }), { minLength: 1, maxLength: 14 });

  it('is never longer than the stock, and cuts every piece once', () => {
    fc.assert(
      fc.property(
        lengths,
        fc.array(fc.integer({ min: 1, max: 1500 }), { maxLength: 3 }),
        fc.integer({ min: 0, max: 5 }),
        (pieces, offcuts, kerf) => {
          const wanted = job(pieces, [1000], {
            kerf: new Fraction(kerf),
            offcuts: offcuts.map((length) => new Fraction(length)),
          });
          const made = plan(wanted);
          for (const bar of made.bars) {
            expect(taken(bar, wanted).lte(bar.stock)).toBe(true);
            expect(bar.pieces.at(-1)?.mark.equals(taken(bar, wanted))).toBe(true);
            expect(bar.left.gte(0)).toBe(true);
          }
          const cut = made.bars.flatMap((bar) => bar.pieces.map(({ length }) => length.valueOf()));
          expect(cut.sort((a, b) => a - b)).toEqual([...pieces].sort((a, b) => a - b));
          expect(made.lowerBound).toBeLessThanOrEqual(made.bought);
        },
      ),
      { numRuns: 60 },
    );
  }, 60_000);

  it('proves as many bars as a search of all placings finds', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 15, max: 70 }), { minLength: 1, maxLength: 8 }), (pieces) => {
        const sizes = [...new Set(pieces)].sort((a, b) => b - a);
        const problem = {
          pieces: sizes.map((size) => ({ size, quantity: pieces.filter((piece) => piece === size).length })),
          bars: [{ capacity: 100, quantity: Number.POSITIVE_INFINITY, offcut: false }],
        };
        const proven = proveBars(problem, { solve, secondsLeft: () => 60 });
        expect([countNew(problem, proven.plan), proven.lowerBound]).toEqual([search(pieces), search(pieces)]);
      }),
      { numRuns: 60 },
    );
  }, 60_000);
});

describe('A cutting plan with offcuts', () => {
  it('buys as few bars as a search of all placings', () => {
    const drawn = fc.array(fc.integer({ min: 15, max: 70 }), { minLength: 1, maxLength: 7 });
    fc.assert(
      fc.property(drawn, fc.array(fc.integer({ min: 10, max: 120 }), { maxLength: 2 }), (pieces, offcuts) => {
        const wanted = job(pieces, [100], { offcuts: offcuts.map((length) => new Fraction(length)) });
        const least = search(pieces, offcuts);
        expect(count(plan(wanted))).toEqual([least, least]);
      }),
      { numRuns: 60 },
    );
  }, 60_000);
});

/** The fewest new bars of 100 by trying every placing, after what offcuts hold. */
function search(pieces: readonly number[], offcuts: readonly number[] = []): number {
  let best = pieces.length;
  const rooms: number[] = [...offcuts];
  const place = (at: number): void => {
    if (rooms.length - offcuts.length >= best) return;
    const piece = pieces[at];
    if (piece === undefined) {
      best = rooms.length - offcuts.length;
      return;
    }
    for (let bar = 0; bar < rooms.length; bar += 1) {
      if (rooms[bar]! < piece) continue;
      rooms[bar]! -= piece;
      place(at + 1);
      rooms[bar]! += piece;
    }
    rooms.push(100 - piece);
    place(at + 1);
    rooms.pop();
  };
  place(0);
  return best;
}

describe('A job that cannot be planned', () => {
  it.each<[string, CuttingJob, string]>([
    ['a piece longer than any bar', job([6001], [6000]), 'longer than any bar'],
    [
      'a piece that only an offcut holds',
      job([700], [600], { offcuts: [new Fraction(900)] }),
      'only an offcut',
    ],
    ['no pieces', job([], [6000]), 'no pieces'],
    ['no bars', job([100], []), 'length of the bars'],
    ['a kerf below zero', job([100], [6000], { kerf: new Fraction(-1) }), 'not below zero'],
    ['sizes finer than anything', job([new Fraction(1, 99_999_989).toFraction()], [6000]), 'too fine'],
  ])('with %s gets a sentence', (_, wanted, sentence) => {
    expect(refusal(wanted)).toContain(sentence);
  });
});

describe('A list of pieces', () => {
  it('has a heading or none, inches, and names with commas', () => {
    const read = readPiecesCsv('length,quantity,name\n1200,4,leg\n"3\'-4""",2,"rail, long"\n500,1\n');
    expect(read.ok ? read.value.map(({ length, name }) => [length.valueOf(), name]) : read.error).toEqual([
      [1200, 'leg'],
      [1016, 'rail, long'],
      [500, null],
    ]);
    expect(readPiecesCsv('1200,4').ok).toBe(true);
  });

  it.each([
    ['0,4', 'above zero'],
    ['-5,4', 'below zero'],
    ['long,4', 'no size'],
    ['100,0', 'whole number'],
    ['100,1.5', 'whole number'],
    ['100,many', 'whole number'],
    ['100,999999', 'from 1 to'],
  ])('refuses %j', (line, sentence) => {
    const read = readPiecesCsv(line);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });
});
