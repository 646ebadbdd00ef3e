import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { choiceField, lengthField, optional, textField, withDefault } from '../worksheets/fields.ts';
import {
  type Field,
  type ValuesOf,
  type Worked,
  worksheet,
  type WorkingStep,
} from '../worksheets/worksheet.ts';
import { type Fit, fitOf } from './fit.ts';
import { type Deviations, limitDeviations, parseToleranceClass, type ToleranceClass } from './iso-286.ts';
import { type TakeOff, takeOff } from './take-off.ts';

/** What a fit worksheet gives; micrometres. */
export interface FitResult {
  readonly hole: Deviations | null;
  readonly shaft: Deviations | null;
  readonly fit: Fit | null;
  readonly takeOff: TakeOff | null;
}

/** A tolerance class of a hole or a shaft. */
export function classField(label: string, example: string, of: 'hole' | 'shaft'): Field<ToleranceClass> {
  const text = textField(label, example);
  return {
    ...text,
    read: (given) => {
      const typed = text.read(given);
      const read = typed.ok ? parseToleranceClass(typed.value) : typed;
      if (!read.ok || read.value.of === of) return read;
      return wrong(
        `${read.value.name} is a ${read.value.of}’s: capital letters are holes, small ones shafts.`,
      );
    },
  };
}

const inputs = {
  size: lengthField('Nominal size', '25'),
  hole: optional(classField('Hole', 'H7', 'hole')),
  shaft: optional(classField('Shaft', 'k6', 'shaft')),
  measured: optional(lengthField('Measured', '25.31')),
  instrument: withDefault(
    lengthField('Instrument, plus or minus', '0.01', { zero: true }),
    new Fraction(0),
    'nothing',
  ),
  dial: withDefault(choiceField('The dial reads', ['diameter', 'radius']), 'diameter', 'diameter'),
};
type Values = ValuesOf<typeof inputs>;

function optionalDeviations(size: Fraction, wanted: ToleranceClass | null): Answer<Deviations | null> {
  return wanted === null ? right(null) : limitDeviations(size, wanted);
}

/** Micrometres with their sign. */
export function signed(um: number): string {
  return um > 0 ? `+${formatNumber(um)}` : formatNumber(um);
}

/** A pair of deviations, for a line of working. */
export function sayDeviations({ upper, lower }: Deviations): string {
  return `${signed(upper)} / ${signed(lower)} µm`;
}

/** The lines of working of a fit. */
export function workFit(hole: Deviations, shaft: Deviations, fit: Fit): readonly WorkingStep[] {
  return [
    {
      what: 'Least clearance',
      formula: 'smallest hole − largest shaft',
      numbers: `${signed(hole.lower)} − (${signed(shaft.upper)})`,
      value: `${signed(fit.least)} µm`,
    },
    {
      what: 'Most clearance',
      formula: 'largest hole − smallest shaft',
      numbers: `${signed(hole.upper)} − (${signed(shaft.lower)})`,
      value: `${signed(fit.most)} µm`,
    },
  ];
}

function measure(values: Values, of: 'hole' | 'shaft', deviations: Deviations): TakeOff | null {
  const { size: nominal, measured, instrument, dial } = values;
  return measured === null ? null : takeOff({ of, nominal, measured, instrument, deviations, dial });
}

function compute(values: Values): Answer<Worked<FitResult>> {
  const { size } = values;
  const hole = optionalDeviations(size, values.hole);
  if (!hole.ok) return hole;
  const shaft = optionalDeviations(size, values.shaft);
  if (!shaft.ok) return shaft;
  const one = hole.value ?? shaft.value;
  if (one === null) return wrong('Give a hole such as H7, a shaft such as k6, or both.');
  const both = hole.value !== null && shaft.value !== null;
  if (both && values.measured !== null) return wrong('Give only the class of the one that was measured.');
  const fit = hole.value !== null && shaft.value !== null ? fitOf(hole.value, shaft.value) : null;
  const steps = [
    { wanted: values.hole, found: hole.value },
    { wanted: values.shaft, found: shaft.value },
  ].flatMap(({ wanted, found }) =>
    wanted === null || found === null
      ? []
      : [
          {
            what: `${wanted.of === 'hole' ? 'Hole' : 'Shaft'} ${wanted.name}`,
            formula: 'by table',
            numbers: `${size.toString()} mm`,
            value: sayDeviations(found),
          },
        ],
  );
  const off = measure(values, hole.value === null ? 'shaft' : 'hole', one);
  return right({
    result: { hole: hole.value, shaft: shaft.value, fit, takeOff: off },
    working: [
      ...steps,
      ...(fit !== null && hole.value !== null && shaft.value !== null
        ? workFit(hole.value, shaft.value, fit)
        : []),
    ],
    sources: [
      { title: 'ISO 286-1:2010 and ISO 286-2:2010', clause: 'tables 1 to 5', standing: 'memory' },
      {
        title: 'Narayana, Machine Drawing; charts of bearing and tool makers',
        clause: 'table 15.2; the cells that the tests name',
        standing: 'published',
      },
    ],
    limits: [
      'Sizes above 0 to 500 mm, grades 5 to 14, at 20 °C.',
      'js and JS are half the tolerance either way, exactly; some tables round them to whole micrometres.',
    ],
    notChecked: [
      'Form, roundness and finish.',
      'Heat, and what a press fit does to the sizes of thin parts.',
      'Whether the fit carries a load.',
    ],
    warnings: off?.pastLimit === true ? ['It is past its last limit: taking more off does not mend it.'] : [],
    cautions: [],
  });
}

/** Limits of a hole and a shaft, the fit between them, and what is still to come off one of them. */
export const fitWorksheet = worksheet({ id: 'fits', title: 'Limits and fits', inputs, compute });
