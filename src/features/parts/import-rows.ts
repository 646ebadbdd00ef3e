import { type CsvRow } from '../../domain/csv/read-csv.ts';
import { partNumberKey } from '../../domain/part-numbers.ts';
import { type ColumnChoice } from './import-columns.ts';
import { type Part, PART_FIELDS, type PartChange, type PartField, PART_LABELS } from './part.ts';
import { NEW_TEXTS, type PartTexts, readPart, textsOf } from './part-texts.ts';

/** What becomes of a row: of numbers that the build has already, one chooses. */
export const EXISTING_CHOICES = ['leave', 'update'] as const;
export type ExistingChoice = (typeof EXISTING_CHOICES)[number];

export interface ImportRow {
  /** The line of the list it starts on. */
  readonly line: number;
  readonly texts: PartTexts;
  readonly outcome: 'add' | 'update' | 'same' | 'leave' | 'problem';
  /** A sentence each. */
  readonly problems: readonly string[];
}

export interface ImportPlan {
  readonly rows: readonly ImportRow[];
  /** What to save, if nothing is in the way. */
  readonly changes: readonly PartChange[];
  readonly problems: number;
}

/**
 * Decides row by row what a list does to a build's parts.
 * @param rows without the head
 * @param existing the build's parts
 * @param newId makes the id of a part that is added
 */
export function planImport(
  rows: readonly CsvRow[],
  columns: ColumnChoice,
  existing: readonly Part[],
  choice: ExistingChoice,
  newId: () => string,
): ImportPlan {
  const parts = new Map(existing.map((part) => [partNumberKey(part.number), part]));
  const lines = linesByNumber(rows, columns);
  const changes: PartChange[] = [];
  const planned = rows.map((row): ImportRow => {
    const given = cellsOf(row, columns);
    const key = partNumberKey(given.number ?? '');
    const part = parts.get(key);
    const texts = { ...(part ? textsOf(part) : NEW_TEXTS), ...given };
    const read = readPart(texts);
    const problems: string[] = read.ok ? [] : sayErrors(read.errors, texts);
    const twins = (lines.get(key) ?? []).filter((line) => line !== row.line);
    if (key !== '' && twins.length > 0) {
      problems.push(
        `Number ${given.number ?? ''} also stands on line ${twins.slice(0, 3).join(', ')}. Keep one of them.`,
      );
    }
    if (problems.length > 0 || !read.ok) return { line: row.line, texts, outcome: 'problem', problems };
    const fields = { ...read.value, aliases: [...read.value.aliases] };
    if (!part) {
      changes.push({ do: 'add', id: newId(), fields });
      return { line: row.line, texts: textsOf(fields), outcome: 'add', problems };
    }
    if (choice === 'leave') return { line: row.line, texts: textsOf(part), outcome: 'leave', problems };
    const [before, after] = [textsOf(part), textsOf(fields)];
    if (PART_FIELDS.every((field) => before[field] === after[field])) {
      return { line: row.line, texts: after, outcome: 'same', problems };
    }
    changes.push({ do: 'change', id: part.id, version: part.version, fields });
    return { line: row.line, texts: after, outcome: 'update', problems };
  });
  return {
    rows: planned,
    changes,
    problems: planned.filter(({ outcome }) => outcome === 'problem').length,
  };
}

/** The cells of a row that say something: an empty one changes nothing of a part that is there. */
function cellsOf(row: CsvRow, columns: ColumnChoice): Partial<PartTexts> {
  const given: Partial<Record<PartField, string>> = {};
  for (const field of PART_FIELDS) {
    const column = columns[field];
    const cell = column === undefined ? '' : (row.cells[column] ?? '');
    if (cell !== '') given[field] = cell;
  }
  return given;
}

function linesByNumber(rows: readonly CsvRow[], columns: ColumnChoice): Map<string, number[]> {
  const lines = new Map<string, number[]>();
  for (const row of rows) {
    const key = partNumberKey(cellsOf(row, columns).number ?? '');
    lines.set(key, [...(lines.get(key) ?? []), row.line]);
  }
  return lines;
}

function sayErrors(errors: Readonly<Partial<Record<PartField, string>>>, texts: PartTexts): string[] {
  return PART_FIELDS.flatMap((field) => {
    const error = errors[field];
    if (error === undefined) return [];
    const typed = texts[field];
    return [typed === '' ? error : `${PART_LABELS[field]} says “${typed.slice(0, 60)}”. ${error}`];
  });
}
