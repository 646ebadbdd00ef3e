import { escapeFormula } from './formula-cells.ts';

/**
 * Writes a list as CSV (RFC 4180): comma, CRLF, quotes where they are needed, formula-like cells escaped.
 * @param rows the first one names the columns
 */
export function writeCsv(rows: readonly (readonly string[])[]): string {
  return rows.map((row) => `${row.map((cell) => quote(escapeFormula(cell))).join(',')}\r\n`).join('');
}

function quote(cell: string): string {
  return /[",\r\n]|^\s|\s$/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
