import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { countNew, isPlan } from '../../src/domain/stock/cutting.ts';
import { fillBars, fillLongestFirst } from '../../src/domain/stock/fill-bars.ts';
import { type SolveLinear } from '../../src/domain/stock/linear-model.ts';
import { proveBars } from '../../src/domain/stock/prove-bars.ts';
import { loadSolver } from '../../src/server/solver/load-solver.ts';
import { referenceFolder } from './support/reference-folder.ts';

/** OR-Library, binpack1 (J. E. Beasley; instances of E. Falkenauer): name, capacity, count, best known, sizes. */
const folder = referenceFolder('stock');
const words = folder === null ? [] : readFileSync(join(folder, 'binpack1.txt'), 'utf8').trim().split(/\s+/);

function readInstances() {
  const instances = [];
  for (let at = 1; at < words.length;) {
    const [name = '', capacity, count, best] = [words[at], ...words.slice(at + 1, at + 4).map(Number)];
    const sizes = words.slice(at + 4, at + 4 + (count ?? 0)).map(Number);
    instances.push({ name, capacity: capacity ?? 0, best: best ?? 0, sizes });
    at += 4 + sizes.length;
  }
  return instances;
}

describe.skipIf(folder === null)('Twenty published jobs of 120 pieces', () => {
  let solve: SolveLinear;
  beforeAll(async () => {
    solve = await loadSolver();
  });
  const problems = readInstances().map(({ name, capacity, best, sizes }) => ({
    name,
    best,
    problem: {
      pieces: [...new Set(sizes)]
        .sort((a, b) => b - a)
        .map((size) => ({ size, quantity: sizes.filter((other) => other === size).length })),
      bars: [{ capacity, quantity: Number.POSITIVE_INFINITY, offcut: false }],
    },
  }));

  it.each(problems)(
    '$name is planned at its optimum, and proven',
    { timeout: 60_000 },
    ({ best, problem }) => {
      const { plan, lowerBound } = proveBars(problem, { solve, secondsLeft: () => 30 });
      expect([countNew(problem, plan), lowerBound, isPlan(problem, plan)]).toEqual([best, best, true]);
    },
  );

  it('are missed by first-fit decreasing alone in fourteen', () => {
    const missed = problems.filter(
      ({ best, problem }) => countNew(problem, fillBars(problem, fillLongestFirst) ?? []) > best,
    );
    expect(missed).toHaveLength(14);
  });
});
