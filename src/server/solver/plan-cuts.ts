import { type Answer } from '../../domain/answer.ts';
import { type StockResult } from '../../domain/stock/stock-worksheet.ts';
import { type Worked } from '../../domain/worksheets/worksheet.ts';
import { runNode } from '../run-node.ts';

/** How long one plan may be looked for. */
export const PLAN_SECONDS = 8;
/** Starting a process and loading the solver takes some of these. */
const SECONDS_AT_MOST = PLAN_SECONDS + 12;

let last: Promise<unknown> = Promise.resolve();

/**
 * Makes a cutting plan from the inputs of its worksheet, in a process of its own and one at a time: a solver that
 * thinks would keep every other request waiting.
 */
export function planCuts(given: Readonly<Record<string, unknown>>): Promise<Answer<Worked<StockResult>>> {
  const plan = last.then(() => planApart(given));
  last = plan.catch(() => undefined);
  return plan;
}

async function planApart(given: Readonly<Record<string, unknown>>): Promise<Answer<Worked<StockResult>>> {
  const { status, stdout, complaints } = await runNode({
    source: new URL('./plan-cuts-child.ts', import.meta.url),
    heapMebibytes: 512,
    seconds: SECONDS_AT_MOST,
    stdin: Buffer.from(JSON.stringify(given)),
  });
  if (status !== 0) throw new Error(`No cutting plan was made: ${complaints}`);
  return JSON.parse(stdout.toString('utf8')) as Answer<Worked<StockResult>>;
}
