import { type AnyRow } from './desk-rows.ts';
import { isStored } from './desk-saving.ts';
import { type DeskState, findRow, replaceRow } from './desk-state.ts';

/** What of a row must outlive the page until it is saved. */
export interface KeptRow {
  readonly what: AnyRow['what'];
  readonly id: string;
  readonly form: AnyRow['form'];
  readonly gone: boolean;
  /** What it changes, as it was stored then; null for a new one. */
  readonly seen: { readonly version: number; readonly form: AnyRow['form'] } | null;
}

/** The rows that are not stored as they stand here. */
export function unsavedRows(state: DeskState): KeptRow[] {
  return state.rows
    .filter((row) => !isStored(row) || row.conflict !== null)
    .map(({ what, id, form, gone, stored }) => ({
      what,
      id,
      form,
      gone,
      seen: stored && { version: stored.version, form: stored.form },
    }));
}

/** Puts rows back that were not saved when the page went: on top of what is stored, or beside it as a conflict. */
export function putBack(state: DeskState, kept: readonly KeptRow[]): DeskState {
  return kept.reduce((next, { what, id, form, gone, seen }) => {
    const row = findRow(next, id);
    if (!row) {
      // It never arrived, or was deleted meanwhile: the server says which when it is asked to keep what was typed.
      if (gone) return next;
      const stored = seen && { ...seen, gone: false, place: null, note: null };
      const added = { what, id, form, gone, stored, refused: null, conflict: null } as AnyRow;
      return { ...next, rows: [...next.rows, added] };
    }
    const conflict = row.stored !== null && row.stored.version !== seen?.version ? row.stored : null;
    return replaceRow(next, id, () => ({ ...row, form, gone, conflict }) as AnyRow);
  }, state);
}
