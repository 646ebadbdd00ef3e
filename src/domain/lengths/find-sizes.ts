import { type Length } from './length.ts';
import { type Measure } from './read-measure.ts';
import { matchAt } from './read-number.ts';
import { readSizes, type SizeJoin, type SizesRead } from './read-sizes.ts';
import { isOpenQuote, readsAsInches, startsNumber } from './running-text.ts';
import { STOCK_AFTER, TRADE_NAMES } from './trade-names.ts';

/** A size in running text. */
export interface SizeFound {
  /** Where it stands, half-open, in the text's own UTF-16 units. */
  readonly start: number;
  readonly end: number;
  /** As typed: text.slice(start, end). */
  readonly typed: string;
  readonly values: readonly Length[];
  readonly join: SizeJoin | null;
}

interface Candidate {
  readonly start: number;
  readonly end: number;
  /** Null for a name, which keeps its place and is given to nobody. */
  readonly sizes: SizesRead | null;
}

/**
 * The written sizes in running text, in millimetres or inches, in order and without overlap. Names are left alone:
 * threads, ports, electrodes, gauges, bearings, fits, stock, and the part numbers given. Where two readings
 * overlap, the longer stands.
 * @param names the build's part numbers
 */
export function findSizes(
  text: string,
  { names = [] }: { readonly names?: readonly string[] } = {},
): SizeFound[] {
  const taken: Candidate[] = [];
  const candidates = [...findNames(text, names), ...findCandidates(text, new Set(names))];
  for (const candidate of candidates.sort((a, b) => b.end - b.start - (a.end - a.start) || a.start - b.start))
    if (taken.every(({ start, end }) => candidate.end <= start || end <= candidate.start))
      taken.push(candidate);
  return taken
    .sort((a, b) => a.start - b.start)
    .flatMap(({ sizes }) =>
      sizes === null
        ? []
        : {
            start: sizes.start,
            end: sizes.end,
            typed: text.slice(sizes.start, sizes.end),
            values: sizes.values,
            join: sizes.join,
          },
    );
}

function findNames(text: string, names: readonly string[]): Candidate[] {
  const own = names.filter((name) => name !== '').map((name) => name.replace(/[\\^$.*+?()[\]{}|]/g, '\\$&'));
  const parts =
    own.length === 0 ? [] : [new RegExp(`(?<![\\p{L}\\p{N}])(?:${own.join('|')})(?![\\p{L}\\p{N}])`, 'giu')];
  return [...TRADE_NAMES, ...parts].flatMap((pattern) =>
    [...text.matchAll(pattern)].map(({ index, 0: name }) => ({
      start: index,
      end: index + name.length,
      sizes: null,
    })),
  );
}

function findCandidates(text: string, names: ReadonlySet<string>): Candidate[] {
  const mayStand = (measure: Measure) => meansItself(text, measure, names);
  const mayBeBare = (typed: string) => !names.has(typed);
  const candidates: Candidate[] = [];
  for (const { index } of text.matchAll(/[\d.½¼¾⅛⅜⅝⅞]/g)) {
    if (!startsNumber(text, index)) continue;
    const sizes = readSizes(text, index, { mayStand, mayBeBare });
    if (sizes === null) continue;
    const stock = matchAt(STOCK_AFTER, text, sizes.end);
    const { start, end } = sizes;
    candidates.push(
      stock === null ? { start, end, sizes } : { start, end: end + stock[0].length, sizes: null },
    );
  }
  return candidates;
}

/** Whether a unit where it stands is one: not a preposition, and not the end of a quotation. */
function meansItself(
  text: string,
  { start, end, value, word }: Measure,
  names: ReadonlySet<string>,
): boolean {
  if (word === '"' || word === "'") return !isOpenQuote(text, end - 1, word);
  if (word.toLowerCase() !== 'in' || !/\s/.test(text.charAt(end - 3))) return true;
  const number = text.slice(start, end - 3);
  return !names.has(number) && readsAsInches(text.slice(end), value.d === 1n);
}
