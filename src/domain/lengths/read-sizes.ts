import { type Length, type LengthUnit, MILLIMETRES, systemOf } from './length.ts';
import { type Measure, readMeasure } from './read-measure.ts';
import { matchAt } from './read-number.ts';

/** How the values of one size hang together: 40 x 40, 35.002 to 35.018, 14 or 40, 40 ± 0.1. */
export type SizeJoin = 'by' | 'to' | 'or' | 'tolerance';

/** One or more lengths that stand together in a text and share a unit or have their own. */
export interface SizesRead {
  readonly start: number;
  readonly end: number;
  readonly values: readonly Length[];
  /** Null for a single value. */
  readonly join: SizeJoin | null;
}

const JOINS: readonly (readonly [SizeJoin, RegExp])[] = [
  ['by', /[ \u00a0]*[x×][ \u00a0]*|[ ]by[ ]/iy],
  ['to', /[ ]to[ ]|[ ]?[–—][ ]?|-(?=\d)/iy],
  ['or', /[ ]or[ ]/iy],
  ['tolerance', /[ ]?(?:±|\+\/-)[ ]?/y],
];

/** The most lengths that are read as one size: nothing has more sides, and a long row is read in little time. */
const MOST_TOGETHER = 6;

interface Chain {
  readonly measures: readonly Measure[];
  readonly join: SizeJoin | null;
}

export interface ReadSizesOptions {
  /** The unit of numbers without one. */
  readonly defaultUnit?: LengthUnit;
  /** Whether a measure means what it says where it stands; one that does not ends what hangs together. */
  readonly mayStand?: (measure: Measure) => boolean;
  /** Whether a number without a unit may be a member of a range or choice; part numbers may not. */
  readonly mayBeBare?: (typed: string) => boolean;
}

/** The sizes that begin at a place in a text, as many as hang together; null where none does. */
export function readSizes(text: string, at: number, options: ReadSizesOptions = {}): SizesRead | null {
  const chain = readChain(text, at, options);
  const { defaultUnit } = options;
  if (defaultUnit !== undefined) return toSizes(text, chain, defaultUnit);
  // What follows without a unit is no part of the size: in “40 mm x 3” the 3 is let go.
  const last = chain.measures.findLastIndex(({ unit }) => unit !== null);
  const measures = chain.measures.slice(0, last + 1);
  return toSizes(text, { measures, join: measures.length > 1 ? chain.join : null }, null);
}

function readChain(text: string, at: number, options: ReadSizesOptions): Chain {
  const { mayStand = () => true, mayBeBare = () => true } = options;
  const first = readMeasure(text, at);
  if (first === null || !mayStand(first)) return { measures: [], join: null };
  const measures = [first];
  let join: SizeJoin | null = null;
  for (;;) {
    const last = measures.at(-1) ?? first;
    const next = readNext(text, last.end, join);
    if (next === null || !mayStand(next.measure)) return { measures, join };
    const bare = last.unit === null && next.join !== 'by';
    if (bare && !mayBeBare(text.slice(last.start, last.end))) return { measures, join };
    join = next.join;
    measures.push(next.measure);
    if (join === 'tolerance' || measures.length === MOST_TOGETHER) return { measures, join };
  }
}

function readNext(
  text: string,
  end: number,
  join: SizeJoin | null,
): { readonly join: SizeJoin; readonly measure: Measure } | null {
  for (const [name, pattern] of JOINS) {
    if (join !== null && name !== join) continue;
    const found = matchAt(pattern, text, end);
    const measure = found === null ? null : readMeasure(text, end + found[0].length);
    if (measure !== null) return { join: name, measure };
  }
  return null;
}

/** Gives bare numbers the unit of the next that has one; null where that makes no sense. */
function toSizes(text: string, { measures, join }: Chain, defaultUnit: LengthUnit | null): SizesRead | null {
  const values: Length[] = [];
  let unit = defaultUnit;
  for (const measure of [...measures].reverse()) {
    unit = measure.unit ?? unit;
    if (unit === null || (measure.decimals === null && systemOf(unit) === 'mm')) return null;
    const { start, end, value, decimals } = measure;
    const mm = value.mul(MILLIMETRES[unit]).toString();
    values.unshift({ mm, unit, typed: text.slice(start, end), decimals });
  }
  const [first, last] = [measures[0], measures.at(-1)];
  if (first === undefined || last === undefined) return null;
  return { start: first.start, end: last.end, values, join };
}
