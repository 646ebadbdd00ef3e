import { type Dispatch, type KeyboardEvent, type SetStateAction, useMemo, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { PART_FIELDS } from '../part.ts';
import { EMPTY_TEXTS } from '../part-texts.ts';
import { blockCells, clearEdits, pasteEdits, readClipboard, writeClipboard } from './clipboard-rows.ts';
import { blockBetween, clampPlace, moveByKey, moveByTab, type Place } from './grid-keys.ts';
import {
  type CellEdit,
  deleteRows,
  editCells,
  redo,
  shownRows,
  type TableRow,
  type TableState,
  undo,
} from './parts-table-state.ts';
import { type Typing } from './PartsGridRow.tsx';

const COLUMNS = PART_FIELDS.length;

/** A clipboard event as far as the table uses it. */
interface ClipboardTurn {
  readonly clipboardData: Pick<DataTransfer, 'getData' | 'setData'>;
  preventDefault: () => void;
}

/** The table as it is typed in: where the focus stands, what is selected, what is being typed, what each key does. */
export function usePartsGrid(table: TableState, setTable: Dispatch<SetStateAction<TableState>>) {
  const [blankId, setBlankId] = useState(() => uuidv7());
  const rows = useMemo((): readonly TableRow[] => {
    const blank = {
      id: blankId,
      texts: EMPTY_TEXTS,
      gone: false,
      stored: null,
      refused: null,
      conflict: null,
    };
    return [...shownRows(table), blank];
  }, [table, blankId]);
  const size = { rows: rows.length, columns: COLUMNS };
  const [place, setPlace] = useState<Place>({ row: 0, column: 0 });
  const [from, setFrom] = useState<Place>(place);
  const [typing, setTyping] = useState<Typing | null>(null);
  const [said, setSaid] = useState('');
  // Whoever only passes by with Tab is let through; it goes from cell to cell once something was done here.
  const [working, setWorking] = useState(false);
  const at = clampPlace(place, size);
  const block = blockBetween(clampPlace(from, size), at);

  function go(to: Place, extend = false): void {
    setPlace(to);
    if (!extend) setFrom(to);
    setWorking(true);
  }

  function edit(edits: readonly CellEdit[], step: string): void {
    setTable((state) => editCells(state, edits, step));
    // The empty row has become a part; another takes its place.
    if (edits.some(({ id }) => id === blankId)) setBlankId(uuidv7());
  }

  function begin(text?: string): void {
    const field = PART_FIELDS[at.column];
    const row = rows[at.row];
    if (field && row) setTyping({ id: row.id, column: at.column, text: text ?? row.texts[field] });
  }

  function takeTyped(text: string): void {
    if (typing === null) return;
    setTyping(null);
    const row = rows.find(({ id }) => id === typing.id);
    const field = PART_FIELDS[typing.column];
    if (!row || !field) return;
    if (text !== row.texts[field] && !(row.id === blankId && text.trim() === '')) {
      edit([{ id: row.id, texts: { [field]: text } }], 'Change a cell');
    }
  }

  function remove(ids: readonly string[]): void {
    setTable((state) => deleteRows(state, ids));
    setSaid(ids.length === 1 ? 'Part deleted; undo brings it back.' : `${String(ids.length)} parts deleted.`);
  }

  function stepBack(): void {
    const step = table.done.at(-1);
    setTable(undo);
    setSaid(step ? `Undone: ${step.said.toLowerCase()}.` : 'Nothing to undo.');
  }

  function stepOn(): void {
    const step = table.undone.at(-1);
    setTable(redo);
    setSaid(step ? `Done again: ${step.said.toLowerCase()}.` : 'Nothing to do again.');
  }

  function onTypingKey(event: KeyboardEvent): boolean {
    const text = event.target instanceof HTMLInputElement ? event.target.value : '';
    if (event.key === 'Escape') setTyping(null);
    else if (event.key === 'Enter' || event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      takeTyped(text);
      const up = event.key === 'ArrowUp' || (event.key === 'Enter' && event.shiftKey);
      go(clampPlace({ ...at, row: at.row + (up ? -1 : 1) }, { ...size, rows: size.rows + 1 }));
    } else if (event.key === 'Tab') {
      takeTyped(text);
      const to = moveByTab(event.shiftKey, true, at, { ...size, rows: size.rows + 1 });
      if (to) go(to);
      return to !== null;
    } else return false;
    return true;
  }

  function onRestingKey(event: KeyboardEvent): boolean {
    const { key, shiftKey } = event;
    const command = event.ctrlKey || event.metaKey;
    const letter = key.toLowerCase();
    if (command && letter === 'z') {
      if (shiftKey) stepOn();
      else stepBack();
    } else if (command && letter === 'y') stepOn();
    else if (command && letter === 'a') {
      setFrom({ row: 0, column: 0 });
      setPlace({ row: size.rows - 1, column: COLUMNS - 1 });
    } else if (command && key === 'Delete') remove(selectedIds());
    else if (key === 'Delete' || key === 'Backspace')
      edit(clearEdits(selectedRows(), columns()), 'Clear cells');
    else if (key === 'Enter' || key === 'F2') begin();
    else if (key === 'Escape') {
      setFrom(at);
      setWorking(false);
      return true;
    } else if (key === 'Tab') {
      const to = working ? moveByTab(shiftKey, false, at, size) : null;
      if (to) go(to);
      else setWorking(false);
      return to !== null;
    } else if (key.length === 1 && !command && !event.altKey) begin(key === ' ' ? '' : key);
    else {
      const to = moveByKey(key, command, at, size);
      if (to === null) return false;
      go(to, shiftKey);
    }
    setWorking(true);
    return true;
  }

  const selectedRows = () => rows.slice(block.top, block.bottom + 1).filter(({ id }) => id !== blankId);
  const selectedIds = () => selectedRows().map(({ id }) => id);
  const columns = () => ({ ...block, top: 0, bottom: COLUMNS * rows.length });

  return {
    rows,
    blankId,
    at,
    block,
    typing,
    said,
    selectedIds,
    go,
    begin,
    remove,
    takeTyped,
    stepBack,
    stepOn,
    onKeyDown(event: KeyboardEvent): void {
      const taken = typing === null ? onRestingKey(event) : onTypingKey(event);
      if (taken) event.preventDefault();
    },
    onCopy(event: ClipboardTurn): void {
      if (typing !== null) return;
      event.clipboardData.setData('text/plain', writeClipboard(blockCells(rows, block)));
      event.preventDefault();
      setSaid('Copied.');
    },
    onCut(event: ClipboardTurn): void {
      if (typing !== null) return;
      event.clipboardData.setData('text/plain', writeClipboard(blockCells(rows, block)));
      event.preventDefault();
      edit(clearEdits(selectedRows(), columns()), 'Cut cells');
    },
    onPaste(event: ClipboardTurn): void {
      if (typing !== null) return;
      event.preventDefault();
      const cells = readClipboard(event.clipboardData.getData('text/plain'));
      const corner = { row: block.top, column: block.left };
      const edits = pasteEdits(rows, corner, cells, () => uuidv7());
      const count = edits.length === 1 ? '1 row' : `${String(edits.length)} rows`;
      edit(edits, `Paste ${count}`);
      setSaid(`Pasted ${count}.`);
    },
  };
}
