import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import {
  choiceField,
  flagField,
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
import {
  currentRange,
  type Electrode,
  parseElectrode,
  TRADE_DIAMETERS,
  tradeDiameter,
} from './electrodes.ts';
import { allowableShear, filletMass, heatInput, type LeastLeg, leastLeg, throatOf } from './fillet.ts';

export interface WeldResult {
  /** Null where the tables have none for this class and diameter. */
  readonly currentA: readonly [least: number, most: number] | null;
  readonly throatMm: number;
  /** Least leg against cracking; says nothing about strength. */
  readonly leastLegMm: number;
  readonly depositedKg: number;
  readonly electrodesKg: number;
  readonly electrodes: number;
  readonly heatInputKJPerMm: number | null;
  /** Static shear that the throat is allowed by the rule of thumb, over the whole length; null under cyclic load. */
  readonly allowableKN: number | null;
}

const electrodeField: Field<Electrode> = {
  ...textField('Electrode', 'E7018'),
  read: (given) => {
    const text = textField('Electrode', 'E7018').read(given);
    return text.ok ? parseElectrode(text.value) : text;
  },
};

const inputs = {
  process: withDefault(
    choiceField('Process', ['stick', 'mig', 'tig', 'flux-cored', 'gas']),
    'stick',
    'stick',
  ),
  electrode: electrodeField,
  diameter: lengthField('Diameter', '3.2'),
  leg: lengthField('Leg', '5'),
  length: lengthField('Length of weld', '400'),
  thickness: lengthField('Thickness', '10'),
  other: lengthField('Thickness of the other part', '12'),
  cyclic: flagField('Load that comes and goes'),
  efficiency: withDefault(
    numberField('Efficiency of deposition', '0.62', 0.2, 1),
    new Fraction('0.62'),
    '0.62',
  ),
  rod: withDefault(lengthField('Length of an electrode', '350'), new Fraction(350), '350 mm'),
  volts: optional(quantityField('Arc voltage', '25 V', 'voltage', 'V')),
  amps: optional(quantityField('Current', '120 A', 'current', 'A')),
  speed: optional(lengthField('Travel in a minute', '150')),
};
type Values = ValuesOf<typeof inputs>;

/** The stub that is thrown away, mm: 2 in, common practice. */
const STUB = 50;
const MOST_THICKNESS = 150;

function check({ process, diameter, leg, thickness, other, rod, volts, amps, speed }: Values): string | null {
  if (process !== 'stick') return `This covers stick welding; ${process} welding is not covered.`;
  if (tradeDiameter(diameter) === null)
    return `Diameter: ${diameter.toString()} mm is no size of electrode. There are ${TRADE_DIAMETERS}.`;
  if (leg.lt(2) || leg.gt(40)) return 'Leg: legs from 2 to 40 mm are computed here.';
  if (thickness.lt('1.5') || other.lt('1.5') || thickness.gt(MOST_THICKNESS) || other.gt(MOST_THICKNESS))
    return `Thickness: from 1.5 to ${String(MOST_THICKNESS)} mm is computed here.`;
  if (rod.lt(200) || rod.gt(700)) return 'Length of an electrode: from 200 to 700 mm.';
  const heat = [volts, amps, speed].filter((value) => value !== null).length;
  if (heat !== 0 && heat !== 3) return 'Give voltage, current and travel together, for the heat input.';
  return null;
}

function warn(values: Values, least: LeastLeg, current: readonly [number, number] | null): readonly string[] {
  const { leg, thickness, other, amps, electrode } = values;
  const thin = thickness.lt(other) ? thickness : other;
  return [
    ...(leg.lt(least.leg)
      ? [
          `The leg is below the least against cracking, ${formatNumber(least.leg.valueOf())} mm: thick plate chills a small bead.`,
        ]
      : []),
    ...(leg.gt(thin) ? ['The leg is larger than the thinner part is thick.'] : []),
    ...(current === null
      ? [`The tables here have no current for ${electrode.name} of this diameter: take the maker’s.`]
      : []),
    ...(amps !== null && current !== null && (amps.lt(current[0]) || amps.gt(current[1]))
      ? [`${formatNumber(amps.valueOf())} A is outside ${String(current[0])} to ${String(current[1])} A.`]
      : []),
  ];
}

function work(values: Values, least: LeastLeg, found: WeldResult, core: number): readonly WorkingStep[] {
  const { leg, length, efficiency, electrode, rod, diameter, volts, amps, speed } = values;
  const show = (value: number | Fraction) => formatNumber(value.valueOf());
  return [
    {
      what: 'Throat',
      formula: 'a = z / √2',
      numbers: `${show(leg)} mm / √2`,
      value: `${show(found.throatMm)} mm`,
    },
    {
      what: 'Least leg against cracking; says nothing about strength',
      formula: `by the ${electrode.lowHydrogen ? 'thinner part, low hydrogen' : 'thicker part, not low hydrogen'}${least.capped ? '; no more than the thinner part' : ''}`,
      numbers: `${show(least.by)} mm`,
      value: `${show(least.leg)} mm`,
    },
    {
      what: 'Deposited',
      formula: 'm = z² / 2 × L × ρ',
      numbers: `(${show(leg)} mm)² / 2 × ${show(length)} mm × 7850 kg/m³`,
      value: `${show(found.depositedKg)} kg`,
    },
    {
      what: 'Electrodes by weight',
      formula: 'm / E',
      numbers: `${show(found.depositedKg)} kg / ${show(efficiency)}`,
      value: `${show(found.electrodesKg)} kg`,
    },
    {
      what: 'Electrodes by count, their core wire less the stub',
      formula: 'm / (π/4 × d² × (l − stub) × ρ)',
      numbers: `${show(found.depositedKg)} kg / (d ${show(diameter)} mm, ${show(rod)} − ${String(STUB)} mm: ${show(core * 1000)} g)`,
      value: String(found.electrodes),
    },
    ...(found.allowableKN === null
      ? []
      : [
          {
            what: 'Shear allowed on the throat, static',
            formula: 'F = 0.30 × FEXX × a × L',
            numbers: `0.30 × ${String(electrode.strengthKsi)} ksi × ${show(found.throatMm)} mm × ${show(length)} mm`,
            value: `${show(found.allowableKN)} kN`,
          },
        ]),
    ...(found.heatInputKJPerMm === null || volts === null || amps === null || speed === null
      ? []
      : [
          {
            what: 'Heat input',
            formula: 'Q = 0.8 × U × I × 60 / (1000 v)',
            numbers: `0.8 × ${show(volts)} V × ${show(amps)} A × 60 / (1000 × ${show(speed)} mm/min)`,
            value: `${show(found.heatInputKJPerMm)} kJ/mm`,
          },
        ]),
  ];
}

function compute(values: Values): Answer<Worked<WeldResult>> {
  const fault = check(values);
  if (fault !== null) return wrong(fault);
  const { electrode, diameter, leg, length, thickness, other, cyclic, efficiency, rod, volts, amps, speed } =
    values;
  const current = currentRange(electrode, tradeDiameter(diameter) ?? '');
  const least = leastLeg([thickness, other], { lowHydrogen: electrode.lowHydrogen, cyclic });
  const deposited = filletMass(leg.valueOf(), length.valueOf());
  const core = (Math.PI / 4) * diameter.valueOf() ** 2 * (rod.valueOf() - STUB) * 7.85e-6;
  const result: WeldResult = {
    currentA: current,
    throatMm: throatOf(leg.valueOf()),
    leastLegMm: least.leg.valueOf(),
    depositedKg: deposited,
    electrodesKg: deposited / efficiency.valueOf(),
    electrodes: Math.ceil(deposited / core),
    heatInputKJPerMm:
      volts === null || amps === null || speed === null
        ? null
        : heatInput(volts.valueOf(), amps.valueOf(), speed.valueOf()),
    allowableKN: cyclic
      ? null
      : (allowableShear(leg.valueOf(), electrode.strengthKsi) * length.valueOf()) / 1000,
  };
  return right({
    result,
    working: work(values, least, result, core),
    sources: [
      {
        title: 'Machinery’s Handbook, 31st edition',
        clause: 'page 1594, tables 13 and 14',
        standing: 'published',
      },
      { title: 'AWS D1.1', clause: 'table 7.7, as secondary sources print it', standing: 'published' },
      {
        title: 'O. W. Blodgett, Design of Welded Structures',
        clause: 'allowable shear 0.30 FEXX',
        standing: 'published',
      },
      { title: 'ISO/TR 17671-1 (EN 1011-1)', clause: 'thermal efficiency 0.8', standing: 'published' },
      { title: 'Efficiency of deposition 0.59 to 0.66, stub 50 mm', clause: '', standing: 'practice' },
    ],
    limits: [
      'Stick welding of plain steel, equal-leg fillets, plain triangle; a convex bead takes about a tenth more.',
      'The count of electrodes takes the core wire alone; iron powder in the coating makes it fewer, spatter more.',
      'Least leg without a calculated preheat, in one pass.',
    ],
    notChecked: [
      'Whether the joint is strong enough: load, direction, eccentricity, base metal.',
      ...(cyclic ? ['Fatigue: under a load that comes and goes no strength is given here.'] : ['Fatigue.']),
      'Preheat, position, access, the welder and the weld itself.',
    ],
    warnings: warn(values, least, current),
    cautions: ['arc', 'fumes', 'zinc', 'fire', 'electric', 'solvents'],
  });
}

/** Current, throat, least leg, electrodes and heat of a stick-welded fillet. */
export const weldWorksheet = worksheet({ id: 'weld', title: 'Stick welding', inputs, compute });
