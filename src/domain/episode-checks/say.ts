const SMALL = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** A count with its noun: no chapters, one note, five parts, 13 parts. */
export function sayCount(count: number, one: string, many = `${one}s`): string {
  return `${SMALL[count] ?? String(count)} ${count === 1 ? one : many}`;
}

/** Words one after another: A; A and B; A, B and C. */
export function sayList(words: readonly string[]): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} and ${last}`;
}

/** With a capital, for the start of a sentence. */
export function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
