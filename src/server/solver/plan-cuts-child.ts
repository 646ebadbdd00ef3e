import { text } from 'node:stream/consumers';
import { stockWorksheet } from '../../domain/stock/stock-worksheet.ts';
import { runWorksheet } from '../../domain/worksheets/worksheet.ts';
import { loadSolver } from './load-solver.ts';
import { PLAN_SECONDS } from './plan-cuts.ts';

const given = JSON.parse(await text(process.stdin)) as Record<string, unknown>;
const solve = await loadSolver();
const end = performance.now() + PLAN_SECONDS * 1000;
const sheet = stockWorksheet({ solve, secondsLeft: () => (end - performance.now()) / 1000 });
process.stdout.write(JSON.stringify(runWorksheet(sheet, given)));
