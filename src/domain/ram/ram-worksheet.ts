import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { inUnit } from '../quantities/quantity.ts';
import {
  choiceField,
  lengthField,
  numberField,
  optional,
  quantityField,
  textField,
  withDefault,
} from '../worksheets/fields.ts';
import {
  type Field,
  type ValuesOf,
  type Worked,
  worksheet,
  type WorkingStep,
} from '../worksheets/worksheet.ts';
import { bucklingLoad, type Buckling, LENGTH_FACTORS } from './buckling.ts';
import { parsePump, type PumpStage } from './pump.ts';
import { type Areas, type Force, MPA, type RamStage, stageOf, timesOf, toForce } from './ram-stages.ts';

export interface RamResult {
  /** The pressure that the forces are computed with: the lower of relief and pump. */
  readonly pressureBar: number;
  readonly boreAreaMm2: number;
  readonly rodSideAreaMm2: number;
  readonly extendForce: Force;
  readonly retractForce: Force;
  /** On the rod side, if its port is shut while the ram extends. */
  readonly rodSidePressureBar: number;
  readonly oilLitres: number;
  /** By how much the tank's level moves: the volume of the rod. */
  readonly rodLitres: number;
  readonly stages: readonly RamStage[];
  /** Null where it is not known how much of the stroke is under load. */
  readonly extendS: number | null;
  readonly extendRangeS: readonly [least: number, most: number] | null;
  readonly retractS: number | null;
  readonly cycleS: number | null;
  /** What comes back from the bore side while the ram retracts. */
  readonly returnLitresPerMinute: number | null;
  readonly hoseMPerS: number | null;
  readonly tankLitres: number | null;
  readonly engineKW: number | null;
  readonly bucklingKN: number | null;
  /** Buckling load over greatest force. */
  readonly bucklingFactor: number | null;
}

const pumpField: Field<readonly PumpStage[]> = {
  ...textField('Pump', '11 gpm@650 psi, 3 gpm@2500 psi'),
  read: (given) => {
    const text = textField('Pump', '11 gpm@650 psi').read(given);
    return text.ok ? parsePump(text.value) : text;
  },
};

const inputs = {
  bore: lengthField('Bore', '100'),
  rod: lengthField('Rod', '45'),
  stroke: lengthField('Stroke', '600'),
  pressure: quantityField('Relief setting', '165 bar', 'pressure'),
  pump: optional(pumpField),
  pressing: optional(lengthField('Stroke under load', '80', { zero: true })),
  efficiency: withDefault(
    numberField('Efficiency of the pump', '0.85', 0.3, 1),
    new Fraction('0.85'),
    '0.85',
  ),
  hose: optional(lengthField('Bore of the pressure hose', '1/2 in')),
  hoserating: optional(quantityField('Rating of the hose', '275 bar', 'pressure')),
  engine: optional(quantityField('Engine', '4 kW', 'power')),
  rating: withDefault(
    choiceField('The engine’s power is', ['continuous', 'peak']),
    'continuous',
    'continuous',
  ),
  extended: optional(lengthField('Length between the ends, extended', '1300')),
  mounting: optional(choiceField('Ends', ['pinned', 'fixed-pinned', 'fixed-fixed', 'fixed-free'])),
};
type Values = ValuesOf<typeof inputs>;

/** The pressures that are computed here, Pa: up to those of common jacks and presses. */
const [LEAST_PRESSURE, MOST_PRESSURE] = [100_000, 70_000_000];
/** Bores that are computed here, mm. */
const MOST_BORE = 1000;

/**
 * Velocities of oil in pressure lines, m/s: 10 to 15 ft/s up to 500 psi, 15 to 20 to 3000 psi, 25 above. Common
 * practice, as makers' sheets print it.
 */
function velocityLimit(pressure: number): number {
  const psi = inUnit(pressure, 'pressure', 'psi');
  const feet = psi <= 500 ? 15 : psi <= 3000 ? 20 : 25;
  return feet * 0.3048;
}

/** Reservoir: three times what the pump gives in a minute. Common practice; small machines run with less. */
const TANK_MINUTES = 3;
/** What an engine holds of its peak power: common practice among makers of small engines. */
const CONTINUOUS_SHARE = 0.85;
/** Makers of cylinders keep about this between buckling and working load: common practice. */
const USUAL_BUCKLING_FACTOR = 3.5;

function check({
  bore,
  rod,
  stroke,
  pressure,
  pressing,
  extended,
  mounting,
  hoserating,
}: Values): string | null {
  if (bore.gt(MOST_BORE)) return `Bore: bores up to ${String(MOST_BORE)} mm are computed here.`;
  if (rod.gte(bore)) return 'Rod: it has to be thinner than the bore.';
  if (pressure.lt(LEAST_PRESSURE) || pressure.gt(MOST_PRESSURE))
    return 'Relief setting: pressures from 1 to 700 bar are computed here.';
  if (pressing?.gt(stroke) === true) return 'Stroke under load: it is not longer than the stroke.';
  if ((extended === null) !== (mounting === null)) return 'Give the extended length and the ends together.';
  if (extended?.lt(stroke) === true)
    return 'Length between the ends, extended: it is not shorter than the stroke.';
  if (hoserating?.lt(pressure) === true)
    return `Rating of the hose: ${formatNumber(inUnit(hoserating, 'pressure', 'bar'))} bar is below the relief setting of ${formatNumber(inUnit(pressure, 'pressure', 'bar'))} bar. Do not run it so.`;
  return null;
}

function engineWarnings({ engine, rating }: Values, neededW: number): readonly string[] {
  if (engine === null || neededW === 0) return [];
  const has = engine.valueOf() * (rating === 'peak' ? CONTINUOUS_SHARE : 1);
  return [
    ...(rating === 'peak'
      ? ['The engine’s power is a peak: it holds about 85 % of it for long, less when it is hot or high up.']
      : []),
    ...(has < neededW
      ? [
          `The pump asks for ${formatNumber(neededW / 1000, 3)} kW; the engine holds ${formatNumber(has / 1000, 3)} kW.`,
        ]
      : []),
  ];
}

function warn(
  values: Values,
  pump: readonly PumpStage[],
  hose: number | null,
  factor: number | null,
  needed: number,
) {
  const { pressure } = values;
  const last = pump.at(-1);
  const bar = (pa: Fraction) => formatNumber(inUnit(pa, 'pressure', 'bar'), 4);
  return [
    ...(last !== undefined && !last.pressure.equals(pressure)
      ? [
          `Pump and relief differ: the pump is for ${bar(last.pressure)} bar, the relief is set to ${bar(pressure)} bar. The force is computed with the lower one.`,
        ]
      : []),
    ...(last?.pressure.lt(pressure) === true
      ? ['The relief opens above what the pump is for: it does not protect the pump.']
      : []),
    ...(hose !== null && hose > velocityLimit(pressure.valueOf())
      ? [
          `The oil runs at ${formatNumber(hose, 3)} m/s in the pressure hose; up to about ${formatNumber(velocityLimit(pressure.valueOf()), 3)} m/s is usual.`,
        ]
      : []),
    ...(factor !== null && factor < USUAL_BUCKLING_FACTOR
      ? [
          `The rod buckles at ${formatNumber(factor, 3)} times the greatest force; makers usually keep ${String(USUAL_BUCKLING_FACTOR)} or more.`,
        ]
      : []),
    ...engineWarnings(values, needed),
  ];
}

function work(
  values: Values,
  pressure: Fraction,
  areas: Areas,
  stages: readonly RamStage[],
  buckling: Buckling | null,
) {
  const [p, bore, rod] = [pressure.valueOf() / MPA, values.bore.valueOf(), values.rod.valueOf()];
  const show = formatNumber;
  const steps: WorkingStep[] = [
    {
      what: 'Area of the bore',
      formula: 'A = π/4 × D²',
      numbers: `π/4 × (${show(bore)} mm)²`,
      value: `${show(areas.bore)} mm²`,
    },
    {
      what: 'Area on the rod side',
      formula: 'a = π/4 × (D² − d²)',
      numbers: `π/4 × ((${show(bore)} mm)² − (${show(rod)} mm)²)`,
      value: `${show(areas.rodSide)} mm²`,
    },
    {
      what: 'Force out',
      formula: 'F = p × A',
      numbers: `${show(p)} N/mm² × ${show(areas.bore)} mm²`,
      value: `${show((p * areas.bore) / 1000)} kN`,
    },
    {
      what: 'Force in',
      formula: 'F = p × a',
      numbers: `${show(p)} N/mm² × ${show(areas.rodSide)} mm²`,
      value: `${show((p * areas.rodSide) / 1000)} kN`,
    },
    {
      what: 'Pressure on the rod side with its port shut',
      formula: 'p × A / a',
      numbers: `${show(p * 10)} bar × ${show(areas.bore)} / ${show(areas.rodSide)}`,
      value: `${show((p * 10 * areas.bore) / areas.rodSide)} bar`,
    },
    ...stages.flatMap((stage, at) => [
      {
        what: `Speed out, stage ${String(at + 1)}`,
        formula: 'v = Q / A',
        numbers: `${show(stage.litresPerMinute)} L/min / ${show(areas.bore)} mm²`,
        value: `${show(stage.extendMmPerS)} mm/s`,
      },
      {
        what: `Power at the shaft, stage ${String(at + 1)}`,
        formula: 'P = Q × p / (600 × η)',
        numbers: `${show(stage.litresPerMinute)} L/min × ${show(stage.upToBar)} bar / (600 × ${show(values.efficiency.valueOf())})`,
        value: `${show(stage.shaftKW)} kW`,
      },
    ]),
  ];
  if (buckling !== null && values.mounting !== null)
    steps.push({
      what: `Buckling load of the rod (${buckling.formula})`,
      formula: buckling.formula === 'Euler' ? 'P = π² E I / (K L)²' : 'P = A × σy × (1 − σy λ² / (4 π² E))',
      numbers: `d ${show(rod)} mm, L ${show(values.extended?.valueOf() ?? 0)} mm, K ${String(LENGTH_FACTORS[values.mounting])}, λ ${show(buckling.slenderness, 3)}`,
      value: `${show(buckling.load / 1000)} kN`,
    });
  return steps;
}

function compute(values: Values): Answer<Worked<RamResult>> {
  const fault = check(values);
  if (fault !== null) return wrong(fault);
  const { bore, rod, stroke, extended, mounting } = values;
  const pump = values.pump ?? [];
  const last = pump.at(-1)?.pressure ?? values.pressure;
  const pressure = last.lt(values.pressure) ? last : values.pressure;
  const circle = (diameter: Fraction) => (Math.PI / 4) * diameter.mul(diameter).valueOf();
  const areas = { bore: circle(bore), rodSide: circle(bore) - circle(rod) };
  const newtonsPerMm2 = pressure.valueOf() / MPA;
  const stages = pump.map((stage) => stageOf(stage, values.pressure, areas, values.efficiency.valueOf()));
  const times = timesOf(stages, stroke.valueOf(), values.pressing?.valueOf() ?? null);
  const flow = stages[0]?.litresPerMinute ?? null;
  const hose =
    values.hose === null || flow === null ? null : (flow * 1_000_000) / 60 / circle(values.hose) / 1000;
  const buckling =
    extended === null || mounting === null ? null : bucklingLoad(rod.valueOf(), extended.valueOf(), mounting);
  const force = newtonsPerMm2 * areas.bore;
  const factor = buckling === null ? null : buckling.load / force;
  const needed = Math.max(0, ...stages.map(({ shaftKW }) => shaftKW)) * 1000;
  return right({
    result: {
      pressureBar: inUnit(pressure, 'pressure', 'bar'),
      boreAreaMm2: areas.bore,
      rodSideAreaMm2: areas.rodSide,
      extendForce: toForce(force),
      retractForce: toForce(newtonsPerMm2 * areas.rodSide),
      rodSidePressureBar: (inUnit(pressure, 'pressure', 'bar') * areas.bore) / areas.rodSide,
      oilLitres: (areas.bore * stroke.valueOf()) / 1_000_000,
      rodLitres: (circle(rod) * stroke.valueOf()) / 1_000_000,
      stages,
      extendS: times?.extendS ?? null,
      extendRangeS: times?.extendRangeS ?? null,
      retractS: times?.retractS ?? null,
      cycleS: times?.extendS == null ? null : times.extendS + times.retractS,
      returnLitresPerMinute: flow === null ? null : (flow * areas.bore) / areas.rodSide,
      hoseMPerS: hose,
      tankLitres: flow === null ? null : flow * TANK_MINUTES,
      engineKW: stages.length === 0 ? null : needed / 1000,
      bucklingKN: buckling === null ? null : buckling.load / 1000,
      bucklingFactor: factor,
    },
    working: work(values, pressure, areas, stages, buckling),
    sources: [
      {
        title: 'Makers’ formula sheets for cylinders and pumps',
        clause: 'force, speed, power',
        standing: 'published',
      },
      { title: 'Euler’s and J. B. Johnson’s column formulas', clause: 'ideal ends', standing: 'published' },
      {
        title: 'Line velocities, reservoir, continuous share of engine power',
        clause: '',
        standing: 'practice',
      },
    ],
    limits: [
      'Steady pressure and flow; friction, leakage and losses in lines are left out of force and speed.',
      'Bores to 1000 mm, 1 to 700 bar. A bare ton is not used: short, long and metric tons are told apart.',
      ...(buckling === null
        ? []
        : [
            'The rod’s diameter is taken for the whole length, straight and loaded in its middle; yield 300 N/mm².',
          ]),
    ],
    notChecked: [
      ...(buckling === null
        ? ['Rod and frame not checked: give the extended length and how the ends are held.']
        : ['The frame.']),
      'The ratings of cylinder, fittings, valves and the pressure that the rod side can take.',
      'Heat, shock, side load and wear.',
      ...(values.hose === null || values.hoserating === null ? ['The hoses.'] : []),
    ],
    warnings: warn(values, pump, hose, factor, needed),
    cautions: ['pressure', 'load', 'pinch', 'stored'],
  });
}

/** Force, speed, power and buckling of a hydraulic cylinder with its pump. */
export const ramWorksheet = worksheet({ id: 'ram', title: 'Hydraulic ram', inputs, compute });
