import type Fraction from 'fraction.js';
import { inUnit } from '../quantities/quantity.ts';
import { type PumpStage } from './pump.ts';

/** One force in the units that are mistaken for each other. */
export interface Force {
  readonly kN: number;
  readonly lbf: number;
  /** 2000 lbf: what a US press or jack means by a ton. */
  readonly shortTons: number;
  readonly longTons: number;
  readonly tonnesForce: number;
}

/** What one stage of the pump does with this cylinder. */
export interface RamStage {
  readonly litresPerMinute: number;
  readonly upToBar: number;
  readonly extendMmPerS: number;
  readonly retractMmPerS: number;
  readonly forceKN: number;
  /** In the oil, and at the shaft of the pump. */
  readonly hydraulicKW: number;
  readonly shaftKW: number;
  readonly shaftHp: number;
}

/** A force in N, in every ton that is said. */
export function toForce(newtons: number): Force {
  return {
    kN: newtons / 1000,
    lbf: inUnit(newtons, 'force', 'lbf'),
    shortTons: inUnit(newtons, 'force', 'short tons'),
    longTons: inUnit(newtons, 'force', 'long tons'),
    tonnesForce: inUnit(newtons, 'force', 'tonnes'),
  };
}

/** The two sides of the piston, mm2. */
export interface Areas {
  readonly bore: number;
  readonly rodSide: number;
}

/** N/mm2 times mm2. */
export const MPA = 1_000_000;

/** One stage of the pump against the lower of its own pressure and the relief setting, Pa; areas in mm2. */
export function stageOf(
  { flow, pressure }: PumpStage,
  relief: Fraction,
  areas: Areas,
  efficiency: number,
): RamStage {
  const held = pressure.lt(relief) ? pressure : relief;
  const perSecond = (flow.valueOf() * 1_000_000) / 60;
  const hydraulic = (flow.valueOf() / 60_000) * held.valueOf();
  return {
    litresPerMinute: flow.valueOf(),
    upToBar: inUnit(held, 'pressure', 'bar'),
    extendMmPerS: perSecond / areas.bore,
    retractMmPerS: perSecond / areas.rodSide,
    forceKN: ((held.valueOf() / MPA) * areas.bore) / 1000,
    hydraulicKW: hydraulic / 1000,
    shaftKW: hydraulic / 1000 / efficiency,
    shaftHp: inUnit(hydraulic / efficiency, 'power', 'hp'),
  };
}

interface Times {
  readonly extendS: number | null;
  readonly extendRangeS: readonly [number, number];
  readonly retractS: number;
}

/** The stroke as segments: fast until the load comes on, then at the flow of the last stage. */
export function timesOf(stages: readonly RamStage[], stroke: number, pressing: number | null): Times | null {
  const [first, last] = [stages[0], stages.at(-1)];
  if (first === undefined || last === undefined) return null;
  const at = (loaded: number) => (stroke - loaded) / first.extendMmPerS + loaded / last.extendMmPerS;
  const known = pressing ?? (stages.length === 1 ? 0 : null);
  return {
    extendS: known === null ? null : at(known),
    extendRangeS: [at(0), at(stroke)],
    retractS: stroke / first.retractMmPerS,
  };
}
