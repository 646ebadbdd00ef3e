/** A cell by its row and column, both from 0. */
export interface Place {
  readonly row: number;
  readonly column: number;
}

/** The cells between two corners, all included. */
export interface Block {
  readonly top: number;
  readonly bottom: number;
  readonly left: number;
  readonly right: number;
}

export interface GridSize {
  readonly rows: number;
  readonly columns: number;
}

/** Rows that Page up and Page down go. */
const PAGE = 10;

/** The block between where a selection began and where it stands. */
export function blockBetween(from: Place, to: Place): Block {
  return {
    top: Math.min(from.row, to.row),
    bottom: Math.max(from.row, to.row),
    left: Math.min(from.column, to.column),
    right: Math.max(from.column, to.column),
  };
}

/** A place moved into the grid, where it has shrunk. */
export function clampPlace(place: Place, size: GridSize): Place {
  const within = (value: number, count: number) => Math.min(Math.max(value, 0), Math.max(count - 1, 0));
  return { row: within(place.row, size.rows), column: within(place.column, size.columns) };
}

/**
 * Where a key leads in the grid, as the ARIA grid pattern has it; null when it leads nowhere.
 * @param jump whether Ctrl or Command is held: to the edge
 */
export function moveByKey(key: string, jump: boolean, at: Place, size: GridSize): Place | null {
  const [lastRow, lastColumn] = [size.rows - 1, size.columns - 1];
  const moved: Readonly<Record<string, Place>> = {
    ArrowUp: { ...at, row: jump ? 0 : at.row - 1 },
    ArrowDown: { ...at, row: jump ? lastRow : at.row + 1 },
    ArrowLeft: { ...at, column: jump ? 0 : at.column - 1 },
    ArrowRight: { ...at, column: jump ? lastColumn : at.column + 1 },
    Home: { row: jump ? 0 : at.row, column: 0 },
    End: { row: jump ? lastRow : at.row, column: lastColumn },
    PageUp: { ...at, row: at.row - PAGE },
    PageDown: { ...at, row: at.row + PAGE },
  };
  const to = moved[key];
  return to ? clampPlace(to, size) : null;
}

/**
 * Where Tab leads: along the row. Between cells it leaves the grid at the row's end, so that nobody is held in it;
 * while typing it goes on to the next row.
 * @returns null when it leaves the grid
 */
export function moveByTab(back: boolean, typing: boolean, at: Place, size: GridSize): Place | null {
  const column = at.column + (back ? -1 : 1);
  if (column >= 0 && column < size.columns) return { ...at, column };
  const row = at.row + (back ? -1 : 1);
  if (!typing || row < 0 || row >= size.rows) return null;
  return { row, column: back ? size.columns - 1 : 0 };
}
