import { describe, expect, test } from 'vitest';
import { type Part, PartInput } from '../../../src/features/parts/part.ts';
import { textsOf } from '../../../src/features/parts/part-texts.ts';
import {
  countNumbers,
  errorsOf,
  noteConflicts,
  noteRefused,
  noteSaved,
  pendingChanges,
  settle,
  takeIn,
} from '../../../src/features/parts/components/parts-table-saving.ts';
import {
  deleteRows,
  editCells,
  redo,
  shownRows,
  startTable,
  type TableState,
  undo,
} from '../../../src/features/parts/components/parts-table-state.ts';

function part(id: string, number: string, name: string, version = 1): Part {
  return { ...PartInput.parse({ number, name }), id, version };
}

const TWO = startTable([part('a', '1', 'rail'), part('b', '2', 'upright')]);
const names = (state: TableState) => shownRows(state).map(({ texts }) => texts.name);

/** Saves what waits as the server would. */
function saved(state: TableState): TableState {
  const sent = pendingChanges(state);
  const rows = sent.flatMap((change) => {
    if (change.do === 'delete') return [];
    const before = state.rows.find(({ id }) => id === change.id)?.stored?.part;
    if (change.do === 'restore') return before ? [{ ...before, version: change.version + 1 }] : [];
    return [{ ...change.fields, id: change.id, version: change.do === 'add' ? 1 : change.version + 1 }];
  });
  return noteSaved(state, sent, rows);
}

describe('what is typed', () => {
  test('takes its usual form and waits to be saved with the version it saw', () => {
    const state = editCells(TWO, [{ id: 'a', texts: { kind: 'B', quantity: ' 2 needed' } }], 'Change a cell');
    expect(pendingChanges(state)).toMatchObject([
      { do: 'change', id: 'a', version: 1, fields: { kind: 'bought', quantity: 2, name: 'rail' } },
    ]);
    expect(pendingChanges(saved(state))).toEqual([]);
  });

  test('is kept when it cannot be read, and not sent', () => {
    const state = editCells(TWO, [{ id: 'a', texts: { quantity: 'two' } }], 'Change a cell');
    const [row] = shownRows(state);
    expect(row?.texts.quantity).toBe('two');
    expect(errorsOf(row!, countNumbers(state.rows))).toHaveProperty('quantity');
    expect(pendingChanges(state)).toEqual([]);
  });

  test('begins a part, which is sent once it has a number and a name', () => {
    const begun = editCells(TWO, [{ id: 'n', texts: { number: '3' } }], 'Change a cell');
    expect(pendingChanges(begun)).toEqual([]);
    const named = editCells(begun, [{ id: 'n', texts: { name: 'beam' } }], 'Change a cell');
    expect(pendingChanges(named)).toMatchObject([
      { do: 'add', id: 'n', fields: { kind: 'made', quantity: 1 } },
    ]);
    expect(pendingChanges(saved(named))).toEqual([]);
  });

  test('that doubles a number is said at both rows, and neither is sent', () => {
    const state = editCells(TWO, [{ id: 'b', texts: { number: '1' } }], 'Change a cell');
    const numbers = countNumbers(state.rows);
    expect(shownRows(state).map((row) => errorsOf(row, numbers).number)).toEqual([
      'Number 1 is in the list twice.',
      'Number 1 is in the list twice.',
    ]);
    expect(pendingChanges(state)).toEqual([]);
  });
});

describe('undo', () => {
  test('takes a paste back whole, as the inverse changes with the versions they expect', () => {
    const pasted = saved(
      editCells(
        TWO,
        [
          { id: 'a', texts: { name: 'base rail' } },
          { id: 'n', texts: { number: '3', name: 'beam' } },
        ],
        'Paste 2 rows',
      ),
    );
    const back = undo(pasted);
    expect(names(back)).toEqual(['rail', 'upright']);
    expect(pendingChanges(back)).toMatchObject([
      { do: 'change', id: 'a', version: 2, fields: { name: 'rail' } },
      { do: 'delete', id: 'n', version: 1 },
    ]);
    const again = redo(saved(back));
    expect(names(again)).toEqual(['base rail', 'upright', 'beam']);
    expect(pendingChanges(again)).toMatchObject([
      { do: 'change', id: 'a', version: 3 },
      { do: 'restore', id: 'n', version: 2 },
    ]);
  });

  test('brings a deleted part back', () => {
    const state = saved(deleteRows(TWO, ['a']));
    expect(names(state)).toEqual(['upright']);
    expect(pendingChanges(undo(state))).toEqual([{ do: 'restore', id: 'a', version: 2 }]);
  });

  test('of what was never saved sends nothing', () => {
    expect(
      pendingChanges(undo(editCells(TWO, [{ id: 'n', texts: { number: '3', name: 'x' } }], 'Paste'))),
    ).toEqual([]);
  });

  test('is used up by something new', () => {
    const state = editCells(
      undo(deleteRows(TWO, ['a'])),
      [{ id: 'b', texts: { name: 'post' } }],
      'Change a cell',
    );
    expect(redo(state)).toBe(state);
  });
});

describe('an answer', () => {
  test('that refuses a row stands at its cell until the row changes', () => {
    const state = editCells(TWO, [{ id: 'a', texts: { number: '9' } }], 'Change a cell');
    const sent = pendingChanges(state);
    const refused = noteRefused(state, sent, { 'changes.0.number': 'Number 9 is taken.' }, 'Not saved.');
    const numbers = countNumbers(refused.rows);
    expect(errorsOf(refused.rows[0]!, numbers)).toEqual({ number: 'Number 9 is taken.' });
    expect(pendingChanges(refused)).toEqual([]);
    expect(pendingChanges(editCells(refused, [{ id: 'a', texts: { number: '8' } }], 'Change'))).toHaveLength(
      1,
    );
  });

  test('that comes while more is typed does not take it away', () => {
    const state = editCells(TWO, [{ id: 'a', texts: { name: 'one' } }], 'Change a cell');
    const sent = pendingChanges(state);
    const more = editCells(state, [{ id: 'a', texts: { size: '40' } }], 'Change a cell');
    const after = noteSaved(more, sent, [part('a', '1', 'one', 2)]);
    expect(pendingChanges(after)).toMatchObject([
      { do: 'change', version: 2, fields: { name: 'one', size: '40' } },
    ]);
  });

  test('of a conflict keeps both texts; one is chosen', () => {
    const mine = editCells(TWO, [{ id: 'a', texts: { name: 'mine' } }], 'Change a cell');
    const both = noteConflicts(mine, [{ ...part('a', '1', 'theirs', 4), deleted: false }]);
    expect(both.rows[0]).toMatchObject({ texts: { name: 'mine' }, conflict: { part: { name: 'theirs' } } });
    expect(pendingChanges(both)).toEqual([]);
    expect(pendingChanges(settle(both, 'a', 'mine'))).toMatchObject([
      { version: 4, fields: { name: 'mine' } },
    ]);
    expect(names(settle(both, 'a', 'theirs'))).toEqual(['theirs', 'upright']);
  });

  test('of a conflict in which both wrote the same is none', () => {
    const mine = editCells(TWO, [{ id: 'a', texts: { name: 'same' } }], 'Change a cell');
    const after = noteConflicts(mine, [{ ...part('a', '1', 'same', 2), deleted: false }]);
    expect(after.rows[0]).toMatchObject({ conflict: null, stored: { part: { version: 2 } } });
  });
});

test('what others saved is taken in, but not over what waits here', () => {
  const mine = editCells(TWO, [{ id: 'a', texts: { name: 'mine' } }], 'Change a cell');
  const after = takeIn(mine, [
    part('a', '1', 'theirs', 2),
    part('c', '10', 'new'),
    part('b', '2', 'post', 2),
  ]);
  expect(names(after)).toEqual(['mine', 'post', 'new']);
});

test('a part that others deleted goes, and an older answer changes nothing', () => {
  expect(names(takeIn(TWO, [part('a', '1', 'rail')]))).toEqual(['rail']);
  const newer = startTable([part('a', '1', 'rail', 5)]);
  expect(names(takeIn(newer, [part('a', '1', 'old', 3)]))).toEqual(['rail']);
});

test('every text in its usual form is read back the same', () => {
  const texts = textsOf(part('a', 'K03', 'key'));
  expect(textsOf(PartInput.parse(texts))).toEqual(texts);
});
