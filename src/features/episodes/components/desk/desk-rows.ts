import { type Position } from '../../../../domain/positions.ts';
import {
  AddNoteInput,
  type Appearance,
  AppearanceInput,
  type Note,
  type NoteFields,
  isInEdit,
  type Place,
} from '../../../notes/note.ts';
import { AddChapterInput, type Chapter } from '../../episode.ts';

export type RowKind = 'note' | 'chapter' | 'appearance';

/** What a person writes of each kind of row. */
export interface Forms {
  readonly note: NoteFields;
  readonly chapter: { readonly title: string; readonly position: Position };
  readonly appearance: { readonly partId: string; readonly position: Position };
}

/** A row as the server keeps it. */
export interface StoredRow<K extends RowKind = RowKind> {
  readonly version: number;
  readonly form: Forms[K];
  readonly gone: boolean;
  /** Where it comes in the edit; null where there is none. */
  readonly place: Place | null;
  /** Of a note: what others decide about it. */
  readonly note: Note | null;
}

/** A row: what is wanted here, what is stored, and how the two stand to each other. */
export interface Row<K extends RowKind = RowKind> {
  readonly what: K;
  readonly id: string;
  readonly form: Forms[K];
  readonly gone: boolean;
  /** Null while it was never saved. */
  readonly stored: StoredRow<K> | null;
  /** What the server said to this very form. */
  readonly refused: {
    readonly form: Forms[K];
    readonly gone: boolean;
    readonly message: string;
    readonly fields: Readonly<Record<string, string>>;
  } | null;
  /** What someone else stored meanwhile. */
  readonly conflict: StoredRow<K> | null;
}

export type AnyRow = Row<'note'> | Row<'chapter'> | Row<'appearance'>;

/** The fields of a note that a person writes. */
export function noteForm(note: Note): NoteFields {
  const { kind, text, audience, asked, standing, topic, partIds, position } = note;
  return { kind, text, audience, askedId: asked?.id ?? null, standing, topic, partIds, position };
}

export function storedNote(note: Note, gone = false): StoredRow<'note'> {
  return { version: note.version, form: noteForm(note), gone, place: note.place, note };
}

export function storedChapter(
  { version, title, position, place }: Chapter,
  gone = false,
): StoredRow<'chapter'> {
  return { version, form: { title, position }, gone, place, note: null };
}

export function storedAppearance(
  { version, partId, position, place }: Appearance,
  gone = false,
): StoredRow<'appearance'> {
  return { version, form: { partId, position }, gone, place, note: null };
}

/** A row as the server has it, with nothing of its own. */
export function rowOf<K extends RowKind>(what: K, id: string, stored: StoredRow<K>): AnyRow {
  return { what, id, form: stored.form, gone: stored.gone, stored, refused: null, conflict: null } as AnyRow;
}

/** Whether a row is not in the edit, and has not been given a place here yet. */
export function isLost({ form, stored }: AnyRow): boolean {
  return stored !== null && !isInEdit(stored) && samePosition(form.position, stored.form.position);
}

function samePosition(a: Position, b: Position): boolean {
  return (
    a.frame === b.frame && a.endFrame === b.endFrame && a.rate.num * b.rate.den === b.rate.num * a.rate.den
  );
}

/** Whether two forms say the same. Their keys stand in one order, because every form is made by one of ours. */
export function sameForm(a: Forms[RowKind], b: Forms[RowKind]): boolean {
  return a === b || JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));
}

function sorted(form: object): unknown {
  return Object.entries(form)
    .map(([key, value]): [string, unknown] => [
      key,
      typeof value === 'object' && value !== null && !Array.isArray(value) ? sorted(value as object) : value,
    ])
    .sort(([a], [b]) => (a < b ? -1 : 1));
}

const INPUTS = { note: AddNoteInput, chapter: AddChapterInput, appearance: AppearanceInput };

/** Whether a row is stored but for what the server takes off a text, such as a space at its end. */
export function isStoredTrimmed({ what, id, form }: AnyRow, stored: Forms[RowKind]): boolean {
  const parsed = INPUTS[what].safeParse({ ...form, id });
  if (!parsed.success) return false;
  const { id: _id, ...trimmed } = parsed.data;
  return sameForm(trimmed, stored);
}

/** What is wrong with a row before it is sent: a sentence a field, by the same words as on the server. */
export function faultsOf(row: Pick<AnyRow, 'what' | 'id' | 'form'>): Readonly<Record<string, string>> {
  const parsed = INPUTS[row.what].safeParse({ ...row.form, id: row.id });
  if (parsed.success) return {};
  const faults: Record<string, string> = {};
  for (const issue of parsed.error.issues) faults[String(issue.path[0] ?? '')] ??= issue.message;
  return faults;
}
