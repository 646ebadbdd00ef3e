import { SMALL, TENS_WORDS, ZEROS } from '../numbers/number-words.ts';
import { readWhole } from '../numbers/spoken-number.ts';
import { type ListedPart } from '../finding.ts';

/** How a part number was said, as far as it matters for how likely it is meant. */
export interface CodeManner {
  /** The weakest of its letters: written, spelled by a name that is no other word, by one that is, or an article. */
  readonly letters: 'none' | 'written' | 'named' | 'word' | 'article';
  /** The weakest of its digits: a numeral, read out as a code, one plain number, a cardinal, a word that sounds so. */
  readonly digits: 'none' | 'numeral' | 'read-out' | 'plain' | 'hundreds' | 'sounds';
}

/** A part number in the words. */
export interface SpokenCode extends CodeManner {
  readonly part: string;
  readonly from: number;
  readonly to: number;
  /** Without the zeros that the list has: "k three" for K03. */
  readonly short: boolean;
}

/** Part numbers as they are said, by all their beginnings. */
export interface CodeIndex {
  readonly codes: ReadonlyMap<string, { readonly part: string; readonly short: boolean }>;
  readonly beginnings: ReadonlySet<string>;
}

/** Letters by names that are hardly anything else, and by words that are. The spelling alphabet of ICAO is among the first. */
const NAMED: Readonly<Record<string, string>> = {
  bee: 'B',
  dee: 'D',
  eff: 'F',
  ef: 'F',
  gee: 'G',
  aitch: 'H',
  haitch: 'H',
  jay: 'J',
  kay: 'K',
  cay: 'K',
  ell: 'L',
  el: 'L',
  em: 'M',
  en: 'N',
  pee: 'P',
  ess: 'S',
  vee: 'V',
  ex: 'X',
  wye: 'Y',
  zed: 'Z',
  zee: 'Z',
  tee: 'T',
  kayo: 'KO',
  cue: 'Q',
  queue: 'Q',
  alpha: 'A',
  bravo: 'B',
  charlie: 'C',
  delta: 'D',
  echo: 'E',
  foxtrot: 'F',
  golf: 'G',
  hotel: 'H',
  juliet: 'J',
  kilo: 'K',
  lima: 'L',
  mike: 'M',
  november: 'N',
  oscar: 'O',
  papa: 'P',
  quebec: 'Q',
  romeo: 'R',
  sierra: 'S',
  tango: 'T',
  uniform: 'U',
  victor: 'V',
  whiskey: 'W',
  yankee: 'Y',
  zulu: 'Z',
};
const SOUNDING: Readonly<Record<string, string>> = {
  be: 'B',
  see: 'C',
  sea: 'C',
  hey: 'A',
  eh: 'A',
  ay: 'A',
  are: 'R',
  you: 'U',
  ewe: 'U',
  why: 'Y',
  eye: 'I',
  tea: 'T',
  pea: 'P',
  okay: 'K',
  ok: 'K',
  oh: 'O',
  before: 'B4',
  benign: 'B9',
};
const SOUNDING_DIGITS: Readonly<Record<string, string>> = {
  to: '2',
  too: '2',
  for: '4',
  fore: '4',
  won: '1',
  ate: '8',
  tree: '3',
  free: '3',
  sex: '6',
  sicks: '6',
  fife: '5',
  niner: '9',
  sen: '7',
};
const SEPARATORS: ReadonlySet<string> = new Set([
  'dash',
  'hyphen',
  'minus',
  'slash',
  'stroke',
  'point',
  'dot',
  'tack',
]);

/** The numbers of a parts list as they may be said. */
export function indexCodes(parts: readonly ListedPart[]): CodeIndex {
  const codes = new Map<string, { part: string; short: boolean }>();
  for (const { number } of parts)
    if (!codes.has(plain(number))) codes.set(plain(number), { part: number, short: false });
  for (const { number } of parts) {
    const short = plain(number).replace(/(^|\D)0+(?=\d)/g, '$1');
    if (!codes.has(short)) codes.set(short, { part: number, short: true });
  }
  const beginnings = new Set<string>();
  for (const code of codes.keys())
    for (let length = 1; length <= code.length; length++) beginnings.add(code.slice(0, length));
  codes.delete('');
  return { codes, beginnings };
}

function plain(number: string): string {
  return number
    .normalize('NFC')
    .toUpperCase()
    .replace(/[^\p{L}\p{N}]/gu, '');
}

/** Whether a part number may begin with a word; most words are settled here. */
function mayBegin(word: string): boolean {
  return (
    word.length === 1 ||
    /\d/.test(word) ||
    SMALL.has(word) ||
    TENS_WORDS.has(word) ||
    ZEROS.has(word) ||
    word in NAMED ||
    word in SOUNDING ||
    word === 'double' ||
    word === 'triple'
  );
}

interface State {
  readonly code: string;
  readonly to: number;
  readonly manner: CodeManner;
}

const LETTER_ORDER: readonly CodeManner['letters'][] = ['none', 'written', 'named', 'word', 'article'];
const DIGIT_ORDER: readonly CodeManner['digits'][] = [
  'none',
  'numeral',
  'read-out',
  'plain',
  'hundreds',
  'sounds',
];

/** The longest part number that begins at a word; the surest way of reading it. */
export function readCode(
  words: readonly string[],
  at: number,
  index: CodeIndex,
  glued: (index: number) => boolean,
): SpokenCode | null {
  if (!mayBegin(words[at] ?? '')) return null;
  let best: SpokenCode | null = null;
  let states: State[] = [{ code: '', to: at, manner: { letters: 'none', digits: 'none' } }];
  // Each step takes a word or more; no part number is longer than its 24 characters.
  for (let step = 0; step < 24 && states.length > 0; step++) {
    const next: State[] = [];
    for (const state of states)
      for (const grown of grow(words, state, glued)) {
        if (!index.beginnings.has(grown.code)) continue;
        next.push(grown);
        const listed = index.codes.get(grown.code);
        if (listed !== undefined && better(grown, best))
          best = { ...listed, ...manner(grown), from: at, to: grown.to };
      }
    states = next.slice(0, 16);
  }
  return best;
}

function manner({ manner: { letters, digits }, code }: State): CodeManner {
  // A single number word is plain; several digits one by one are read out.
  return {
    letters,
    digits: digits === 'plain' && letters === 'none' && code.length > 2 ? 'read-out' : digits,
  };
}

function better(grown: State, best: SpokenCode | null): boolean {
  return best === null || grown.to > best.to;
}

function grow(
  words: readonly string[],
  { code, to, manner: so }: State,
  glued: (index: number) => boolean,
): State[] {
  const word = words[to] ?? '';
  const lettered = /[A-Z]$/.test(code);
  const grown: State[] = [];
  const add = (
    text: string,
    length: number,
    letters: CodeManner['letters'],
    digits: CodeManner['digits'],
  ) => {
    grown.push({
      code: code + text,
      to: to + length,
      manner: {
        letters: weakest(LETTER_ORDER, so.letters, letters),
        digits: weakest(DIGIT_ORDER, so.digits, digits),
      },
    });
  };
  if (word === '') return grown;
  if (code !== '' && SEPARATORS.has(word)) {
    // An article has no dash behind it.
    const dashed = so.letters === 'article' && /^(?:dash|hyphen|stroke|slash)$/.test(word);
    const spoken = dashed ? { ...so, letters: 'written' as const } : so;
    return grow(words, { code, to: to + 1, manner: spoken }, glued);
  }
  if (/^\d+$/.test(word)) add(word, 1, 'none', 'numeral');
  else if (/^\p{L}{1,3}\d[\p{L}\d]*$/u.test(word)) add(word.toUpperCase(), 1, 'written', 'numeral');
  else if (/^\d+\p{L}$/u.test(word)) add(word.toUpperCase(), 1, 'written', 'numeral');
  else if (/^\p{L}$/u.test(word) && !ZEROS.has(word)) {
    const article = word === 'a' || word === 'i';
    add(word.toUpperCase(), 1, article && !glued(to + 1) ? 'article' : 'written', 'none');
  }
  const named = NAMED[word];
  if (named !== undefined) {
    add(named, 1, 'named', 'none');
    if (named === 'KO') add('K0', 1, 'named', 'read-out');
  }
  const sounding = SOUNDING[word];
  if (sounding !== undefined && (code === '' || word === 'oh')) add(sounding, 1, 'word', 'none');
  if (word === 'double' && words[to + 1] === 'you') add('W', 2, 'named', 'none');
  addDigits(words, to, code === '', lettered, add);
  return grown;
}

function addDigits(
  words: readonly string[],
  to: number,
  begins: boolean,
  lettered: boolean,
  add: (text: string, length: number, letters: CodeManner['letters'], digits: CodeManner['digits']) => void,
): void {
  const word = words[to] ?? '';
  if (ZEROS.has(word)) add('0', 1, 'none', 'read-out');
  const times = word === 'double' ? 2 : word === 'triple' ? 3 : 0;
  const repeated =
    times === 0
      ? undefined
      : (SMALL.get(words[to + 1] ?? '') ?? (ZEROS.has(words[to + 1] ?? '') ? 0 : undefined));
  if (repeated !== undefined && repeated < 10) add(String(repeated).repeat(times), 2, 'none', 'read-out');
  const small = SMALL.get(word);
  if (small !== undefined && word !== 'zero') add(String(small), 1, 'none', 'plain');
  const tens = TENS_WORDS.get(word);
  if (tens !== undefined) {
    const one = SMALL.get(words[to + 1] ?? '') ?? 0;
    if (one > 0 && one < 10) add(String(tens + one), 2, 'none', 'plain');
    add(String(tens), 1, 'none', 'plain');
  }
  if (lettered && SOUNDING_DIGITS[word] !== undefined) add(SOUNDING_DIGITS[word], 1, 'none', 'sounds');
  if (!begins && !lettered) return;
  const whole = small !== undefined || word === 'a' ? readWhole(words, to) : null;
  if (whole !== null && whole.form === 'cardinal' && whole.value.compare(100) >= 0)
    add(whole.value.toString(), whole.to - to, 'none', 'hundreds');
}

function weakest<Manner>(order: readonly Manner[], one: Manner, other: Manner): Manner {
  return order.indexOf(one) >= order.indexOf(other) ? one : other;
}
