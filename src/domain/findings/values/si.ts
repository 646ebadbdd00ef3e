import Fraction from 'fraction.js';
import { type LengthUnit, MILLIMETRES } from '../../lengths/length.ts';
import { type QuantityKind, unitFactor } from '../../quantities/quantity.ts';
import { type Dialect } from '../finding.ts';

const exact = (value: string | number) => new Fraction(value);
const metres = (unit: LengthUnit) => MILLIMETRES[unit].div(1000);

/** What one of a unit is in the unit that its kind is computed in; the authorities stand there. */
function factorOf(kind: QuantityKind, word: string): Fraction {
  const factor = unitFactor(kind, word);
  if (factor === null) throw new RangeError(`${word} is no unit of ${kind}.`);
  return factor;
}

/** A US gallon a minute is computed in litres a minute. */
const GALLON_IN_LITRES = factorOf('flow', 'gpm');

/** What one of each unit is in its SI unit, exactly. An angle stays in degrees, which SI accepts. */
const UNITS: Readonly<Record<string, readonly [factor: Fraction, unit: string]>> = {
  mm: [metres('mm'), 'm'],
  cm: [metres('cm'), 'm'],
  m: [metres('m'), 'm'],
  um: [metres('um'), 'm'],
  in: [metres('in'), 'm'],
  ft: [metres('ft'), 'm'],
  thou: [metres('thou'), 'm'],
  deg: [exact(1), 'deg'],
  A: [exact(1), 'A'],
  V: [exact(1), 'V'],
  rpm: [exact(1).div(60), '1/s'],
  'm/min': [exact(1).div(60), 'm/s'],
  'mm/rev': [metres('mm'), 'm'],
  Nm: [exact(1), 'N m'],
  'ft-lb': [factorOf('force', 'lbf').mul(metres('ft')), 'N m'],
  s: [exact(1), 's'],
  min: [exact(60), 's'],
  h: [exact(3600), 's'],
  W: [exact(1), 'W'],
  kW: [exact(1000), 'W'],
  hp: [factorOf('power', 'hp'), 'W'],
  bar: [factorOf('pressure', 'bar'), 'Pa'],
  psi: [factorOf('pressure', 'psi'), 'Pa'],
  MPa: [factorOf('pressure', 'MPa'), 'Pa'],
  'L/min': [exact(1).div(60_000), 'm3/s'],
  gpm: [GALLON_IN_LITRES.div(60_000), 'm3/s'],
  N: [exact(1), 'N'],
  kN: [exact(1000), 'N'],
  lb: [factorOf('mass', 'lb'), 'kg'],
  kg: [exact(1), 'kg'],
  L: [exact('0.001'), 'm3'],
  gal: [GALLON_IN_LITRES.div(1000), 'm3'],
  cc: [exact('0.000001'), 'm3'],
};

/** A ton of force in newtons. */
const TONS: Readonly<Record<NonNullable<Dialect['ton']>, Fraction>> = {
  tonne: factorOf('force', 'tonnes'),
  short: factorOf('force', 'short tons'),
  long: factorOf('force', 'long tons'),
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
