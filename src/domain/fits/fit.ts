import { type Deviations } from './iso-286.ts';

/** What a hole and a shaft give together. Clearance is above zero, interference below, µm. */
export interface Fit {
  readonly least: number;
  readonly most: number;
  /** ISO 286-1, 3.3: by the limits, never by what a batch is likely to give. */
  readonly kind: 'clearance' | 'transition' | 'interference';
}

/** The clearances between a hole and a shaft of one nominal size: hole minus shaft, worst against worst. */
export function fitOf(hole: Deviations, shaft: Deviations): Fit {
  const [least, most] = [hole.lower - shaft.upper, hole.upper - shaft.lower];
  if (least >= 0) return { least, most, kind: 'clearance' };
  return { least, most, kind: most <= 0 ? 'interference' : 'transition' };
}
