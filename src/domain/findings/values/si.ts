import Fraction from 'fraction.js';
import { type Dialect } from '../finding.ts';

const exact = (value: string | number) => new Fraction(value);
/** 1 in = 25.4 mm, 1 lb = 0.45359237 kg: yard and pound agreement of 1959. Standard gravity: third CGPM, 1901. NIST SP 811. */
const INCH = exact('0.0254');
const POUND = exact('0.45359237');
const GRAVITY = exact('9.80665');
const FOOT = INCH.mul(12);
/** 231 cubic inches: NIST Handbook 44, appendix C. */
const US_GALLON = INCH.pow(3)?.mul(231) ?? exact(0);
const POUND_FORCE = POUND.mul(GRAVITY);
const PSI = POUND_FORCE.div(INCH.pow(2) ?? 1);
/** Mechanical horsepower, 550 ft lbf/s: NIST SP 811, appendix B. */
const HORSEPOWER = POUND_FORCE.mul(FOOT).mul(550);

/** What one of each unit is in its SI unit, exactly. An angle stays in degrees, which SI accepts. */
const UNITS: Readonly<Record<string, readonly [factor: Fraction, unit: string]>> = {
  mm: [exact('0.001'), 'm'],
  cm: [exact('0.01'), 'm'],
  m: [exact(1), 'm'],
  um: [exact('0.000001'), 'm'],
  in: [INCH, 'm'],
  ft: [FOOT, 'm'],
  thou: [INCH.div(1000), 'm'],
  deg: [exact(1), 'deg'],
  A: [exact(1), 'A'],
  V: [exact(1), 'V'],
  rpm: [exact(1).div(60), '1/s'],
  'm/min': [exact(1).div(60), 'm/s'],
  'mm/rev': [exact('0.001'), 'm'],
  Nm: [exact(1), 'N m'],
  'ft-lb': [POUND_FORCE.mul(FOOT), 'N m'],
  s: [exact(1), 's'],
  min: [exact(60), 's'],
  h: [exact(3600), 's'],
  W: [exact(1), 'W'],
  kW: [exact(1000), 'W'],
  hp: [HORSEPOWER, 'W'],
  bar: [exact(100_000), 'Pa'],
  psi: [PSI, 'Pa'],
  MPa: [exact(1_000_000), 'Pa'],
  'L/min': [exact(1).div(60_000), 'm3/s'],
  gpm: [US_GALLON.div(60), 'm3/s'],
  N: [exact(1), 'N'],
  kN: [exact(1000), 'N'],
  lb: [POUND, 'kg'],
  kg: [exact(1), 'kg'],
  L: [exact('0.001'), 'm3'],
  gal: [US_GALLON, 'm3'],
  cc: [exact('0.000001'), 'm3'],
};

/** A ton of force in newtons: 1000 kg, 2000 lb or 2240 lb under standard gravity. NIST Handbook 44, appendix C. */
const TONS: Readonly<Record<NonNullable<Dialect['ton']>, Fraction>> = {
  tonne: GRAVITY.mul(1000),
  short: POUND_FORCE.mul(2000),
  long: POUND_FORCE.mul(2240),
};

/** A value in the SI unit of its kind, exactly; null for a unit that has none. */
export function inSi(
  value: Fraction,
  unit: string,
  dialect: Dialect,
): { value: Fraction; unit: string } | null {
  if (unit === 't') return { value: value.mul(TONS[dialect.ton ?? 'tonne']), unit: 'N' };
  if (unit === 'C') return { value: value.add('273.15'), unit: 'K' };
  if (unit === 'F') return { value: value.sub(32).mul(5).div(9).add('273.15'), unit: 'K' };
  const known = UNITS[unit];
  return known === undefined ? null : { value: value.mul(known[0]), unit: known[1] };
}
