import Fraction from 'fraction.js';
import { MILLIMETRES } from '../lengths/length.ts';

/** What is measured, besides lengths. Each is computed in one unit: the first named here. */
export type QuantityKind =
  | 'pressure' // Pa
  | 'flow' // L/min
  | 'force' // N
  | 'power' // W
  | 'mass' // kg
  | 'turning' // rev/min
  | 'cutting' // m/min
  | 'density' // kg/m3
  | 'stress' // Pa
  | 'angle' // degrees
  | 'voltage' // V
  | 'current'; // A

/** A unit: how it is written, and what one of it is in the unit that its kind is computed in. */
interface Unit {
  /** As written after a number; the first is how it is shown. */
  readonly words: readonly string[];
  readonly factor: Fraction;
}

const exact = (value: string | number) => new Fraction(value);

/** 1 lb = 0.45359237 kg exactly: international yard and pound agreement of 1959; NIST SP 811, appendix B. */
const POUND = exact('0.45359237');
/** Standard gravity, 9.80665 m/s2 exactly: third CGPM, 1901; NIST SP 811, appendix B. */
export const GRAVITY = exact('9.80665');
const POUND_FORCE = POUND.mul(GRAVITY);
const INCH_IN_METRES = MILLIMETRES.in.div(1000);
/** 1 psi in Pa: a pound-force on a square inch. */
const PSI = POUND_FORCE.div(INCH_IN_METRES.pow(2) ?? 1);
/** 1 US gallon = 231 cubic inches = 3.785411784 L exactly: NIST Handbook 44, appendix C. */
const US_GALLON = exact('3.785411784');
/** 1 imperial gallon = 4.54609 L exactly: UK Units of Measurement Regulations 1995; NIST SP 811, appendix B. */
const IMPERIAL_GALLON = exact('4.54609');
/** Mechanical horsepower, 550 ft lbf/s: NIST SP 811, appendix B. */
const HORSEPOWER = POUND_FORCE.mul(MILLIMETRES.ft.div(1000)).mul(550);
/** Metric horsepower, 75 kgf m/s: NIST SP 811, appendix B. */
const METRIC_HORSEPOWER = GRAVITY.mul(75);
/** Short ton 2000 lb, long ton 2240 lb: NIST Handbook 44, appendix C. A bare "ton" is none of them. */
const SHORT_TON = POUND.mul(2000);
const LONG_TON = POUND.mul(2240);

const unit = (factor: Fraction | number, ...words: string[]): Unit => ({
  words,
  factor: exact(1).mul(factor),
});

const PRESSURES = [
  unit(1, 'Pa'),
  unit(1000, 'kPa'),
  unit(1_000_000, 'MPa', 'N/mm2', 'N/mm²'),
  unit(1_000_000_000, 'GPa'),
  unit(100_000, 'bar'),
  unit(PSI, 'psi', 'lbf/in2', 'lb/in2'),
  unit(PSI.mul(1000), 'ksi'),
];

const UNITS: Readonly<Record<QuantityKind, readonly Unit[]>> = {
  pressure: PRESSURES,
  stress: PRESSURES,
  flow: [
    unit(1, 'L/min', 'l/min', 'lpm', 'LPM', 'litres/min', 'liters/min'),
    unit(US_GALLON, 'gpm', 'GPM', 'US gpm', 'gal/min'),
    unit(IMPERIAL_GALLON, 'imp gpm', 'imperial gpm'),
    unit(exact(1).div(1000), 'cm3/min', 'cc/min'),
  ],
  force: [
    unit(1, 'N'),
    unit(1000, 'kN'),
    unit(POUND_FORCE, 'lbf', 'lb', 'lbs'),
    unit(POUND_FORCE.mul(1000), 'kip', 'kips'),
    unit(GRAVITY, 'kgf', 'kg'),
    unit(GRAVITY.mul(1000), 'tf', 'tonnes', 'tonne', 'tonne-force'),
    unit(SHORT_TON.mul(GRAVITY), 'short tons', 'short ton', 'US tons', 'US ton'),
    unit(LONG_TON.mul(GRAVITY), 'long tons', 'long ton', 'UK tons', 'UK ton'),
  ],
  power: [
    unit(1, 'W'),
    unit(1000, 'kW'),
    unit(HORSEPOWER, 'hp', 'HP'),
    unit(METRIC_HORSEPOWER, 'PS', 'metric hp'),
  ],
  mass: [
    unit(1, 'kg'),
    unit(exact(1).div(1000), 'g'),
    unit(POUND, 'lb', 'lbs'),
    unit(1000, 't', 'tonnes', 'tonne'),
    unit(SHORT_TON, 'short tons', 'short ton'),
    unit(LONG_TON, 'long tons', 'long ton'),
  ],
  turning: [unit(1, 'rpm', 'RPM', 'rev/min', '/min', '1/min')],
  cutting: [unit(1, 'm/min'), unit(MILLIMETRES.ft.div(1000), 'ft/min', 'sfm', 'SFM', 'fpm'), unit(60, 'm/s')],
  density: [
    unit(1, 'kg/m3', 'kg/m³'),
    unit(1000, 'g/cm3', 'g/cm³', 'kg/dm3'),
    unit(POUND.div(INCH_IN_METRES.pow(3) ?? 1), 'lb/in3', 'lb/in³'),
  ],
  angle: [unit(1, 'deg', '°', 'degrees')],
  voltage: [unit(1, 'V', 'volts', 'volt')],
  current: [unit(1, 'A', 'amps', 'amp')],
};

/** A quantity as it was given. */
export interface Quantity {
  readonly kind: QuantityKind;
  /** In the unit that its kind is computed in, exactly. */
  readonly value: Fraction;
  readonly typed: string;
}

/** The factor of a unit, into the unit that its kind is computed in; null for a word that is none. */
export function unitFactor(kind: QuantityKind, word: string): Fraction | null {
  return UNITS[kind].find(({ words }) => words.includes(word))?.factor ?? null;
}

/** How the units of a kind are written, for a sentence. */
export function unitNames(kind: QuantityKind): string {
  const names = UNITS[kind].map(({ words }) => words[0] ?? '');
  return names.length === 1 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} or ${names.at(-1) ?? ''}`;
}

/** A value in one of its units, as a number. @throws RangeError for a unit of something else */
export function inUnit(value: Fraction | number, kind: QuantityKind, word: string): number {
  const factor = unitFactor(kind, word);
  if (factor === null) throw new RangeError(`${word} is no unit of ${kind}.`);
  return typeof value === 'number' ? value / factor.valueOf() : value.div(factor).valueOf();
}
