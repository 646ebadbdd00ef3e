import { formatInches, formatMillimetres } from '../lengths/format-length.ts';
import { parseLength, parseLengths } from '../lengths/parse-length.ts';
import { type Length, type LengthUnit, systemOf } from '../lengths/length.ts';
import { toShopFraction } from '../lengths/shop-fraction.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { parseQuantity } from '../quantities/parse-quantity.ts';
import { inUnit, type QuantityKind } from '../quantities/quantity.ts';

/** The units that a quantity is read back in: one of either system where both are in use. */
const SHOWN_UNITS: Readonly<Record<QuantityKind, readonly string[]>> = {
  pressure: ['bar', 'psi'],
  flow: ['L/min', 'gpm'],
  force: ['kN', 'lbf'],
  power: ['kW', 'hp'],
  mass: ['kg', 'lb'],
  turning: ['rpm'],
  cutting: ['m/min', 'ft/min'],
  density: ['kg/m3', 'lb/in3'],
  stress: ['MPa', 'psi'],
  angle: ['deg'],
  voltage: ['V'],
  current: ['A'],
};

/** The nearest mark of an inch rule, with how far it is off; nothing for a length that lies on it, given in inches. */
function sayMark(length: Length): string {
  const { text, errorMm } = toShopFraction(length);
  const off = Number(errorMm);
  if (off === 0)
    return systemOf(length.unit) === 'in' && length.decimals === null ? '' : `${text} in exactly`;
  return `${text} in is ${formatNumber(Math.abs(off), 2)} mm ${off > 0 ? 'more' : 'less'}`;
}

function say(length: Length): string {
  const inches = length.decimals === null ? formatInches(length) : formatInches({ ...length, decimals: 3 });
  return [formatMillimetres(length), inches, sayMark(length)].filter((piece) => piece !== '').join(' · ');
}

/** A length as it was read, in both systems, with the nearest 1/64 in and what that is off by; null for none. */
export function sayLength(text: string, unit: LengthUnit): string | null {
  const read = parseLength(text, unit);
  return read.ok ? say(read.value) : null;
}

/** Lengths that stand together, in both systems. */
export function sayLengths(text: string): string | null {
  const read = parseLengths(text, 'mm');
  if (!read.ok) return null;
  const [mm, inch] = [read.value.map(formatMillimetres), read.value.map(formatInches)].map((forms) =>
    forms.map((form, at) => (at < forms.length - 1 ? form.replace(/ (?:mm|in)$/, '') : form)).join(' × '),
  );
  return [mm, inch].join(' · ');
}

/** A quantity as it was read, in the units of both systems; null for none. */
export function sayQuantity(text: string, kind: QuantityKind, defaultUnit?: string): string | null {
  const read = parseQuantity(text, kind, defaultUnit);
  if (!read.ok) return null;
  return SHOWN_UNITS[kind]
    .map((unit) => `${formatNumber(inUnit(read.value.value, kind, unit))} ${unit}`)
    .join(' · ');
}
