import { type BeamSection } from './beam-section.ts';

/** The cases that are computed: how the beam is held, and where the load stands. */
export const BEAM_CASES = [
  'simple-centre',
  'simple-uniform',
  'cantilever-end',
  'cantilever-uniform',
] as const;
export type BeamCase = (typeof BEAM_CASES)[number];

interface Coefficients {
  /** M = m F L. */
  readonly moment: number;
  /** δ = d F L³ / (E I). */
  readonly deflection: number;
  /** Greatest shear = v F. */
  readonly shear: number;
  readonly momentFormula: string;
  readonly deflectionFormula: string;
}

/** The whole load F of each case, spread or not: tables of beams, such as Machinery's Handbook, Beam stresses. */
export const BEAM_COEFFICIENTS: Readonly<Record<BeamCase, Coefficients>> = {
  'simple-centre': {
    moment: 1 / 4,
    deflection: 1 / 48,
    shear: 1 / 2,
    momentFormula: 'M = F L / 4',
    deflectionFormula: 'δ = F L³ / (48 E I)',
  },
  'simple-uniform': {
    moment: 1 / 8,
    deflection: 5 / 384,
    shear: 1 / 2,
    momentFormula: 'M = F L / 8',
    deflectionFormula: 'δ = 5 F L³ / (384 E I)',
  },
  'cantilever-end': {
    moment: 1,
    deflection: 1 / 3,
    shear: 1,
    momentFormula: 'M = F L',
    deflectionFormula: 'δ = F L³ / (3 E I)',
  },
  'cantilever-uniform': {
    moment: 1 / 2,
    deflection: 1 / 8,
    shear: 1,
    momentFormula: 'M = F L / 2',
    deflectionFormula: 'δ = F L³ / (8 E I)',
  },
};

export interface Bent {
  readonly momentNmm: number;
  readonly stress: number;
  readonly deflection: number;
  readonly shear: number;
}

/** Moment, stress in the outer fibre, deflection and shear. N and mm. @param modulus N/mm2 */
export function bend(
  which: BeamCase,
  load: number,
  span: number,
  section: BeamSection,
  modulus: number,
): Bent {
  const { moment, deflection, shear } = BEAM_COEFFICIENTS[which];
  const momentNmm = moment * load * span;
  return {
    momentNmm,
    stress: (momentNmm * section.height) / 2 / section.inertia,
    deflection: (deflection * load * span ** 3) / (modulus * section.inertia),
    shear: shear * load,
  };
}
