import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import {
  choiceField,
  lengthField,
  numberField,
  optional,
  quantityField,
  sizesField,
  withDefault,
} from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { angleArea, flatArea, hollowArea, pipeArea, roundArea, type SectionArea } from './section-areas.ts';

/** Steel, kg/m3: EN 1991-1-1, table A.4 (77 to 78.5 kN/m3); EN 10219-2 and EN 10056 compute with it. */
export const STEEL_DENSITY = new Fraction(7850);

/** What a section weighs. */
export interface SectionMass {
  readonly kgPerM: number;
  /** Of the length given, all pieces together; null without one. */
  readonly kg: number | null;
}

const inputs = {
  flat: optional(sizesField('Flat or square bar', '50x12', 2)),
  round: optional(lengthField('Round bar', '30')),
  shs: optional(sizesField('Square hollow section', '50x3', 2)),
  rhs: optional(sizesField('Rectangular hollow section', '100x50x4', 3)),
  angle: optional(angleSizes()),
  pipe: optional(sizesField('Pipe or round tube', '48.3x3.2', 2)),
  length: optional(lengthField('Length', '6000')),
  quantity: withDefault(numberField('Pieces', '4', 1, 100_000), new Fraction(1), '1'),
  density: withDefault(
    quantityField('Density', '7850', 'density', 'kg/m3'),
    STEEL_DENSITY,
    '7850 kg/m³, steel',
  ),
  finish: withDefault(choiceField('Hollow sections made', ['cold', 'hot', 'sharp']), 'cold', 'cold'),
};
type Values = ValuesOf<typeof inputs>;

/** Equal angles are written 50x5, unequal ones 80x60x7. */
function angleSizes() {
  const [equal, unequal] = [sizesField('Angle', '50x5', 2), sizesField('Angle', '80x60x7', 3)];
  return {
    ...equal,
    read: (given: unknown) => {
      const read = unequal.read(given);
      return read.ok ? read : equal.read(given);
    },
  };
}

const ZERO = new Fraction(0);

function areaOf(values: Values): Answer<SectionArea> {
  const { flat, round, shs, rhs, angle, pipe, finish } = values;
  const given = [flat, round, shs, rhs, angle, pipe].filter((section) => section !== null);
  if (given.length !== 1)
    return wrong('Give one section: a flat, round, square or rectangular hollow section, angle or pipe.');
  if (round !== null) return right(roundArea(round));
  const [a = ZERO, b = ZERO, c = b] = flat ?? shs ?? rhs ?? angle ?? pipe ?? [];
  if (flat !== null) return right(flatArea(a, b));
  if (shs !== null) return hollowArea(a, a, b, finish);
  if (rhs !== null) return hollowArea(a, b, c, finish);
  if (pipe !== null) return pipeArea(a, b);
  return angle?.length === 2 ? angleArea(a, a, b) : angleArea(a, b, c);
}

/** Lengths of a plain bar are exact: no float stands between what was typed and the mass. */
function exactArea({ flat }: Values): Fraction | null {
  const [a, b] = flat ?? [];
  return a === undefined || b === undefined ? null : a.mul(b);
}

function compute(values: Values): Answer<Worked<SectionMass>> {
  const found = areaOf(values);
  if (!found.ok) return found;
  const { area, formula, corners } = found.value;
  const { density, length, quantity } = values;
  const exact = exactArea(values);
  const perMetre = density.div(1_000_000);
  const kgPerM = exact === null ? area * perMetre.valueOf() : exact.mul(perMetre).valueOf();
  const metres = length === null ? null : length.mul(quantity).div(1000);
  const total = (run: Fraction) =>
    exact === null ? kgPerM * run.valueOf() : exact.mul(perMetre).mul(run).valueOf();
  const kg = metres === null ? null : total(metres);
  const rho = formatNumber(density.valueOf());
  return right({
    result: { kgPerM, kg },
    working: [
      { what: 'Area', formula: `A = ${formula}`, numbers: '', value: `${formatNumber(area)} mm²` },
      {
        what: 'Mass of a metre',
        formula: 'm = A × ρ',
        numbers: `${formatNumber(area)} mm² × ${rho} kg/m³ ÷ 1 000 000`,
        value: `${formatNumber(kgPerM)} kg/m`,
      },
      ...(metres === null || kg === null
        ? []
        : [
            {
              what: 'Mass',
              formula: 'M = m × L',
              numbers: `${formatNumber(kgPerM)} kg/m × ${formatNumber(metres.valueOf())} m`,
              value: `${formatNumber(kg)} kg`,
            },
          ]),
    ],
    sources: [
      { title: 'EN 10219-2 and EN 10210-2', clause: 'section properties', standing: 'memory' },
      { title: 'EN 10056-1', clause: 'radii of angles', standing: 'memory' },
    ],
    limits: [
      `Nominal sizes, density ${rho} kg/m³.`,
      ...(corners === null ? [] : [corners]),
      'Rolled and drawn sections vary in mass; weigh before you lift near a limit.',
    ],
    notChecked: ['Whether the section is made or stocked.', 'Strength.'],
    warnings: [],
    cautions: ['lifting'],
  });
}

/** What a section weighs by the metre, and so many lengths of it. */
export const sectionsWorksheet = worksheet({ id: 'sections', title: 'Section mass', inputs, compute });
