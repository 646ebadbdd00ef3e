const IRREGULAR: Readonly<Record<string, string>> = {
  feet: 'foot',
  teeth: 'tooth',
  knives: 'knife',
  shelves: 'shelf',
  halves: 'half',
  leaves: 'leaf',
  axes: 'axe',
  dice: 'die',
  men: 'man',
};
/** Two spellings of one word. */
const SPELLINGS: readonly (readonly [RegExp, string])[] = [
  [/^(.*)centre$/, '$1center'],
  [/^(.*)mould(.*)$/, '$1mold$2'],
  [/^tyre$/, 'tire'],
  [/^gage$/, 'gauge'],
  [/^adaptor$/, 'adapter'],
  [/^aluminium$/, 'aluminum'],
  [/^grey$/, 'gray'],
  [/^mitre$/, 'miter'],
  [/^kerb$/, 'curb'],
  [/^(.*)our$/, '$1or'],
  [/^(.*[aeiou])ll(ing|ed|er)$/, '$1l$2'],
  [/^(.*[^aeiou])re$/, '$1er'],
];

/** A word in one number and one spelling: bearings, knives, levelling and centre become bearing, knife, leveling and center. */
export function stem(word: string): string {
  const bare = word.replace(/'s?$/, '').replace(/[^\p{L}\p{N}]/gu, '');
  const single = singular(bare);
  for (const [pattern, to] of SPELLINGS) if (pattern.test(single)) return single.replace(pattern, to);
  return single;
}

/** Whether a word stands in the plural. */
export function isPlural(word: string): boolean {
  const bare = word.replace(/'s?$/, '');
  return singular(bare) !== bare;
}

function singular(word: string): string {
  const irregular = IRREGULAR[word];
  if (irregular !== undefined) return irregular;
  if (word.length < 4 || !word.endsWith('s') || /(?:ss|us|is)$/.test(word)) return word;
  if (word.endsWith('ies') && word.length > 4) return `${word.slice(0, -3)}y`;
  if (/(?:ss|sh|ch|x|zz)es$/.test(word)) return word.slice(0, -2);
  return word.slice(0, -1);
}
