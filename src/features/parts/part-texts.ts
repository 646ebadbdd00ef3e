import { PART_KINDS } from '../../domain/part-kinds.ts';
import { PART_FIELDS, type PartField, type PartFields, PartInput } from './part.ts';

/** A part as it is typed and shown: a text a column. */
export type PartTexts = Readonly<Record<PartField, string>>;

export const EMPTY_TEXTS: PartTexts = {
  number: '',
  name: '',
  kind: '',
  quantity: '',
  material: '',
  size: '',
  aliases: '',
  inPlans: '',
  remark: '',
};

/** What a part's columns say. */
export function textsOf(part: PartFields): PartTexts {
  const { number, name, kind, material, size, remark } = part;
  return {
    number,
    name,
    kind,
    material,
    size,
    remark,
    quantity: String(part.quantity),
    aliases: part.aliases.join('; '),
    inPlans: part.inPlans ? 'yes' : 'no',
  };
}

/** A row that is begun: the columns that have a usual value say it. */
export const NEW_TEXTS: PartTexts = { ...EMPTY_TEXTS, kind: 'made', quantity: '1', inPlans: 'yes' };

export type ReadPart =
  | { readonly ok: true; readonly value: PartFields }
  | { readonly ok: false; readonly errors: Readonly<Partial<Record<PartField, string>>> };

/** Reads a row that was typed: the part, or a sentence a column. */
export function readPart(texts: Partial<PartTexts>): ReadPart {
  const parsed = PartInput.safeParse(texts);
  if (parsed.success) return { ok: true, value: parsed.data };
  const errors: Partial<Record<PartField, string>> = {};
  for (const { path, message } of parsed.error.issues) {
    const field = PART_FIELDS.find((one) => one === path[0]);
    if (field !== undefined) errors[field] ??= message;
  }
  return { ok: false, errors };
}

/**
 * The text of a cell in its usual form, when it can be read: `b` becomes `bought`.
 * @returns what was typed, when it cannot be read
 */
export function usualText(field: PartField, typed: string): string {
  const parsed = PartInput.shape[field].safeParse(typed);
  if (!parsed.success) return typed;
  const { data } = parsed;
  if (Array.isArray(data)) return data.join('; ');
  if (typeof data === 'boolean') return data ? 'yes' : 'no';
  return String(data);
}

/** How many parts there are: "34 parts: 20 made, 14 bought". */
export function sayCounts(kinds: readonly string[]): string {
  const counts = PART_KINDS.map((kind) => ({ kind, count: kinds.filter((one) => one === kind).length }));
  const some = counts.filter(({ count }) => count > 0).map(({ kind, count }) => `${String(count)} ${kind}`);
  const all = kinds.length === 1 ? '1 part' : `${String(kinds.length)} parts`;
  return some.length === 0 ? all : `${all}: ${some.join(', ')}`;
}
