import { diffArrays } from 'diff';

/** A word of the one text that stands for a word of the other, both counted from 0. */
export interface WordPair {
  readonly a: number;
  readonly b: number;
}

/** Words in a row that pin two texts together where each has them once. Our own: three are often a figure of speech. */
const SHINGLE = 4;
/** Words inserted and deleted up to which what lies between two pins is compared; beyond, it counts as rewritten. */
const MOST_EDITS = 1000;

/**
 * The words that two texts share in the same order. Rows of words that each has once pin them together; what lies
 * between is compared by Myers's algorithm, whose time would grow with the square of what differs over a whole episode.
 */
export function matchWords(a: readonly string[], b: readonly string[]): WordPair[] {
  const pairs: WordPair[] = [];
  let done: WordPair = { a: 0, b: 0 };
  for (const pin of [...longestRising(sharedOnce(a, b)), { a: a.length, b: b.length }]) {
    pairs.push(...compareBetween(a, b, done, pin));
    if (pin.a < a.length) pairs.push(pin);
    done = { a: pin.a + 1, b: pin.b + 1 };
  }
  return pairs;
}

function compareBetween(
  a: readonly string[],
  b: readonly string[],
  from: WordPair,
  to: WordPair,
): WordPair[] {
  if (from.a >= to.a || from.b >= to.b) return [];
  const changes = diffArrays(a.slice(from.a, to.a), b.slice(from.b, to.b), { maxEditLength: MOST_EDITS });
  const pairs: WordPair[] = [];
  let [atA, atB] = [from.a, from.b];
  for (const { count, added, removed } of changes ?? []) {
    if (!added && !removed)
      for (let index = 0; index < count; index++) pairs.push({ a: atA + index, b: atB + index });
    if (!added) atA += count;
    if (!removed) atB += count;
  }
  return pairs;
}

/** Where rows of words begin that stand once in each text, in the order of the first. */
function sharedOnce(a: readonly string[], b: readonly string[]): WordPair[] {
  const inB = standOnce(b);
  return [...standOnce(a)].flatMap(([row, at]) => {
    const other = inB.get(row) ?? -1;
    return at === -1 || other === -1 ? [] : [{ a: at, b: other }];
  });
}

/** Where each row of words stands; -1 for one that stands more than once. */
function standOnce(words: readonly string[]): Map<string, number> {
  const rows = new Map<string, number>();
  for (let at = 0; at + SHINGLE <= words.length; at++) {
    const row = words.slice(at, at + SHINGLE).join(' ');
    rows.set(row, rows.has(row) ? -1 : at);
  }
  return rows;
}

/** The most pairs that rise in both texts, of some that rise in the first. */
function longestRising(pairs: readonly WordPair[]): WordPair[] {
  // Of the chains of each length, the one that ends lowest, as links back from its end.
  interface Link {
    readonly pair: WordPair;
    readonly before: Link | undefined;
  }
  const ends: Link[] = [];
  for (const pair of pairs) {
    let [low, high] = [0, ends.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((ends[middle]?.pair.b ?? 0) < pair.b) low = middle + 1;
      else high = middle;
    }
    ends[low] = { pair, before: ends[low - 1] };
  }
  const chain: WordPair[] = [];
  for (let link = ends.at(-1); link !== undefined; link = link.before) chain.push(link.pair);
  return chain.reverse();
}
