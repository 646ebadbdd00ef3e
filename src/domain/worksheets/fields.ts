import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { inMillimetres, type Length, type LengthUnit } from '../lengths/length.ts';
import { parseLength, parseLengths } from '../lengths/parse-length.ts';
import { readNumber } from '../lengths/read-number.ts';
import { parseQuantity } from '../quantities/parse-quantity.ts';
import { type QuantityKind } from '../quantities/quantity.ts';
import { sayLength, sayLengths, sayQuantity } from './read-back.ts';
import { type Field } from './worksheet.ts';

/** The longest length that a worksheet takes: a kilometre. */
const LONGEST_MM = new Fraction(1_000_000);

/** What was given as text; a number as it is written. Null for nothing, and for what is neither. */
function asText(given: unknown): string | null {
  if (typeof given === 'number' && Number.isFinite(given)) return String(given);
  return typeof given === 'string' && given.trim() !== '' ? given : null;
}

function reader<Value>(example: string, read: (text: string) => Answer<Value>) {
  return (given: unknown): Answer<Value> => {
    const text = asText(given);
    return text === null ? wrong(`Give it, such as ${example}.`) : read(text);
  };
}

interface LengthOptions {
  readonly unit?: LengthUnit;
  readonly zero?: boolean;
}

/** A length as it was typed, above zero and at most a kilometre. */
export function lengthTextField(
  label: string,
  example: string,
  { unit = 'mm', zero = false }: LengthOptions = {},
): Field<Length> {
  return {
    label,
    example,
    readBack: (text) => sayLength(text, unit),
    read: reader(example, (text) => {
      const read = parseLength(text, unit);
      if (!read.ok) return read;
      const mm = inMillimetres(read.value);
      if (mm.lte(0) && !(zero && mm.equals(0))) return wrong('It has to be above zero.');
      return mm.gt(LONGEST_MM) ? wrong('It is longer than a kilometre.') : read;
    }),
  };
}

/** Millimetres, exactly, of a length above zero and at most a kilometre. */
export function lengthField(label: string, example: string, options?: LengthOptions): Field<Fraction> {
  const field = lengthTextField(label, example, options);
  return {
    ...field,
    read: (given) => {
      const read = field.read(given);
      return read.ok ? right(inMillimetres(read.value)) : read;
    },
  };
}

/** Several lengths that stand together, such as 50x12: so many as are asked for, in millimetres. */
export function sizesField(label: string, example: string, count: number): Field<readonly Fraction[]> {
  return {
    label,
    example,
    readBack: sayLengths,
    read: reader(example, (text) => {
      const read = parseLengths(text, 'mm');
      if (!read.ok) return read;
      const sizes = read.value.map(inMillimetres);
      if (sizes.length !== count) return wrong(`Write ${String(count)} sizes, such as ${example}.`);
      if (sizes.some((mm) => mm.lte(0) || mm.gt(LONGEST_MM)))
        return wrong('A size is above zero and at most a kilometre.');
      return right(sizes);
    }),
  };
}

/** A quantity above zero, in the unit that its kind is computed in, exactly. */
export function quantityField(
  label: string,
  example: string,
  kind: QuantityKind,
  defaultUnit?: string,
): Field<Fraction> {
  return {
    label,
    example,
    readBack: (text) => sayQuantity(text, kind, defaultUnit),
    read: reader(example, (text) => {
      const read = parseQuantity(text, kind, defaultUnit);
      if (!read.ok) return read;
      return read.value.value.lte(0) ? wrong('It has to be above zero.') : right(read.value.value);
    }),
  };
}

/** A bare number between limits, which are part of it. */
export function numberField(label: string, example: string, least: number, most: number): Field<Fraction> {
  return {
    label,
    example,
    read: reader(example, (text) => {
      const typed = text.trim();
      const number = readNumber(typed, 0);
      if (number?.end !== typed.length)
        return wrong(`${typed.slice(0, 40)} is no number, such as ${example}.`);
      if (number.value.lt(least) || number.value.gt(most))
        return wrong(`It has to be from ${String(least)} to ${String(most)}.`);
      return right(number.value);
    }),
  };
}

/** One of a few words. */
export function choiceField<const Choice extends string>(
  label: string,
  choices: readonly [Choice, ...Choice[]],
): Field<Choice> {
  const known = choices.join(', ');
  return {
    label,
    example: choices[0],
    choices,
    read: (given) => {
      const found = choices.find((choice) => choice === given);
      return found === undefined ? wrong(`Choose one of ${known}.`) : right(found);
    },
  };
}

/** Text as it is, trimmed and short. */
export function textField(label: string, example: string): Field<string> {
  return {
    label,
    example,
    read: reader(example, (text) =>
      text.trim().length > 200 ? wrong('It takes at most 200 characters.') : right(text.trim()),
    ),
  };
}

/** A yes or no; nothing is no. */
export function flagField(label: string): Field<boolean> {
  return {
    label,
    example: 'yes',
    flag: true,
    read: (given) => {
      if (given === undefined || given === false) return right(false);
      return given === true ? right(true) : wrong('It is true or false.');
    },
  };
}

/** A field that may be left out, and then is null. */
export function optional<Value>(field: Field<Value>): Field<Value | null> {
  return {
    ...field,
    optional: true,
    read: (given) =>
      given === undefined || given === null || given === '' ? right(null) : field.read(given),
  };
}

/** A field that has a value when it is left out. @param said the value as a maker reads it */
export function withDefault<Value>(field: Field<Value>, value: NoInfer<Value>, said: string): Field<Value> {
  return {
    ...field,
    optional: true,
    otherwise: said,
    read: (given) =>
      given === undefined || given === null || given === '' ? right(value) : field.read(given),
  };
}
