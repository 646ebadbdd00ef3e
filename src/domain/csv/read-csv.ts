import { CsvError, parse } from 'csv-parse/sync';
import { unescapeFormula } from './formula-cells.ts';

/** What may stand between the cells of a list. */
export const DELIMITERS = [',', ';', '\t'] as const;
export type Delimiter = (typeof DELIMITERS)[number];

/** A row of a list, with the line of the file it starts on, counted from 1. */
export interface CsvRow {
  readonly line: number;
  readonly cells: readonly string[];
}

export type ReadCsv =
  | { readonly ok: true; readonly value: { readonly delimiter: Delimiter; readonly rows: readonly CsvRow[] } }
  | { readonly ok: false; readonly error: string };

/**
 * Reads a list: the delimiter found, cells trimmed, empty rows left out, escaped formulas given back.
 * @param text without a byte order mark
 * @param most rows that are read; what stands after them is not looked at
 * @returns the rows, of unequal length where the list is ragged; or a sentence that says what is wrong, and on which line
 */
export function readCsv(
  text: string,
  delimiter: Delimiter = findDelimiter(text),
  most: number | null = null,
): ReadCsv {
  try {
    const records = parse(text.replace(/^\uFEFF/, ''), {
      delimiter,
      bom: true,
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      ...(most !== null && { to: most }),
      // An inch mark in the middle of a cell is no quote.
      relax_quotes: true,
    }) as unknown as { record: string[]; info: { lines: number } }[];
    const rows = records.map(({ record, info }) => ({
      // The parser counts to the end of a row, which quoted cells may stretch over several lines.
      line: info.lines - record.reduce((sum, cell) => sum + cell.split('\n').length - 1, 0),
      cells: record.map((cell) => unescapeFormula(cell.trim())),
    }));
    return { ok: true, value: { delimiter, rows } };
  } catch (error) {
    if (error instanceof CsvError) return { ok: false, error: sentenceFor(error) };
    throw error;
  }
}

function sentenceFor(error: CsvError): string {
  const line = 'lines' in error && typeof error['lines'] === 'number' ? String(error['lines']) : null;
  if (error.code === 'CSV_QUOTE_NOT_CLOSED') {
    return `The list breaks off inside quotes${line === null ? '' : `, by line ${line}`}. It may have been cut off: save it again whole.`;
  }
  return `The list cannot be read${line === null ? '' : ` from line ${line} on`}. Look at the quotes there, or save it again as CSV.`;
}

/**
 * What stands between the cells: the candidate that cuts the first rows into the most columns, evenly.
 * @returns a comma for a list of one column
 */
export function findDelimiter(text: string): Delimiter {
  const lines = withoutQuoted(text.slice(0, 20_000))
    .split(/\r\n?|\n/)
    .filter((line) => line.trim() !== '')
    .slice(0, 20);
  const scores = DELIMITERS.map((delimiter) => {
    const counts = lines.map((line) => line.split(delimiter).length - 1);
    const [first = 0] = counts;
    const even = counts.filter((count) => count === first).length / Math.max(counts.length, 1);
    return { delimiter, score: first * even };
  });
  return scores.reduce((best, next) => (next.score > best.score ? next : best)).delimiter;
}

function withoutQuoted(text: string): string {
  return text.replace(/"(?:[^"]|"")*"/g, '');
}
