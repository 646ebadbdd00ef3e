import { type Part, PART_FIELDS, type PartField } from '../part.ts';
import { NEW_TEXTS, type PartTexts, textsOf, usualText } from '../part-texts.ts';

/** A row: what is typed, what is stored, and how the two stand to each other. */
export interface TableRow {
  readonly id: string;
  readonly texts: PartTexts;
  /** Deleted here, whatever is stored. */
  readonly gone: boolean;
  /** As stored; null for a row that was never saved. */
  readonly stored: { readonly part: Part; readonly gone: boolean } | null;
  /** What the server said of the row as it was sent: the empty name is the row as a whole. */
  readonly refused: { readonly texts: PartTexts; readonly gone: boolean; readonly errors: CellErrors } | null;
  /** What someone else stored meanwhile. */
  readonly conflict: { readonly part: Part; readonly gone: boolean } | null;
}

export type CellErrors = Readonly<Partial<Record<PartField | '', string>>>;

/** How rows were before an edit and after it; null for a row that was not there. */
export interface Step {
  readonly said: string;
  readonly rows: readonly { readonly id: string; readonly before: RowForm | null; readonly after: RowForm }[];
}

/** What of a row an edit changes. */
export interface RowForm {
  readonly texts: PartTexts;
  readonly gone: boolean;
}

export interface TableState {
  readonly rows: readonly TableRow[];
  readonly done: readonly Step[];
  readonly undone: readonly Step[];
}

/** Steps that can be taken back. */
const MOST_STEPS = 100;

/** The table as it is read from the page or the server. */
export function startTable(parts: readonly Part[]): TableState {
  return { rows: parts.map(storedRow), done: [], undone: [] };
}

/** A row as it is stored. */
export function storedRow(part: Part): TableRow {
  return {
    id: part.id,
    texts: textsOf(part),
    gone: false,
    stored: { part, gone: false },
    refused: null,
    conflict: null,
  };
}

/** The rows in sight, in the order they stand in. */
export function shownRows(state: TableState): readonly TableRow[] {
  return state.rows.filter(({ gone }) => !gone);
}

/** Cells to write, by row; a row that is not there yet is added at the end. */
export interface CellEdit {
  readonly id: string;
  readonly texts: Partial<PartTexts>;
}

/**
 * Writes cells, as one step that can be undone. Texts that can be read take their usual form.
 * @param said what the step is called: "Paste 3 rows"
 */
export function editCells(state: TableState, edits: readonly CellEdit[], said: string): TableState {
  const rows = edits.flatMap(({ id, texts }) => {
    const row = state.rows.find((one) => one.id === id);
    const before = row ? formOf(row) : null;
    const usual = Object.fromEntries(
      Object.entries(texts).map(([field, text]) => [field, usualText(field as PartField, text)]),
    );
    const after = { texts: { ...(before?.texts ?? NEW_TEXTS), ...usual }, gone: false };
    return before !== null && same(before, after) ? [] : [{ id, before, after }];
  });
  return take(state, { said, rows });
}

/** Deletes rows, as one step that can be undone. */
export function deleteRows(state: TableState, ids: readonly string[]): TableState {
  const rows = state.rows
    .filter(({ id, gone }) => ids.includes(id) && !gone)
    .map((row) => ({ id: row.id, before: formOf(row), after: { texts: row.texts, gone: true } }));
  return take(state, {
    said: rows.length === 1 ? 'Delete a part' : `Delete ${String(rows.length)} parts`,
    rows,
  });
}

function take(state: TableState, step: Step): TableState {
  if (step.rows.length === 0) return state;
  return {
    rows: putForms(
      state.rows,
      step.rows.map(({ id, after }) => ({ id, form: after })),
    ),
    done: [...state.done, step].slice(-MOST_STEPS),
    undone: [],
  };
}

/** Takes the last step back. What is stored follows by the inverse change, with the version it expects. */
export function undo(state: TableState): TableState {
  const step = state.done.at(-1);
  if (!step) return state;
  // A row that was not there before stays as a deleted one: undoing the undoing brings it back.
  const forms = step.rows.map(({ id, before, after }) => ({
    id,
    form: before ?? { texts: after.texts, gone: true },
  }));
  return {
    rows: putForms(state.rows, forms),
    done: state.done.slice(0, -1),
    undone: [...state.undone, step],
  };
}

/** Does again what was undone last. */
export function redo(state: TableState): TableState {
  const step = state.undone.at(-1);
  if (!step) return state;
  return {
    rows: putForms(
      state.rows,
      step.rows.map(({ id, after }) => ({ id, form: after })),
    ),
    done: [...state.done, step],
    undone: state.undone.slice(0, -1),
  };
}

function putForms(
  rows: readonly TableRow[],
  forms: readonly { readonly id: string; readonly form: RowForm }[],
): readonly TableRow[] {
  const wanted = new Map(forms.map(({ id, form }) => [id, form]));
  const changed = rows.map((row) => {
    const form = wanted.get(row.id);
    wanted.delete(row.id);
    return form ? { ...row, ...form } : row;
  });
  const added = [...wanted].map(([id, form]) => ({
    id,
    ...form,
    stored: null,
    refused: null,
    conflict: null,
  }));
  return [...changed, ...added];
}

/** What of a row an edit changes. */
export function formOf({ texts, gone }: RowForm): RowForm {
  return { texts, gone };
}

/** Whether two rows say the same. */
export function same(a: RowForm, b: RowForm): boolean {
  return a.gone === b.gone && PART_FIELDS.every((field) => a.texts[field] === b.texts[field]);
}

/** The rows that something was done to here. */
export function touchedRows(state: TableState): ReadonlySet<string> {
  return new Set([...state.done, ...state.undone].flatMap(({ rows }) => rows.map(({ id }) => id)));
}
