import type Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { parseQuantity } from '../quantities/parse-quantity.ts';

/** One stage of a pump: so much oil up to such a pressure. */
export interface PumpStage {
  /** L/min, exactly. */
  readonly flow: Fraction;
  /** Pa, exactly. */
  readonly pressure: Fraction;
}

/** The most stages that are read. */
const STAGES_AT_MOST = 4;

/** Between stages; a comma of thousands is followed by no flow. */
const BETWEEN = /,\s*(?=[\d./\s-]+\p{L}[^@,]*@)/u;

/**
 * A pump as its plate says it: 11 gpm@650 psi, 3 gpm@2500 psi. The first stage has the most oil, the last the most
 * pressure; it changes over by itself.
 */
export function parsePump(text: string): Answer<readonly PumpStage[]> {
  const stages: PumpStage[] = [];
  for (const stage of text.split(BETWEEN)) {
    const [flowText = '', pressureText, ...more] = stage.split('@');
    if (pressureText === undefined || more.length > 0)
      return wrong(`${stage.trim()} is no stage of a pump. Write it as 11 gpm@650 psi.`);
    const flow = parseQuantity(flowText, 'flow');
    if (!flow.ok) return flow;
    const pressure = parseQuantity(pressureText, 'pressure');
    if (!pressure.ok) return pressure;
    stages.push({ flow: flow.value.value, pressure: pressure.value.value });
  }
  if (stages.length > STAGES_AT_MOST)
    return wrong(`A pump has at most ${String(STAGES_AT_MOST)} stages here.`);
  if (stages.some(({ flow, pressure }) => flow.lte(0) || pressure.lte(0)))
    return wrong('Flow and pressure of a stage are above zero.');
  const falling = stages.every((stage, at) => {
    const before = stages[at - 1];
    return before === undefined || (stage.flow.lt(before.flow) && stage.pressure.gt(before.pressure));
  });
  return falling ? right(stages) : wrong('Each stage has less oil and more pressure than the one before it.');
}
