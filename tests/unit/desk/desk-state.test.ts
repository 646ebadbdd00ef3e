import { describe, expect, test } from 'vitest';
import { type Note } from '../../../src/features/notes/note.ts';
import {
  addRow,
  deleteRow,
  editRow,
  endRun,
  findRow,
  lost,
  redo,
  shown,
  startDesk,
  undo,
} from '../../../src/features/episodes/components/desk/desk-state.ts';
import {
  isStored,
  markOf,
  noteConflict,
  noteGone,
  noteRefused,
  noteSaved,
  pendingOps,
  settle,
  takeIn,
} from '../../../src/features/episodes/components/desk/desk-saving.ts';
import { putBack, unsavedRows } from '../../../src/features/episodes/components/desk/unsaved-rows.ts';

const ID = '019a0000-0000-7000-8000-000000000001';
const OTHER = '019a0000-0000-7000-8000-000000000002';

function aNote(given: Partial<Note> = {}): Note {
  return {
    id: ID,
    version: 1,
    kind: 'step',
    text: 'Face the shaft.',
    audience: 'viewers',
    asked: null,
    answer: null,
    standing: null,
    topic: null,
    proposed: false,
    partIds: [],
    position: { frame: 100, endFrame: null, rate: { num: 25, den: 1 } },
    place: null,
    writtenBy: 'Wren',
    ...given,
  };
}

const lists = (...notes: Note[]) => ({ notes, chapters: [], appearances: [], checks: [], offCamera: [] });
const texts = (state: Parameters<typeof shown>[0]) => shown(state, 'note').map(({ form }) => form.text);
const type = (state: Parameters<typeof shown>[0], text: string) =>
  editRow(state, ID, { text }, 'Change a note', `text ${ID}`);

describe('a desk', () => {
  test('has nothing to save at first', () => {
    expect(pendingOps(startDesk(lists(aNote())))).toEqual([]);
  });

  test('asks for a change with the version it has seen', () => {
    const state = type(startDesk(lists(aNote({ version: 4 }))), 'Turn it.');
    expect(pendingOps(state)).toMatchObject([{ do: 'change', what: 'note', id: ID, version: 4 }]);
  });

  test('takes typing in one field back in one step, until the field is left', () => {
    let state = type(type(startDesk(lists(aNote())), 'Turn'), 'Turn it.');
    state = type(endRun(state), 'Turn it round.');
    state = undo(state);
    expect(texts(state)).toEqual(['Turn it.']);
    expect(texts(undo(state))).toEqual(['Face the shaft.']);
    expect(texts(redo(state))).toEqual(['Turn it round.']);
  });

  test('does not send what the server would refuse', () => {
    const state = type(startDesk(lists(aNote())), '  ');
    expect(pendingOps(state)).toEqual([]);
    expect(state.rows.map(markOf)).toEqual(['open']);
  });

  test('undoes a delete that is stored by bringing the note back', () => {
    let state = deleteRow(startDesk(lists(aNote())), ID, 'Delete a note');
    const [op] = pendingOps(state);
    expect(op).toMatchObject({ do: 'delete', version: 1 });
    if (op) state = noteSaved(state, op, aNote({ version: 2 }));
    expect(pendingOps(undo(state))).toMatchObject([{ do: 'restore', version: 2 }]);
    expect(texts(undo(state))).toEqual(['Face the shaft.']);
  });

  test('undoes an add that never left without asking anything', () => {
    const { position } = aNote();
    const form = { title: 'Shaft', position };
    const state = undo(addRow(startDesk(lists()), { what: 'chapter', id: OTHER, form }, 'Add a chapter'));
    expect(pendingOps(state)).toEqual([]);
    expect(pendingOps(redo(state))).toMatchObject([{ do: 'add', what: 'chapter', id: OTHER }]);
  });

  test('moves a note and moves it back', () => {
    const position = { frame: 150, endFrame: null, rate: { num: 25, den: 1 } };
    const state = editRow(startDesk(lists(aNote())), ID, { position }, 'Move a note');
    expect(findRow(state, ID)?.form.position.frame).toBe(150);
    expect(findRow(undo(state), ID)?.form.position.frame).toBe(100);
  });
});

describe('saving', () => {
  test('keeps what was typed while the answer was on its way', () => {
    let state = type(startDesk(lists(aNote())), 'Turn');
    const [op] = pendingOps(state);
    state = type(state, 'Turn it.');
    if (op) state = noteSaved(state, op, aNote({ version: 2, text: 'Turn' }));
    expect(texts(state)).toEqual(['Turn it.']);
    expect(pendingOps(state)).toMatchObject([{ do: 'change', version: 2 }]);
  });

  test('leaves the space after a word where it was typed, though the server takes it off', () => {
    let state = type(startDesk(lists(aNote())), 'Turn ');
    const [op] = pendingOps(state);
    const stored = aNote({ version: 2, text: 'Turn' });
    if (op) state = noteSaved(state, op, stored);
    expect(pendingOps(state)).toEqual([]);
    expect(texts(takeIn(state, lists(stored)))).toEqual(['Turn ']);
    expect(texts(type(state, 'Turn it.'))).toEqual(['Turn it.']);
  });

  test('is done with a row that was to go and is not there any more', () => {
    let state = deleteRow(startDesk(lists(aNote())), ID, 'Delete a note');
    const [op] = pendingOps(state);
    if (op) state = noteGone(state, op);
    expect(state.rows.map(markOf)).toEqual(['saved']);
  });

  test('keeps both texts when someone else saved, and sends mine on top of theirs', () => {
    let state = type(startDesk(lists(aNote())), 'Mine');
    const [op] = pendingOps(state);
    if (op) state = noteConflict(state, op, aNote({ version: 2, text: 'Theirs' }));
    expect(pendingOps(state)).toEqual([]);
    expect(state.rows[0]?.conflict?.form).toMatchObject({ text: 'Theirs' });
    expect(pendingOps(settle(state, ID, 'mine'))).toMatchObject([{ do: 'change', version: 2 }]);
    const theirs = settle(state, ID, 'theirs');
    expect(texts(theirs)).toEqual(['Theirs']);
    expect(theirs.rows.every(isStored)).toBe(true);
  });

  test('offers to bring back a note that someone else deleted while it was changed', () => {
    let state = type(startDesk(lists(aNote())), 'Mine');
    const [op] = pendingOps(state);
    if (op) state = noteConflict(state, op, { ...aNote({ version: 2 }), deleted: true });
    expect(pendingOps(settle(state, ID, 'mine'))).toMatchObject([{ do: 'restore', version: 2 }]);
    expect(texts(settle(state, ID, 'theirs'))).toEqual([]);
  });

  test('does not try again what was refused, until it is changed', () => {
    let state = type(startDesk(lists(aNote())), 'Mine');
    const [op] = pendingOps(state);
    if (op) state = noteRefused(state, op, 'The owner changes it.', {});
    expect(pendingOps(state)).toEqual([]);
    expect(pendingOps(type(state, 'Mine again'))).toHaveLength(1);
  });

  test('takes in what others wrote, but never over what is being written here', () => {
    const state = type(startDesk(lists(aNote(), aNote({ id: OTHER }))), 'Mine');
    const next = takeIn(
      state,
      lists(aNote({ version: 2, text: 'Theirs' }), aNote({ id: OTHER, version: 2, text: 'New' })),
    );
    expect(texts(next)).toEqual(['Mine', 'New']);
    expect(texts(takeIn(startDesk(lists(aNote())), lists()))).toEqual([]);
  });

  test('is not undone by an older answer', () => {
    const state = startDesk(lists(aNote({ version: 3, text: 'Newer' })));
    expect(texts(takeIn(state, lists(aNote({ version: 2, text: 'Older' }))))).toEqual(['Newer']);
  });
});

describe('over a reload', () => {
  test('unsaved rows come back, and wait to be saved', () => {
    const state = type(startDesk(lists(aNote())), 'Mine');
    const again = putBack(startDesk(lists(aNote())), unsavedRows(state));
    expect(texts(again)).toEqual(['Mine']);
    expect(pendingOps(again)).toHaveLength(1);
  });

  test('a row that someone else saved meanwhile comes back as two versions', () => {
    const state = type(startDesk(lists(aNote())), 'Mine');
    const again = putBack(startDesk(lists(aNote({ version: 2, text: 'Theirs' }))), unsavedRows(state));
    expect(again.rows[0]?.conflict?.form).toMatchObject({ text: 'Theirs' });
    expect(texts(again)).toEqual(['Mine']);
  });

  test('what was typed into a row that someone else deleted meanwhile is asked about, not lost', () => {
    const state = type(startDesk(lists(aNote())), 'Mine');
    const again = putBack(startDesk(lists()), unsavedRows(state));
    expect(texts(again)).toEqual(['Mine']);
    expect(pendingOps(again)).toMatchObject([{ do: 'change', version: 1 }]);
    expect(texts(takeIn(again, lists()))).toEqual(['Mine']);
  });
});

describe('a row and the edit', () => {
  const stands = (position: Note['position'], place: Note['place'] = null) => aNote({ position, place });
  const NOWHERE: Note['place'] = {
    status: 'lost',
    also: [],
    byPicture: false,
    toEdge: false,
    dropped: null,
    on: null,
  };
  const at = (frame: number, num = 25): Note['position'] => ({
    frame,
    endFrame: null,
    rate: { num, den: 1 },
  });

  test('stands where the server has placed it once it is saved, and is not sent again', () => {
    const moved = editRow(startDesk(lists(stands(at(100)))), ID, { position: at(4050, 1000) }, 'Move a note');
    const [op] = pendingOps(moved);
    const saved = noteSaved(moved, op!, { ...stands(at(101)), version: 2 });
    expect(findRow(saved, ID)?.form.position).toEqual(at(101));
    expect(pendingOps(saved)).toEqual([]);
  });

  test('is not moved back when it was moved on while it was saved', () => {
    const moved = editRow(startDesk(lists(stands(at(100)))), ID, { position: at(101) }, 'Move a note');
    const [op] = pendingOps(moved);
    const on = editRow(moved, ID, { position: at(200) }, 'Move a note');
    const saved = noteSaved(on, op!, { ...stands(at(101)), version: 2 });
    expect(findRow(saved, ID)?.form.position).toEqual(at(200));
    expect(pendingOps(saved)).toHaveLength(1);
  });

  test('that is not in it stands apart until it is given a place', () => {
    const state = startDesk(lists(stands(at(0), NOWHERE)));
    expect([shown(state, 'note').length, lost(state).length]).toEqual([0, 1]);
    const placed = editRow(state, ID, { position: at(40) }, 'Place by hand');
    expect([shown(placed, 'note').length, lost(placed).length]).toEqual([1, 0]);
  });
});
