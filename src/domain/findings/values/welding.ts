import { readBelowHundred, readSpokenNumber } from '../numbers/spoken-number.ts';

/** A filler by its name. */
export interface SpokenFiller {
  readonly what: 'electrode' | 'wire';
  readonly name: string;
  readonly to: number;
}

/** Covered electrodes for carbon and low-alloy steel: AWS A5.1 and A5.5. */
const ELECTRODES: ReadonlySet<string> = new Set(
  '6010 6011 6012 6013 6019 6022 6027 7014 7015 7016 7018 7024 7028 7048 8010 8018 9018 10018 11018'.split(
    ' ',
  ),
);
/** Stainless electrodes: AWS A5.4. */
const STAINLESS: ReadonlySet<string> = new Set('307 308 309 310 312 316 347'.split(' '));
const LAST: Readonly<Record<string, string>> = { tens: 'ten', elevens: 'eleven', twelves: 'twelve' };

/** The electrode or wire whose name begins at a word: seventy eighteens, 60 13, ER70S-6. */
export function readFiller(words: readonly string[], at: number): SpokenFiller | null {
  return readSolidWire(words, at) ?? readElectrode(words, at);
}

function readElectrode(words: readonly string[], at: number): SpokenFiller | null {
  const lettered = words[at] === 'e';
  const from = lettered ? at + 1 : at;
  const digits = readDigits(words, from);
  if (digits === null) return null;
  const [number, to] = digits;
  if (ELECTRODES.has(number)) return { what: 'electrode', name: `E${number}`, to };
  if (!STAINLESS.has(number)) return null;
  const low = words[to] === 'l' || /^\d+l$/.test(words[from] ?? '');
  const behind = words[low ? to + 1 : to] ?? '';
  if (!/^(?:rods?|electrodes?|sticks?)$/.test(behind) && !(lettered && low)) return null;
  return {
    what: 'electrode',
    name: `E${number}${low ? 'L' : ''}`,
    to: low && words[to] === 'l' ? to + 1 : to,
  };
}

/** Four digits, or five, however they are said. */
function readDigits(words: readonly string[], at: number): [number: string, to: number] | null {
  const word = words[at] ?? '';
  const whole = /^e?(\d{3,5})(?:l|s|-\d)?$/.exec(word)?.[1];
  if (whole !== undefined) return [whole, at + 1];
  const rest = words.slice(at, at + 5).map((one) => LAST[one] ?? one.replace(/^(.*teen|\d\d)'?s$/, '$1'));
  const [left, right] = rest;
  if (/^\d\d$/.test(left ?? '') && /^\d\d$/.test(right ?? '')) return [`${left ?? ''}${right ?? ''}`, at + 2];
  const first = readBelowHundred(rest, 0);
  if (first === null) return null;
  const number = readSpokenNumber(rest, 0);
  if (number === null || (number.form !== 'pair' && number.form !== 'spelled')) return null;
  return [number.value.toString(), at + number.to];
}

/** Solid wire for steel: AWS A5.18. */
function readSolidWire(words: readonly string[], at: number): SpokenFiller | null {
  const next = words.slice(at, at + 6).join(' ');
  const found =
    /^(?:er ?70 ?s|e r (?:70|seventy) s|er (?:70|seventy) ?s|(?:70|seventy) s) ?(2|3|6|two|three|six)(?= |$)/.exec(
      next,
    );
  if (found === null) return null;
  const digit = { two: '2', three: '3', six: '6' }[found[1] ?? ''] ?? found[1] ?? '6';
  return { what: 'wire', name: `ER70S-${digit}`, to: at + found[0].split(' ').length };
}
