import Fraction from 'fraction.js';
import { readFraction, readSpokenNumber } from '../numbers/spoken-number.ts';

/** A thread by its name. */
export interface SpokenThread {
  readonly name: string;
  readonly to: number;
}

type Words = readonly string[];

/** Coarse and fine threads by size in inches: ASME B1.1, tables of the UNC and UNF series. */
const COARSE: Readonly<Record<string, number>> = {
  '1/4': 20,
  '5/16': 18,
  '3/8': 16,
  '7/16': 14,
  '1/2': 13,
  '9/16': 12,
  '5/8': 11,
  '3/4': 10,
  '7/8': 9,
  '1': 8,
  '1 1/8': 7,
  '1 1/4': 7,
  '1 1/2': 6,
  '4': 40,
  '5': 40,
  '6': 32,
  '8': 32,
  '10': 24,
  '12': 24,
};
const FINE: Readonly<Record<string, number>> = {
  '1/4': 28,
  '5/16': 24,
  '3/8': 24,
  '7/16': 20,
  '1/2': 20,
  '9/16': 18,
  '5/8': 18,
  '3/4': 16,
  '7/8': 14,
  '1': 12,
  '4': 48,
  '6': 40,
  '8': 36,
  '10': 32,
};
/** Metric sizes that are made: ISO 262. */
const METRIC: ReadonlySet<string> = new Set(
  '2 2.5 3 4 5 6 7 8 10 12 14 16 18 20 22 24 27 30 33 36 39 42 48 52 56 64'.split(' '),
);
/** What names a series or a pipe thread, and may be spelled out. */
const SERIES: readonly (readonly [spoken: RegExp, name: string])[] = [
  [/^(?:bsp[pt]?|b s p(?: [pt])?)(?= |$)/, 'G'],
  [/^(?:npt[f]?|n p t|pipe thread|tapered pipe|national pipe)(?= |$)/, 'NPT'],
  [/^(?:unc|u n c)(?= |$)/, 'UNC'],
  [/^(?:unf|u n f)(?= |$)/, 'UNF'],
  [/^(?:coarse)(?= |$)/, 'UNC'],
  [/^(?:fine thread)(?= |$)/, 'UNF'],
  [/^(?:jic|j i c)(?= |$)/, 'JIC'],
];
const BOLTED =
  /^(?:bolts?|screws?|threads?|threaded|taps?|tapped|holes?|nuts?|studs?|machine|cap|socket|button|hex|unc|unf|allthread)$/;

/** The thread whose name begins at a word: M10, three eighths BSP, half thirteen, ten thirty-two screws. */
export function readThread(words: Words, at: number): SpokenThread | null {
  return readMetric(words, at) ?? readPort(words, at) ?? readInch(words, at) ?? readNumbered(words, at);
}

function readMetric(words: Words, at: number): SpokenThread | null {
  const word = words[at] ?? '';
  const written = /^m(\d+)s?$/.exec(word)?.[1];
  let size = written ?? null;
  let to = at + 1;
  if (size === null && (word === 'm' || word === 'em')) {
    const number = readSpokenNumber(singular(words, at + 1), 0);
    if (number === null) return null;
    size = number.value.toString();
    to = at + 1 + number.to;
  }
  if (size === null || !METRIC.has(size)) return null;
  const joint = words[to] === 'by' ? readSpokenNumber(words, to + 1) : null;
  if (joint?.form === 'decimal' && joint.value.compare(5) < 0)
    return { name: `M${size}x${joint.value.toString()}`, to: joint.to };
  if (joint?.value.equals(1) === true) return { name: `M${size}x1`, to: joint.to };
  return { name: `M${size}`, to };
}

/** A size in inches: a fraction, a mixed number, or "one inch"; recognisers write 3.8 for 3/8. */
function readSize(words: Words, at: number): { size: string; to: number } | null {
  const inch =
    words[at] === 'inch' || ((words[at] === 'a' || words[at] === 'an') && words[at + 1] === 'inch');
  const begins = inch && words[at] !== 'inch' ? at + 1 : at;
  if (inch) {
    const more = words[begins + 1] === 'and' ? readFraction(words, begins + 2) : null;
    const value = new Fraction(1).add(more?.value ?? 0);
    return { size: value.toFraction(true), to: more?.to ?? begins + 1 };
  }
  const number = readFraction(words, at) ?? readSpokenNumber(words, at);
  if (number === null || number.value.compare(4) > 0 || number.value.compare(0) <= 0) return null;
  const written = fractionWritten(words[at] ?? '') ?? number.value;
  let to = number.to;
  if (words[to] === 'of') return null;
  if (words[to] === 'inch' || words[to] === 'in') to++;
  return { size: written.toFraction(true), to };
}

/** 3.8 and 5.16 where only a fraction of an inch can be meant. Null for other texts. */
export function fractionWritten(word: string): Fraction | null {
  const [, top, bottom] = /^(\d{1,2})\.(2|4|8|16|32|64)$/.exec(word) ?? [];
  if (top === undefined || bottom === undefined || Number(top) % 2 === 0 || Number(top) >= Number(bottom))
    return null;
  return new Fraction(Number(top), Number(bottom));
}

/** Pipe threads and series by name. */
function readPort(words: Words, at: number): SpokenThread | null {
  if (words[at] === 'g') {
    const named = readSize(words, at + 1);
    return named === null || !named.size.includes('/') ? null : { name: `G ${named.size}`, to: named.to };
  }
  const size = readSize(words, at);
  if (size === null) return null;
  const behind = words.slice(size.to, size.to + 4).join(' ');
  const series = SERIES.find(([spoken]) => spoken.test(behind));
  if (series === undefined) return null;
  const [spoken, name] = series;
  const to = size.to + (spoken.exec(behind)?.[0] ?? '').split(' ').length;
  if (name === 'G') return { name: `G ${size.size}`, to };
  if (name === 'NPT' || name === 'JIC') return { name: `${size.size} ${name}`, to };
  const pitch = (name === 'UNC' ? COARSE : FINE)[size.size];
  return pitch === undefined ? null : { name: `${size.size}-${String(pitch)} ${name}`, to };
}

/** Size and pitch: half thirteen, quarter twenty, 3/8-16. */
function readInch(words: Words, at: number): SpokenThread | null {
  const size = readSize(words, at);
  if (size === null || !(size.size.includes('/') || words[size.to - 1] === 'inch')) return null;
  return pitchedByName(words, size) ?? pitched(words, size.size, size.to);
}

/** Three eighths by ten threads per inch, ACME or not: ASME B1.5. */
function pitchedByName(words: Words, { size, to }: { size: string; to: number }): SpokenThread | null {
  const from = words[to] === 'by' ? to + 1 : to;
  const pitch = readSpokenNumber(words, from);
  if (pitch === null || pitch.form === 'fraction') return null;
  const behind = words.slice(pitch.to, pitch.to + 4).join(' ');
  const named = /^(?:tpi|t p i|threads per inch)(?= |$)/.exec(behind)?.[0] ?? '';
  const acme = behind.slice(named.length).trim().startsWith('acme');
  if (named === '' && !acme) return null;
  const end = pitch.to + (named === '' ? 0 : named.split(' ').length) + (acme ? 1 : 0);
  const turns = Number(pitch.value.valueOf());
  const series = acme ? ' ACME' : COARSE[size] === turns ? ' UNC' : FINE[size] === turns ? ' UNF' : '';
  return { name: `${size}-${String(turns)}${series}`, to: end };
}

function pitched(words: Words, size: string, at: number): SpokenThread | null {
  const rest = singular(words, at);
  const pitch = readSpokenNumber(rest, 0);
  if (pitch === null) return null;
  const series = pitch.value.equals(COARSE[size] ?? 0)
    ? 'UNC'
    : pitch.value.equals(FINE[size] ?? 0)
      ? 'UNF'
      : null;
  if (series === null) return null;
  let to = at + pitch.to;
  const named = words.slice(to, to + 3).join(' ');
  if (/^un[cf](?: |$)/.test(named)) to++;
  else if (/^u n [cf](?: |$)/.test(named)) to += 3;
  return { name: `${size}-${String(Number(pitch.value.valueOf()))} ${series}`, to };
}

/** Numbered screws, where something says that one is meant: ten thirty-two screws. */
function readNumbered(words: Words, at: number): SpokenThread | null {
  for (const [size, length] of numbered(words, at)) {
    const thread = pitched(words, size, at + length);
    if (thread === null) continue;
    const behind = words.slice(thread.to, thread.to + 3);
    const plural = /s$/.test(words[thread.to - 1] ?? '');
    if (plural || behind.some((word) => BOLTED.test(word)) || /^un[cf]$/.test(words[thread.to - 1] ?? ''))
      return thread;
  }
  return null;
}

const NUMBERED: Readonly<Record<string, string>> = {
  four: '4',
  six: '6',
  eight: '8',
  ten: '10',
  twelve: '12',
};

function numbered(words: Words, at: number): [size: string, length: number][] {
  const word = (words[at] ?? '').replace(/^#/, '');
  const size = NUMBERED[word] ?? (/^(?:4|6|8|10|12)$/.test(word) ? word : null);
  return size === null ? [] : [[size, 1]];
}

const PLURALS: Readonly<Record<string, string>> = { sixes: 'six', twenties: 'twenty', thirties: 'thirty' };

/** The next few words, number words among them in the singular: thirteens, eights. */
function singular(words: Words, at: number): string[] {
  return words
    .slice(at, at + 3)
    .map(
      (word) =>
        PLURALS[word] ??
        (/^(?:.*teen|ten|eleven|twelve|eight|nine|seven|four|five|three|two|one|\d+)'?s$/.test(word)
          ? word.replace(/'?s$/, '')
          : word),
    );
}
