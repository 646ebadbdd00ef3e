import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import {
  choiceField,
  lengthField,
  optional,
  quantityField,
  sizesField,
  withDefault,
} from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { type BeamSection, hollowSection, roundTube, solidBar, solidRound } from './beam-section.ts';
import { BEAM_CASES, BEAM_COEFFICIENTS, bend } from './bend.ts';

export interface BeamResult {
  readonly momentNm: number;
  readonly stressNPerMm2: number;
  readonly deflectionMm: number;
  /** Span over deflection. */
  readonly spanOverDeflection: number;
  readonly shearN: number;
  readonly inertiaMm4: number;
  readonly sectionModulusMm3: number;
}

/** Steel: EN 1993-1-1, 3.2.6 has 210 000 N/mm2; yield of S235: EN 10025-2, table 7, to 16 mm. */
const STEEL = { modulus: new Fraction(210_000_000_000), yield: new Fraction(235_000_000) };
/** Below this many heights the load goes into shear and the supports, and the formulas do not hold. */
const LEAST_SLENDERNESS = 10;
/** Beyond a tenth of the span the deflection is no longer small. */
const MOST_DEFLECTION = 0.1;

const inputs = {
  case: choiceField('Held and loaded', BEAM_CASES),
  span: lengthField('Span', '1200'),
  load: quantityField('Whole load', '2 kN', 'force'),
  bar: optional(sizesField('Bar, width by standing height', '12x50', 2)),
  round: optional(lengthField('Round bar', '30')),
  shs: optional(sizesField('Square hollow section', '50x3', 2)),
  rhs: optional(sizesField('Hollow section, standing height by width by wall', '100x50x4', 3)),
  pipe: optional(sizesField('Pipe or round tube', '48.3x3.2', 2)),
  modulus: withDefault(
    quantityField('Modulus of elasticity', '210 GPa', 'stress'),
    STEEL.modulus,
    '210 GPa, steel',
  ),
  yield: withDefault(
    quantityField('Yield of the material', '235 MPa', 'stress'),
    STEEL.yield,
    '235 MPa, plain steel',
  ),
};
type Values = ValuesOf<typeof inputs>;

function sectionOf({ bar, round, shs, rhs, pipe }: Values): Answer<BeamSection> {
  if ([bar, round, shs, rhs, pipe].filter((section) => section !== null).length !== 1)
    return wrong('Give one section: a bar, round, square or rectangular hollow section, or pipe.');
  if (round !== null) return right(solidRound(round.valueOf()));
  const [a = 0, b = 0, c = 0] = (bar ?? shs ?? rhs ?? pipe ?? []).map((size) => size.valueOf());
  if (bar !== null) return right(solidBar(a, b));
  if (shs !== null) return hollowSection(a, a, b);
  return rhs === null ? roundTube(a, b) : hollowSection(a, b, c);
}

function compute(values: Values): Answer<Worked<BeamResult>> {
  const found = sectionOf(values);
  if (!found.ok) return found;
  const { inertia, height } = found.value;
  const [span, load] = [values.span.valueOf(), values.load.valueOf()];
  const [modulus, limit] = [values.modulus.valueOf() / 1e6, values.yield.valueOf() / 1e6];
  if (span < LEAST_SLENDERNESS * height)
    return wrong(
      `Span: it has to be at least ten times the height, ${formatNumber(LEAST_SLENDERNESS * height)} mm; a shorter beam is outside this method.`,
    );
  const bent = bend(values.case, load, span, found.value, modulus);
  if (bent.stress > limit)
    return wrong(
      `The stress comes to ${formatNumber(bent.stress, 4)} N/mm², above the yield of ${formatNumber(limit, 4)}: the formulas do not hold there.`,
    );
  if (bent.deflection > MOST_DEFLECTION * span)
    return wrong('It bends by more than a tenth of its span: the formulas do not hold there.');
  const { momentFormula, deflectionFormula } = BEAM_COEFFICIENTS[values.case];
  const show = formatNumber;
  const modulusMm3 = inertia / (height / 2);
  return right({
    result: {
      momentNm: bent.momentNmm / 1000,
      stressNPerMm2: bent.stress,
      deflectionMm: bent.deflection,
      spanOverDeflection: span / bent.deflection,
      shearN: bent.shear,
      inertiaMm4: inertia,
      sectionModulusMm3: modulusMm3,
    },
    working: [
      {
        what: 'Moment',
        formula: momentFormula,
        numbers: `F ${show(load)} N, L ${show(span)} mm`,
        value: `${show(bent.momentNmm / 1000)} N·m`,
      },
      {
        what: 'Stress in the outer fibre',
        formula: 'σ = M / Z, Z = 2 I / h',
        numbers: `${show(bent.momentNmm)} N·mm / ${show(modulusMm3)} mm³`,
        value: `${show(bent.stress)} N/mm²`,
      },
      {
        what: 'Deflection',
        formula: deflectionFormula,
        numbers: `F ${show(load)} N, L ${show(span)} mm, E ${show(modulus)} N/mm², I ${show(inertia)} mm⁴`,
        value: `${show(bent.deflection)} mm`,
      },
    ],
    sources: [
      { title: 'Machinery’s Handbook', clause: 'beam stresses and deflections', standing: 'memory' },
      { title: 'EN 10219-2', clause: 'annex B, section properties', standing: 'memory' },
      { title: 'EN 1993-1-1; EN 10025-2', clause: '3.2.6; table 7', standing: 'memory' },
    ],
    limits: [
      'Straight, of one section, at least ten heights long; elastic; deflections up to a tenth of the span.',
      'Held on two supports that let it turn, or built in at one end that does not give. The load is still.',
      'The beam’s own weight is not in the load.',
    ],
    notChecked: [
      'Tipping or twisting sideways, buckling of thin walls, crushing at the supports.',
      'Welds, bolts, holes, notches, fatigue and shock.',
      'What carries the beam.',
    ],
    warnings: [],
    cautions: ['load', 'lifting'],
  });
}

/** Stress and deflection of a simple beam or cantilever, with the limits of the method. */
export const beamWorksheet = worksheet({ id: 'beam', title: 'Simple beam', inputs, compute });
