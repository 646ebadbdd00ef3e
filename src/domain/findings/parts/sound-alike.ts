import { doubleMetaphone } from 'double-metaphone';
import { distance } from 'fastest-levenshtein';

/** How a word sounds, in consonants: L. Philips, double metaphone. */
export function phonetic(word: string): string {
  return doubleMetaphone(word)[0];
}

/** Whether two words may sound the same: gib and jib. */
export function soundsLike(one: string, other: string): boolean {
  const sounds = doubleMetaphone(other);
  return doubleMetaphone(one).some((sound) => sounds.includes(sound));
}

/** How alike two words are written, from 0 to 1: one less the edits over the longer length. */
export function likeness(one: string, other: string): number {
  return 1 - distance(one, other) / Math.max(one.length, other.length, 1);
}

/** How far apart two sounds are, in consonants. */
export function soundDistance(one: string, other: string): number {
  return distance(one, other);
}
