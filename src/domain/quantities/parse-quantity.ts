import { type Answer, right, wrong } from '../answer.ts';
import { readNumber } from '../lengths/read-number.ts';
import { type Quantity, type QuantityKind, unitFactor, unitNames } from './quantity.ts';

/** The longest text of a quantity, in characters. */
const QUANTITY_TEXT_LENGTH = 60;

/**
 * A quantity other than a length, as a maker types it: 165 bar, 2400 psi, 11 gpm, 1-1/2 hp.
 * @param defaultUnit what a bare number is in; without it a unit has to be there
 */
export function parseQuantity(text: string, kind: QuantityKind, defaultUnit?: string): Answer<Quantity> {
  const typed = text.trim();
  if (typed === '') return wrong(`Write a ${kind}, with its unit: ${unitNames(kind)}.`);
  if (typed.length > QUANTITY_TEXT_LENGTH)
    return wrong(`A ${kind} takes at most ${String(QUANTITY_TEXT_LENGTH)} characters.`);
  if (/^[-−]/.test(typed)) return wrong(`A ${kind} is not below zero.`);
  const number = readNumber(typed, 0);
  if (number === null)
    return wrong(`${typed} is no ${kind}. Write a number with its unit: ${unitNames(kind)}.`);
  const word = typed.slice(number.end).trim();
  if (/^tons?$/i.test(word))
    return wrong(`${typed} could be short tons (2000 lb), long tons (2240 lb) or tonnes. Say which.`);
  const factor = unitFactor(kind, word === '' ? (defaultUnit ?? '') : word);
  if (factor !== null) return right({ kind, value: number.value.mul(factor), typed });
  return wrong(
    word === ''
      ? `${typed} has no unit. A ${kind} is in ${unitNames(kind)}.`
      : `${typed} is no ${kind}. A ${kind} is in ${unitNames(kind)}.`,
  );
}
