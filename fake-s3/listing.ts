/** One line of a listing: an object, or all objects that share a prefix up to the delimiter. */
export type ListingEntry = { readonly key: string } | { readonly commonPrefix: string };

export type ListingQuery = {
  readonly prefix: string;
  /** Empty for none. */
  readonly delimiter: string;
  /** Only keys after this one. */
  readonly after: string;
  /** Whether `after` is a common prefix already listed, and so everything under it is done. */
  readonly afterIsPrefix: boolean;
  readonly max: number;
};

/** A page of the listing of sorted keys; `truncated` when more follow its last entry. */
export function listKeys(
  keys: readonly string[],
  query: ListingQuery,
): { entries: ListingEntry[]; truncated: boolean } {
  const { prefix, delimiter, after, afterIsPrefix, max } = query;
  const entries: ListingEntry[] = [];
  if (max === 0) return { entries, truncated: false };
  let lastPrefix = afterIsPrefix ? after : undefined;
  const from = compareUtf8(prefix, after) > 0 ? prefix : after;
  for (let index = firstAtLeast(keys, from); index < keys.length; index++) {
    const key = keys[index] as string;
    if (!key.startsWith(prefix)) break;
    if (after !== '' && compareUtf8(key, after) <= 0) continue;
    if (lastPrefix !== undefined && key.startsWith(lastPrefix)) continue;
    const end = delimiter === '' ? -1 : key.indexOf(delimiter, prefix.length);
    if (entries.length === max) return { entries, truncated: true };
    if (end < 0) entries.push({ key });
    else {
      lastPrefix = key.slice(0, end + delimiter.length);
      entries.push({ commonPrefix: lastPrefix });
    }
  }
  return { entries, truncated: false };
}

function firstAtLeast(keys: readonly string[], bound: string): number {
  let low = 0;
  let high = keys.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (compareUtf8(keys[middle] as string, bound) < 0) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Order of two texts by their UTF-8 bytes. JavaScript's own order differs for characters past U+FFFF. */
export function compareUtf8(a: string, b: string): number {
  const length = Math.min(a.length, b.length);
  for (let index = 0; index < length; index++) {
    const unitA = a.charCodeAt(index);
    const unitB = b.charCodeAt(index);
    if (unitA !== unitB) return rank(unitA) - rank(unitB);
  }
  return a.length - b.length;
}

/** Surrogates stand for characters that come after all others. */
function rank(unit: number): number {
  return unit >= 0xd800 && unit <= 0xdfff ? unit + 0x10000 : unit;
}
