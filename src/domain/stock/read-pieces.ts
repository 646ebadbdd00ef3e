import { type Answer, right, wrong } from '../answer.ts';
import { readCsv } from '../csv/read-csv.ts';
import { inMillimetres } from '../lengths/length.ts';
import { parseLength } from '../lengths/parse-length.ts';
import { PIECES_AT_MOST, type WantedPiece } from './cutting-plan.ts';

/** A piece as a list has it: length, quantity, name. */
export type PieceRow = readonly [length: string, quantity: string, name?: string | undefined];

/** Pieces from rows of length, quantity and name, lengths in millimetres where they say nothing else. */
export function readPieceRows(rows: readonly PieceRow[]): Answer<readonly WantedPiece[]> {
  const pieces: WantedPiece[] = [];
  for (const [index, [length, count, name]] of rows.entries()) {
    const where = `Piece ${String(index + 1)}`;
    const read = parseLength(length, 'mm');
    if (!read.ok) return wrong(`${where}: ${read.error}`);
    const mm = inMillimetres(read.value);
    if (mm.lte(0)) return wrong(`${where}: a length is above zero.`);
    if (mm.gt(1_000_000)) return wrong(`${where}: it is longer than a kilometre.`);
    const quantity = /^\d{1,6}$/.test(count.trim()) ? Number(count) : 0;
    if (quantity < 1 || quantity > PIECES_AT_MOST)
      return wrong(`${where}: a quantity is a whole number from 1 to ${String(PIECES_AT_MOST)}.`);
    const called = name?.trim() ?? '';
    pieces.push({ length: mm, quantity, name: called === '' ? null : called.slice(0, 80) });
  }
  return right(pieces);
}

/** Pieces from a list with the columns length, quantity and, where it is there, name; with a heading or without. */
export function readPiecesCsv(text: string): Answer<readonly WantedPiece[]> {
  const list = readCsv(text, ',');
  if (!list.ok) return list;
  const rows = list.value.rows
    .map(({ cells }) => cells)
    .filter((cells) => cells.some((cell) => cell.trim() !== ''));
  const headed = rows[0]?.[0]?.trim().toLowerCase() === 'length';
  return readPieceRows(
    rows
      .slice(headed ? 1 : 0)
      .map(([length = '', quantity = '1', ...name]) => [length, quantity, name.join(', ')]),
  );
}
