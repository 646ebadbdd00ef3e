/** What stands behind a word: nothing, a comma or the like, or the end of a sentence. */
export type Stop = '' | ',' | '.';

/** A spoken word. */
export interface Word {
  /** In lower case, without punctuation; a hyphenated word is several. */
  readonly text: string;
  /** Its caption, counted from 0 in the order they were given. */
  readonly cue: number;
  /** Characters of the caption's lines joined by line feeds. */
  readonly from: number;
  readonly to: number;
  /** Seconds. */
  readonly start: number;
  readonly end: number;
  readonly stop: Stop;
  /** Joined to the word before, as in A-2 and 3/8-16. */
  readonly glued: boolean;
  /** An amount of money, as in $20. */
  readonly money: boolean;
}

/** Captions as one stretch of speech. */
export interface Speech {
  readonly words: readonly Word[];
  /** The same as plain text, for grammars. */
  readonly texts: readonly string[];
  /** The words with one space between them. */
  readonly text: string;
  /** Where each word stands in the text. */
  readonly offsets: readonly number[];
}

/** A word's text; empty before the first and after the last. */
export function wordAt(speech: Speech, index: number): string {
  return speech.texts[index] ?? '';
}

/** The words from one up to, not including, another, kept inside the speech. */
export function phrase(speech: Speech, from: number, to: number): string {
  const first = Math.max(0, from);
  const last = Math.min(speech.words.length, to) - 1;
  const end = speech.words[last];
  if (last < first || end === undefined) return '';
  return speech.text.slice(speech.offsets[first], (speech.offsets[last] ?? 0) + end.text.length);
}

/** The words before one, back to the end of the sentence before it. */
export function before(speech: Speech, index: number, most: number): string {
  let from = index;
  while (from > 0 && index - from < most && speech.words[from - 1]?.stop !== '.') from--;
  return phrase(speech, from, index);
}

/** The words from one on, up to the end of its sentence. */
export function after(speech: Speech, index: number, most: number): string {
  if (speech.words[index - 1]?.stop === '.') return '';
  let to = index;
  while (to < speech.words.length && to - index < most) {
    to++;
    if (speech.words[to - 1]?.stop === '.') break;
  }
  return phrase(speech, index, to);
}

/** The word that stands at a place of the text. */
export function wordOfOffset(speech: Speech, offset: number): number {
  let low = 0;
  let high = speech.offsets.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((speech.offsets[middle] ?? 0) <= offset) low = middle;
    else high = middle - 1;
  }
  return low;
}
