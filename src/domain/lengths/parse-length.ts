import { type Answer, right, wrong } from '../answer.ts';
import { type Length, type LengthUnit } from './length.ts';
import { readSizes } from './read-sizes.ts';

/** The longest text of a size, in characters. */
export const LENGTH_TEXT_LENGTH = 80;

const SHOW_HOW = 'Write it as 38.1 mm, 1-1/2 in or 3\'-4".';

/**
 * The lengths that a text says, all of it: 38.1 mm, 1-1/2", 3 ft 4 in, 40 thou, 40 x 40 x 3 mm.
 * @param defaultUnit what a number without a unit is; without it a unit has to be there
 * @returns one length or several, in the order typed
 */
export function parseLengths(text: string, defaultUnit?: LengthUnit): Answer<readonly Length[]> {
  const typed = text.trim();
  if (typed === '') return wrong(`Write a size. ${SHOW_HOW}`);
  if (typed.length > LENGTH_TEXT_LENGTH)
    return wrong(`A size takes at most ${String(LENGTH_TEXT_LENGTH)} characters.`);
  if (/^[-−]/.test(typed)) return wrong('A length is not below zero.');
  if (/\d\s*mils?$/i.test(typed)) return wrong('Write mm or thou: mil means one here and the other there.');
  const read = readSizes(typed.replace(/\.$/, ''), 0, defaultUnit === undefined ? {} : { defaultUnit });
  if (read !== null && read.end >= typed.replace(/\.$/, '').length) return right(read.values);
  const bare = defaultUnit === undefined && /^[\d.,\s/x×-]+$/.test(typed);
  return wrong(bare ? `${typed} has no unit. ${SHOW_HOW}` : `${typed} is no size. ${SHOW_HOW}`);
}

/** One length; what is said of parseLengths holds here too. */
export function parseLength(text: string, defaultUnit?: LengthUnit): Answer<Length> {
  const read = parseLengths(text, defaultUnit);
  if (!read.ok) return read;
  const [length, ...more] = read.value;
  if (length === undefined || more.length > 0) return wrong(`${text.trim()} is more than one size.`);
  return right(length);
}
