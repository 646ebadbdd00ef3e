import { PART_FIELDS, type PartField } from '../part.ts';
import { EMPTY_TEXTS, type PartTexts } from '../part-texts.ts';
import { type CellEdit, type TableRow } from './parts-table-state.ts';

/**
 * Reads what a spreadsheet puts on the clipboard: tabs between cells, quotes around those with line breaks.
 * @returns rows of cells; an empty last line is none
 */
export function readClipboard(text: string): string[][] {
  const rows: string[][] = [[]];
  let cell = '';
  let quoted = false;
  const endCell = () => {
    rows.at(-1)?.push(cell);
    cell = '';
  };
  const plain = text.replace(/\r\n?/g, '\n').replace(/\n$/, '');
  for (let at = 0; at < plain.length; at += 1) {
    const character = plain[at] ?? '';
    if (quoted) {
      if (character !== '"') cell += character;
      else if (plain[at + 1] === '"') {
        cell += '"';
        at += 1;
      } else quoted = false;
    } else if (character === '"' && cell === '' && closes(plain, at)) quoted = true;
    else if (character === '\t') endCell();
    else if (character === '\n') {
      endCell();
      rows.push([]);
    } else cell += character;
  }
  endCell();
  return rows;
}

/** Whether a quote at the start of a cell has its other half at a cell's end; an inch mark alone has not. */
function closes(text: string, at: number): boolean {
  return /^"(?:[^"]|"")*"(?=[\t\n]|$)/.test(text.slice(at));
}

/** Writes cells as a spreadsheet takes them. */
export function writeClipboard(rows: readonly (readonly string[])[]): string {
  return rows
    .map((row) =>
      row.map((cell) => (/["\t\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell)).join('\t'),
    )
    .join('\n');
}

/**
 * The cells that a paste writes, down and across from one cell; past the last row it adds rows.
 * @param rows the rows in sight
 * @param from where the paste begins
 * @param newId the id of a row that is added
 */
export function pasteEdits(
  rows: readonly TableRow[],
  from: { readonly row: number; readonly column: number },
  cells: readonly (readonly string[])[],
  newId: () => string,
): CellEdit[] {
  // An empty line past the end would begin a part that says nothing.
  const lines = cells.filter(
    (line, down) => rows[from.row + down] !== undefined || line.some((cell) => cell.trim() !== ''),
  );
  return lines.map((line, down) => ({
    id: rows[from.row + down]?.id ?? newId(),
    texts: Object.fromEntries(
      line.flatMap((text, across): [PartField, string][] => {
        const field = PART_FIELDS[from.column + across];
        return field === undefined ? [] : [[field, text]];
      }),
    ) as Partial<PartTexts>,
  }));
}

/** The cells of a block, for copying. */
export function blockCells(
  rows: readonly TableRow[],
  block: { readonly top: number; readonly bottom: number; readonly left: number; readonly right: number },
): string[][] {
  return rows
    .slice(block.top, block.bottom + 1)
    .map(({ texts }) => PART_FIELDS.slice(block.left, block.right + 1).map((field) => texts[field]));
}

/** What clearing a block writes: empty cells, which for some columns stand for their usual value. */
export function clearEdits(
  rows: readonly TableRow[],
  block: { readonly top: number; readonly bottom: number; readonly left: number; readonly right: number },
): CellEdit[] {
  const cleared = Object.fromEntries(
    PART_FIELDS.slice(block.left, block.right + 1).map((field) => [field, EMPTY_TEXTS[field]]),
  ) as Partial<PartTexts>;
  return rows.slice(block.top, block.bottom + 1).map(({ id }) => ({ id, texts: cleared }));
}
