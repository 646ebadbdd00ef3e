import { comparePartNumbers, partNumberKey } from '../../../domain/part-numbers.ts';
import { MOST_CHANGES, type Part, PART_FIELDS, type PartChange } from '../part.ts';
import { type PartTexts, type ReadPart, readPart, textsOf } from '../part-texts.ts';
import {
  type CellErrors,
  formOf,
  same,
  storedRow,
  type TableRow,
  type TableState,
} from './parts-table-state.ts';

/** Texts are never changed in place, so each is read once. */
const readings = new WeakMap<PartTexts, ReadPart>();

function readOnce(texts: PartTexts): ReadPart {
  const known = readings.get(texts);
  if (known) return known;
  const read = readPart(texts);
  readings.set(texts, read);
  return read;
}

/** One object for all rows that are right: a row is drawn again when what it is given is another. */
const NO_ERRORS: CellErrors = {};

/** What is wrong with a row's cells: what cannot be read, numbers that stand twice, what the server said. */
export function errorsOf(row: TableRow, numbers: ReadonlyMap<string, number>): CellErrors {
  if (row.gone) return row.refused && same(row.refused, row) ? row.refused.errors : NO_ERRORS;
  const read = readOnce(row.texts);
  const twice = row.texts.number !== '' && (numbers.get(partNumberKey(row.texts.number)) ?? 0) > 1;
  const refused = row.refused && same(row.refused, row) ? row.refused.errors : NO_ERRORS;
  if (read.ok && !twice && refused === NO_ERRORS) return NO_ERRORS;
  return {
    ...(twice && { number: `Number ${row.texts.number} is in the list twice.` }),
    ...refused,
    ...(!read.ok && read.errors),
  };
}

/** How often each number stands in the list. */
export function countNumbers(rows: readonly TableRow[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const { gone, texts } of rows) {
    if (gone) continue;
    const key = partNumberKey(texts.number);
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return counts;
}

/** Whether a row is as it is stored. */
export function isStored(row: TableRow): boolean {
  if (row.stored === null) return row.gone;
  if (row.gone || row.stored.gone) return row.gone === row.stored.gone;
  const stored = textsOf(row.stored.part);
  return PART_FIELDS.every((field) => stored[field] === row.texts[field]);
}

/** The changes that would make what is stored like the table, of the rows that are in order. */
export function pendingChanges(state: TableState): PartChange[] {
  const numbers = countNumbers(state.rows);
  const changes = state.rows.flatMap((row): PartChange[] => {
    if (isStored(row) || row.conflict !== null) return [];
    if (Object.keys(errorsOf(row, numbers)).length > 0) return [];
    const { id, stored, gone } = row;
    if (gone) return stored ? [{ do: 'delete', id, version: stored.part.version }] : [];
    if (stored?.gone) return [{ do: 'restore', id, version: stored.part.version }];
    const read = readOnce(row.texts);
    if (!read.ok) return [];
    const fields = { ...read.value, aliases: [...read.value.aliases] };
    return stored
      ? [{ do: 'change', id, version: stored.part.version, fields }]
      : [{ do: 'add', id, fields }];
  });
  return changes.slice(0, MOST_CHANGES);
}

/** Notes that changes were saved. What was typed meanwhile stays. */
export function noteSaved(
  state: TableState,
  sent: readonly PartChange[],
  saved: readonly Part[],
): TableState {
  const parts = new Map(saved.map((part) => [part.id, part]));
  const sentBy = new Map(sent.map((change) => [change.id, change]));
  return {
    ...state,
    rows: state.rows.map((row) => {
      const change = sentBy.get(row.id);
      if (!change) return row;
      const part = parts.get(row.id);
      if (part) return { ...row, stored: { part, gone: false }, refused: null };
      if (change.do !== 'delete' || !row.stored) return row;
      const version = change.version + 1;
      return { ...row, stored: { part: { ...row.stored.part, version }, gone: true }, refused: null };
    }),
  };
}

/**
 * Notes that changes were refused, so that they are not sent again as they are.
 * @param fields as the server names them: `changes.3.number`; the empty name is about all that was sent
 */
export function noteRefused(
  state: TableState,
  sent: readonly PartChange[],
  fields: Readonly<Record<string, string>>,
  message: string,
): TableState {
  const errors = new Map<string, Record<string, string>>();
  for (const [name, text] of Object.entries(fields)) {
    const [, index, field = ''] = /^changes\.(\d+)(?:\.(?:fields\.)?(\w+))?/.exec(name) ?? [];
    const id = sent[Number(index ?? -1)]?.id;
    if (id !== undefined) errors.set(id, { ...errors.get(id), [field]: text });
  }
  // Said of no row in particular: none of them may be sent again unchanged.
  if (errors.size === 0) for (const { id } of sent) errors.set(id, { '': message });
  return {
    ...state,
    rows: state.rows.map((row) => {
      const said = errors.get(row.id);
      return said ? { ...row, refused: { ...formOf(row), errors: said as CellErrors } } : row;
    }),
  };
}

/** Notes what others stored meanwhile. Where they stored the same, there is nothing to choose. */
export function noteConflicts(
  state: TableState,
  stored: readonly (Part & { readonly deleted: boolean })[],
): TableState {
  const theirs = new Map(stored.map(({ deleted, ...part }) => [part.id, { part, gone: deleted }]));
  return {
    ...state,
    rows: state.rows.map((row) => {
      const conflict = theirs.get(row.id);
      if (!conflict) return row;
      return isStored({ ...row, stored: conflict })
        ? { ...row, stored: conflict, conflict: null }
        : { ...row, conflict };
    }),
  };
}

/** Settles a conflict: mine is sent again over theirs, or theirs takes its place. */
export function settle(state: TableState, id: string, choice: 'mine' | 'theirs'): TableState {
  return {
    ...state,
    rows: state.rows.map((row) => {
      if (row.id !== id || row.conflict === null) return row;
      const settled = { ...row, stored: row.conflict, conflict: null, refused: null };
      if (choice === 'mine') return settled;
      return { ...settled, texts: textsOf(row.conflict.part), gone: row.conflict.gone };
    }),
  };
}

/** Takes in what the server has now: rows that were not touched here follow it, the others wait for their save. */
export function takeIn(state: TableState, parts: readonly Part[]): TableState {
  const fresh = new Map(parts.map((part) => [part.id, part]));
  const rows = state.rows.flatMap((row): TableRow[] => {
    const part = fresh.get(row.id);
    fresh.delete(row.id);
    if (!isStored(row) || row.conflict !== null) return [row];
    // An answer that was on its way while a row was saved says less than what is known.
    if (part) return (row.stored?.part.version ?? 0) >= part.version ? [row] : [storedRow(part)];
    // Deleted by someone else, or here: what was deleted here can be undone and stays known.
    return row.gone ? [row] : [];
  });
  const added = [...fresh.values()].map(storedRow);
  return added.length === 0 ? { ...state, rows } : { ...state, rows: sortRows([...rows, ...added]) };
}

/** The rows by part number, those without one last. */
export function sortRows(rows: readonly TableRow[]): TableRow[] {
  const number = (row: TableRow) => row.texts.number;
  return [...rows].sort((a, b) => {
    if (number(a) === '' || number(b) === '') return Number(number(a) === '') - Number(number(b) === '');
    return comparePartNumbers(number(a), number(b));
  });
}
