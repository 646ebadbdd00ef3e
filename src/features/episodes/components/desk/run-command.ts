import { setMark, NO_MARKS, withKind } from './composer-draft.ts';
import { type Command } from './desk-keys.ts';
import { type Row } from './desk-rows.ts';
import { redo, shown, undo } from './desk-state.ts';
import { framesIn, movedTo, movePlace, placeAt } from './moment.ts';
import { mayChangeNote } from './note-words.ts';
import { type Desk } from './use-desk.ts';

/** What only the page can do. */
export interface Ways {
  readonly openComposer: () => void;
  readonly addChapter: () => void;
  readonly toBench: () => void;
  readonly toNote: (id: string) => void;
  readonly toggleKeys: () => void;
}

/** Does what a key asks for. */
export function runCommand(command: Command, desk: Desk, ways: Ways): void {
  const { clock, marks, setMarks, data } = desk;
  if (command.do === 'play') clock.player()?.toggle?.();
  else if (command.do === 'step') clock.seek(clock.now() + command.by * framesIn(command.size, clock.rate));
  else if (command.do === 'to-note') goToNote(desk, ways, command.by);
  else if (command.do === 'keys') ways.toggleKeys();
  else if (command.do === 'leave') leaveStep(desk);
  else if (!data.mayChange) return;
  else if (command.do === 'undo') desk.change(undo);
  else if (command.do === 'redo') desk.change(redo);
  else if (command.do === 'in' || command.do === 'out') setMarks(setMark(marks, command.do, clock.now()));
  else if (command.do === 'clear-marks') setMarks(NO_MARKS);
  else if (command.do === 'chapter') ways.addChapter();
  else if (command.do === 'bench') ways.toBench();
  else if (command.do === 'note' || command.do === 'kind') beginNote(desk, ways, command);
  else onMarked(desk, command);
}

function beginNote(desk: Desk, ways: Ways, command: Command): void {
  const { clock, setDraft } = desk;
  clock.player()?.pause();
  setDraft((draft) => {
    const begun = { ...draft, at: draft.text === '' ? clock.now() : (draft.at ?? clock.now()) };
    return command.do === 'kind' ? withKind(begun, command.kind) : begun;
  });
  ways.openComposer();
}

/** From the field to the list, from the list to nothing. */
function leaveStep(desk: Desk): void {
  if (desk.editing !== null) desk.setEditing(null);
  else desk.mark(null);
}

function goToNote(desk: Desk, ways: Ways, by: 1 | -1): void {
  const { clock, state } = desk;
  const rows = shown(state, 'note').map((row) => ({ row, ...placeAt(row.form.position, clock.rate) }));
  const at = rows.findIndex(({ row }) => row.id === desk.marked);
  const beside =
    by === 1
      ? rows.find(({ frame }) => frame > clock.now())
      : rows.findLast(({ frame }) => frame < clock.now());
  const marked = rows[at];
  // From the marked note step by step, so that notes at one frame are each reached.
  const next = marked?.frame === clock.now() ? rows[at + by] : beside;
  if (!next) return;
  clock.seek(next.frame);
  desk.mark(next.row.id);
  ways.toNote(next.row.id);
}

/** The note that keys act on: the marked one, or the last that has begun. */
function markedNote({ clock, state, marked }: Desk): Row<'note'> | undefined {
  const rows = shown(state, 'note');
  return (
    rows.find(({ id }) => id === marked) ??
    rows.findLast(({ form }) => placeAt(form.position, clock.rate).frame <= clock.now())
  );
}

function onMarked(desk: Desk, command: Command): void {
  const { clock, data, edit, remove, setEditing, mark } = desk;
  const row = markedNote(desk);
  if (!row || !mayChangeNote(row.form, row.stored?.note ?? null, data)) return;
  const { position } = row.form;
  mark(row.id);
  if (command.do === 'edit') setEditing(row.id);
  if (command.do === 'delete') remove(row);
  if (command.do === 'move-here')
    edit(row.id, { position: movedTo(position, clock.now(), clock.rate) }, 'Move a note');
  if (command.do === 'nudge') {
    const moved = movePlace(position, command.by * framesIn(command.size, position.rate), null);
    edit(row.id, { position: moved }, 'Move a note', `place ${row.id}`);
    clock.seek(placeAt(moved, clock.rate).frame);
  }
}
