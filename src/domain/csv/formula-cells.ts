/** What a spreadsheet would take for a formula, if it stood first in a cell. */
const FORMULA_START = /^[=+\-@\t\r]/;

/** An apostrophe that stands before such a start, after any others. */
const ESCAPED_START = /^'+[=+\-@\t\r]/;

/**
 * Makes a cell harmless in a spreadsheet: one that starts like a formula gets an apostrophe. A cell that already
 * starts as an escaped one does gets one more, so that reading it back gives what was written.
 */
export function escapeFormula(cell: string): string {
  return FORMULA_START.test(cell) || ESCAPED_START.test(cell) ? `'${cell}` : cell;
}

/** Takes off the apostrophe that `escapeFormula` put before a cell. */
export function unescapeFormula(cell: string): string {
  return ESCAPED_START.test(cell) ? cell.slice(1) : cell;
}
