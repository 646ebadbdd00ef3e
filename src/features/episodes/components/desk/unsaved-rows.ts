import { type AnyRow } from './desk-rows.ts';
import { isStored } from './desk-saving.ts';
import { type DeskState, findRow, replaceRow } from './desk-state.ts';

/** What of a row must outlive the page until it is saved. */
export interface KeptRow {
  readonly what: AnyRow['what'];
  readonly id: string;
  readonly form: AnyRow['form'];
  readonly gone: boolean;
  /** Of the stored row that it changes; null for a new one. */
  readonly version: number | null;
}

/** The rows that are not stored as they stand here. */
export function unsavedRows(state: DeskState): KeptRow[] {
  return state.rows
    .filter((row) => !isStored(row) || row.conflict !== null)
    .map(({ what, id, form, gone, stored }) => ({ what, id, form, gone, version: stored?.version ?? null }));
}

/** Puts rows back that were not saved when the page went: on top of what is stored, or beside it as a conflict. */
export function putBack(state: DeskState, kept: readonly KeptRow[]): DeskState {
  return kept.reduce((next, { what, id, form, gone, version }) => {
    const row = findRow(next, id);
    if (!row) {
      // It was deleted meanwhile, or never arrived: what was typed becomes a new row, unless it was to go anyway.
      if (gone || version !== null) return next;
      const added = { what, id, form, gone, stored: null, refused: null, conflict: null } as AnyRow;
      return { ...next, rows: [...next.rows, added] };
    }
    const conflict = row.stored !== null && row.stored.version !== version ? row.stored : null;
    return replaceRow(next, id, () => ({ ...row, form, gone, conflict }) as AnyRow);
  }, state);
}
