import {
  type AnyRow,
  faultsOf,
  isStoredTrimmed,
  type RowKind,
  sameForm,
  storedAppearance,
  storedChapter,
  storedNote,
  type StoredRow,
} from './desk-rows.ts';
import { type DeskLists } from '../../desk.ts';
import { type DeskState, findRow, replaceRow, rowsOf } from './desk-state.ts';

/** What is asked of the server about one row. Undoing asks for the inverse, with the version that is known. */
export interface Op {
  readonly do: 'add' | 'change' | 'delete' | 'restore';
  readonly what: RowKind;
  readonly id: string;
  readonly version: number | null;
  readonly form: AnyRow['form'];
}

export type RowMark = 'saved' | 'waiting' | 'open' | 'conflict';

/** Whether the row is stored as it stands here. */
export function isStored(row: AnyRow): boolean {
  const { stored, form, gone } = row;
  if (stored === null) return gone;
  return stored.gone === gone && (gone || sameForm(stored.form, form) || isStoredTrimmed(row, stored.form));
}

/** What has to be asked next about a row; null when nothing has to, or nothing can. */
export function pendingOf(row: AnyRow): Op | null {
  const { what, id, form, gone, stored, refused, conflict } = row;
  if (conflict !== null || isStored(row)) return null;
  if (refused !== null && refused.gone === gone && sameForm(refused.form, form)) return null;
  const op = { what, id, form, version: stored?.version ?? null };
  if (gone) return { ...op, do: 'delete' };
  if (Object.keys(faultsOf(row)).length > 0) return null;
  if (stored === null) return { ...op, do: 'add' };
  if (stored.gone) return { ...op, do: what === 'appearance' ? 'add' : 'restore' };
  return { ...op, do: what === 'appearance' ? 'add' : 'change' };
}

export function pendingOps(state: DeskState): readonly Op[] {
  return state.rows.flatMap((row) => pendingOf(row) ?? []);
}

/** How a row stands, for its mark. */
export function markOf(row: AnyRow): RowMark {
  if (row.conflict !== null) return 'conflict';
  if (isStored(row)) return 'saved';
  return pendingOf(row) === null ? 'open' : 'waiting';
}

/** Takes in what the server kept. @param answer the row as it answered; of a removed appearance nothing but its id */
export function noteSaved(state: DeskState, op: Op, answer: unknown): DeskState {
  const stored = storedFrom(op.what, answer, op);
  // The form stays as it was typed: the server trims, and whoever paused after a word would lose the space. But it
  // stands where the edit has that moment, unless it has been moved on meanwhile.
  return replaceRow(state, op.id, (row) => {
    const stays = JSON.stringify(row.form.position) === JSON.stringify(op.form.position);
    const form = stays && !row.gone ? { ...row.form, position: stored.form.position } : row.form;
    return { ...row, form, stored, refused: null } as AnyRow;
  });
}

/** Takes in that someone else stored the row meanwhile. */
export function noteConflict(state: DeskState, op: Op, answer: unknown): DeskState {
  const gone = (answer as { deleted?: boolean }).deleted === true;
  return replaceRow(state, op.id, (row) => {
    const conflict = storedFrom(op.what, answer, { ...op, do: gone ? 'delete' : 'change' });
    // Both did the same: nothing is left to choose.
    if (row.gone === gone && (gone || sameForm(row.form, conflict.form)))
      return { ...row, stored: conflict, refused: null } as AnyRow;
    return { ...row, conflict } as AnyRow;
  });
}

export function noteRefused(
  state: DeskState,
  op: Op,
  message: string,
  fields: Readonly<Record<string, string>>,
): DeskState {
  return replaceRow(state, op.id, (row) => {
    const refused = { form: op.form, gone: op.do === 'delete', message, fields };
    return { ...row, refused } as AnyRow;
  });
}

/** Takes in that a row that was to go is not there any more. */
export function noteGone(state: DeskState, op: Op): DeskState {
  return replaceRow(
    state,
    op.id,
    (row) => ({ ...row, stored: row.stored && { ...row.stored, gone: true }, refused: null }) as AnyRow,
  );
}

/** Settles a conflict: mine is sent again on top of theirs; theirs takes the place of mine. */
export function settle(state: DeskState, id: string, choice: 'mine' | 'theirs'): DeskState {
  return replaceRow(state, id, (row) => {
    const { conflict } = row;
    if (conflict === null) return row;
    const next = { ...row, stored: conflict, conflict: null, refused: null };
    return (choice === 'mine' ? next : { ...next, form: conflict.form, gone: conflict.gone }) as AnyRow;
  });
}

/** Takes in what the server holds now: rows that are being written here stay as they are. */
export function takeIn(state: DeskState, lists: DeskLists): DeskState {
  const fetched = new Map(rowsOf(lists).map((row) => [row.id, row]));
  const rows = state.rows.flatMap((row): AnyRow[] => {
    const theirs = fetched.get(row.id);
    fetched.delete(row.id);
    if (row.stored === null || row.conflict !== null || !isStored(row)) return [row];
    if (theirs?.stored) return [newer(row, theirs)];
    // What was deleted here stays known, so that it can be brought back.
    return row.gone ? [row] : [];
  });
  return { ...state, rows: [...rows, ...fetched.values()] };
}

function newer(row: AnyRow, theirs: AnyRow): AnyRow {
  if (row.gone && theirs.stored?.version === row.stored?.version) return row;
  return (theirs.stored?.version ?? 0) >= (row.stored?.version ?? 0) &&
    JSON.stringify(theirs.stored) !== JSON.stringify(row.stored)
    ? theirs
    : row;
}

function storedFrom(what: RowKind, answer: unknown, op: Op): StoredRow {
  const gone = op.do === 'delete';
  if (what === 'note') return storedNote(answer as Parameters<typeof storedNote>[0], gone);
  if (what === 'chapter') return storedChapter(answer as Parameters<typeof storedChapter>[0], gone);
  if (gone) return { version: op.version ?? 1, form: op.form, gone, place: null, note: null };
  return storedAppearance(answer as Parameters<typeof storedAppearance>[0]);
}

/** Takes in a note that a verb of its own has changed: an answer, a proposal that was taken. */
export function takeNote(state: DeskState, note: Parameters<typeof storedNote>[0]): DeskState {
  const row = findRow(state, note.id);
  if (!row) return state;
  const stored = storedNote(note);
  const clean = isStored(row);
  return replaceRow(
    state,
    note.id,
    () => ({ ...row, stored, ...(clean && { form: stored.form }) }) as AnyRow,
  );
}
