import { PART_FIELDS, type PartField } from './part.ts';

/** Which column of a list, counted from 0, holds what; a field that the list does not have is left out. */
export type ColumnChoice = Readonly<Partial<Record<PartField, number>>>;

/** What lists call their columns, in small letters without punctuation. */
const HEADER_WORDS: Readonly<Record<PartField, readonly string[]>> = {
  number: [
    'number',
    'no',
    'nr',
    'part',
    'part no',
    'part number',
    'item',
    'item no',
    'pos',
    'position',
    'id',
  ],
  name: ['name', 'part name', 'title', 'description', 'designation', 'what'],
  kind: ['kind', 'made or bought', 'make or buy', 'type', 'how'],
  quantity: ['quantity', 'qty', 'needed', 'count', 'pcs', 'pieces', 'amount', 'number needed', 'how many'],
  material: ['material', 'stock', 'grade', 'section'],
  size: ['size', 'dimensions', 'dimension', 'cut size', 'length'],
  aliases: ['aliases', 'alias', 'other names', 'other name', 'also called'],
  inPlans: ['in the plans', 'in plans', 'inplans', 'plans'],
  remark: ['remark', 'remarks', 'note', 'notes', 'comment', 'comments'],
};

function plainHeader(text: string): string {
  return text
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Matches columns by what their heads say. Each column goes to one field only. */
export function matchColumns(heads: readonly string[]): ColumnChoice {
  const plain = heads.map(plainHeader);
  const taken = new Set<number>();
  const choice: Partial<Record<PartField, number>> = {};
  for (const field of PART_FIELDS) {
    for (const word of HEADER_WORDS[field]) {
      const at = plain.findIndex((head, index) => head === word && !taken.has(index));
      if (at === -1) continue;
      taken.add(at);
      choice[field] = at;
      break;
    }
  }
  return choice;
}

/** Whether a list's first row names its columns. */
export function looksHeaded(first: readonly string[]): boolean {
  const known = Object.values(HEADER_WORDS).flat();
  return first.some((cell) => known.includes(plainHeader(cell)));
}

/** What to suggest for a list whose first row names nothing: number and name come first in most. */
export function usualColumns(width: number): ColumnChoice {
  return width > 1 ? { number: 0, name: 1 } : { number: 0 };
}
