import type Fraction from 'fraction.js';
import { type Deviations } from './iso-286.ts';

/** What one division of the cross slide's dial means on this lathe. */
export type DialReads = 'diameter' | 'radius';

/** What a measurement says, and what is still to come off. Millimetres. */
export interface TakeOff {
  readonly verdict: 'inside' | 'outside' | 'can’t tell with this';
  /** The size to aim at: the middle of the limits. */
  readonly aim: number;
  /** Still to come off on diameter to reach the aim; below zero when it is past the aim. */
  readonly onDiameter: number;
  /** The same as the dial shows it. */
  readonly onDial: number;
  /** Past its last limit: nothing that is taken off makes it right. */
  readonly pastLimit: boolean;
}

interface Measured {
  readonly of: 'hole' | 'shaft';
  /** Nominal and measured size, mm. */
  readonly nominal: Fraction;
  readonly measured: Fraction;
  /** How far the instrument may be off either way, mm. */
  readonly instrument: Fraction;
  readonly deviations: Deviations;
  readonly dial: DialReads;
}

/**
 * Whether a measured size is within its limits, as far as the instrument can say, and what is still to come off.
 * Exactly at a limit is inside: ISO 286-1, 3.2. The uncertainty counts against both verdicts: ISO 14253-1, 5.
 */
export function takeOff({ of, nominal, measured, instrument, deviations, dial }: Measured): TakeOff {
  const [least, most] = [deviations.lower, deviations.upper].map((um) => nominal.add(um / 1000)) as [
    Fraction,
    Fraction,
  ];
  const [low, high] = [measured.sub(instrument), measured.add(instrument)];
  const aim = least.add(most).div(2);
  const left = of === 'shaft' ? measured.sub(aim) : aim.sub(measured);
  const outside = high.lt(least) || low.gt(most);
  const inside = low.gte(least) && high.lte(most);
  return {
    verdict: inside ? 'inside' : outside ? 'outside' : 'can’t tell with this',
    aim: aim.valueOf(),
    onDiameter: left.valueOf(),
    onDial: (dial === 'radius' ? left.div(2) : left).valueOf(),
    pastLimit: of === 'shaft' ? high.lt(least) : low.gt(most),
  };
}
