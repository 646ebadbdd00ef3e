import { type DeskLists } from '../../desk.ts';
import {
  type AnyRow,
  type Forms,
  isLost,
  type Row,
  type RowKind,
  rowOf,
  sameForm,
  storedAppearance,
  storedChapter,
  storedNote,
} from './desk-rows.ts';

/** How one row was before a step and is after it; null where it was not there. */
interface Turn {
  readonly id: string;
  readonly before: { readonly form: AnyRow['form']; readonly gone: boolean } | null;
  readonly after: { readonly form: AnyRow['form']; readonly gone: boolean };
}

/** One step that can be taken back. */
export interface Step extends Turn {
  readonly said: string;
  /** Edits in a row of one field are one step, until the field is left. */
  readonly run: string | null;
}

export interface DeskState {
  readonly rows: readonly AnyRow[];
  readonly done: readonly Step[];
  readonly undone: readonly Step[];
}

const MOST_STEPS = 200;

export function startDesk(lists: DeskLists): DeskState {
  return { rows: rowsOf(lists), done: [], undone: [] };
}

/** Every row that the server holds. */
export function rowsOf({ notes, chapters, appearances }: DeskLists): AnyRow[] {
  return [
    ...notes.map((note) => rowOf('note', note.id, storedNote(note))),
    ...chapters.map((chapter) => rowOf('chapter', chapter.id, storedChapter(chapter))),
    ...appearances.map((one) => rowOf('appearance', one.id, storedAppearance(one))),
  ];
}

/** The rows of one kind that are in the episode, in its order. */
export function shown<K extends RowKind>(state: DeskState, what: K): Row<K>[] {
  const at = ({ form: { position } }: AnyRow) => (position.frame * position.rate.den) / position.rate.num;
  return state.rows
    .filter((row) => row.what === what && !row.gone && !isLost(row))
    .sort((a, b) => at(a) - at(b) || (a.id < b.id ? -1 : 1)) as unknown as Row<K>[];
}

/** The rows that are not in this edit. */
export function lost(state: DeskState): AnyRow[] {
  return state.rows.filter((row) => !row.gone && isLost(row));
}

export function findRow(state: DeskState, id: string): AnyRow | undefined {
  return state.rows.find((row) => row.id === id);
}

/** Puts a new row on the desk. */
export function addRow<K extends RowKind>(
  state: DeskState,
  row: { readonly what: K; readonly id: string; readonly form: Forms[K] },
  said: string,
): DeskState {
  const after = { form: row.form, gone: false };
  const added = { ...row, gone: false, stored: null, refused: null, conflict: null } as unknown as AnyRow;
  return record(
    { ...state, rows: [...state.rows, added] },
    { id: row.id, before: null, after, said, run: null },
  );
}

/** Writes some fields of a row. @param run one name for edits that are undone together, or null */
export function editRow(
  state: DeskState,
  id: string,
  fields: Readonly<Partial<Forms['note'] & Forms['chapter'] & Forms['appearance']>>,
  said: string,
  run: string | null = null,
): DeskState {
  const row = findRow(state, id);
  if (!row) return state;
  const after = { form: { ...row.form, ...fields } as AnyRow['form'], gone: row.gone };
  if (sameForm(after.form, row.form)) return state;
  const turned = setRow(state, id, after);
  const last = state.done.at(-1);
  if (run !== null && last?.run === run && last.id === id) {
    return { ...turned, done: [...state.done.slice(0, -1), { ...last, after }], undone: [] };
  }
  return record(turned, { id, before: { form: row.form, gone: row.gone }, after, said, run });
}

/** Takes a row off; undoing brings it back. */
export function deleteRow(state: DeskState, id: string, said: string): DeskState {
  const row = findRow(state, id);
  if (!row || row.gone) return state;
  const [before, after] = [
    { form: row.form, gone: false },
    { form: row.form, gone: true },
  ];
  return record(setRow(state, id, after), { id, before, after, said, run: null });
}

/** Ends a run of edits: the next one is a step of its own. */
export function endRun(state: DeskState): DeskState {
  const last = state.done.at(-1);
  if (!last || last.run === null) return state;
  return { ...state, done: [...state.done.slice(0, -1), { ...last, run: null }] };
}

/** Takes the last step back. */
export function undo(state: DeskState): DeskState {
  const step = state.done.at(-1);
  if (!step) return state;
  const back = step.before ?? { ...step.after, gone: true };
  return {
    ...setRow(state, step.id, back),
    done: state.done.slice(0, -1),
    undone: [...state.undone, step],
  };
}

/** Does the step that was taken back last again. */
export function redo(state: DeskState): DeskState {
  const step = state.undone.at(-1);
  if (!step) return state;
  return {
    ...setRow(state, step.id, step.after),
    done: [...state.done, step],
    undone: state.undone.slice(0, -1),
  };
}

function record(state: DeskState, step: Step): DeskState {
  return { ...state, done: [...state.done, step].slice(-MOST_STEPS), undone: [] };
}

function setRow(state: DeskState, id: string, to: Pick<AnyRow, 'form' | 'gone'>): DeskState {
  return replaceRow(state, id, (row) => ({ ...row, ...to }) as AnyRow);
}

/** Puts another row in the place of one. */
export function replaceRow(state: DeskState, id: string, change: (row: AnyRow) => AnyRow): DeskState {
  return { ...state, rows: state.rows.map((row) => (row.id === id ? change(row) : row)) };
}
