import { type ListedPart } from '../finding.ts';
import { phonetic } from './sound-alike.ts';
import { stem } from './stem.ts';

/** A name or alias of a part. */
export interface ListedName {
  readonly part: string;
  readonly stems: readonly string[];
  /** The stems written together, so that compounds match however they are cut. */
  readonly key: string;
  readonly sound: string;
}

/** The names of a parts list, found by what is heard. */
export interface NameIndex {
  readonly byKey: ReadonlyMap<string, ListedName>;
  readonly bySound: ReadonlyMap<string, readonly ListedName[]>;
  /** Names of several words, by each of their words. */
  readonly byWord: ReadonlyMap<string, readonly ListedName[]>;
  /** Names of one word that are long enough to be known from near them, by their first sound. */
  readonly single: ReadonlyMap<string, readonly ListedName[]>;
  /** The words of each part's names. */
  readonly wordsOf: ReadonlyMap<string, ReadonlySet<string>>;
  /** The most words a name has as it may be cut. */
  readonly longest: number;
}

/** The names and aliases of a parts list; where two parts share one, it is the first part's. */
export function indexNames(parts: readonly ListedPart[]): NameIndex {
  const byKey = new Map<string, ListedName>();
  const bySound = new Map<string, ListedName[]>();
  const byWord = new Map<string, ListedName[]>();
  const single = new Map<string, ListedName[]>();
  const wordsOf = new Map<string, Set<string>>();
  let longest = 1;
  for (const { number, name, aliases } of parts)
    for (const written of [name, ...aliases]) {
      const stems = written
        .normalize('NFC')
        .toLowerCase()
        .replaceAll('’', "'")
        .split(/[^\p{L}\p{N}']+/u)
        .map(stem)
        .filter((word) => word !== '');
      const own = wordsOf.get(number) ?? new Set();
      wordsOf.set(number, own);
      for (const word of stems) if (word.length >= 4) own.add(word);
      const key = stems.join('');
      if (key === '' || byKey.has(key)) continue;
      const listed: ListedName = { part: number, stems, key, sound: phonetic(key) };
      byKey.set(key, listed);
      push(bySound, listed.sound, listed);
      if (stems.length > 1) for (const word of new Set(stems)) push(byWord, word, listed);
      else if (key.length >= 5) push(single, listed.sound.slice(0, 1), listed);
      longest = Math.max(longest, stems.length);
    }
  // A word of a name may be heard as two.
  return { byKey, bySound, byWord, single, wordsOf, longest: longest + 2 };
}

function push(map: Map<string, ListedName[]>, key: string, name: ListedName): void {
  const list = map.get(key);
  if (list === undefined) map.set(key, [name]);
  else list.push(name);
}
