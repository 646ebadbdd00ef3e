import { describe, expect, test } from 'vitest';
import {
  blockCells,
  pasteEdits,
  readClipboard,
  writeClipboard,
} from '../../../src/features/parts/components/clipboard-rows.ts';
import { moveByKey, moveByTab } from '../../../src/features/parts/components/grid-keys.ts';
import { shownRows, startTable } from '../../../src/features/parts/components/parts-table-state.ts';
import { PartInput } from '../../../src/features/parts/part.ts';

const rows = shownRows(
  startTable([
    { ...PartInput.parse({ number: '1', name: 'rail' }), id: 'a', version: 1 },
    { ...PartInput.parse({ number: '2', name: 'post' }), id: 'b', version: 1 },
  ]),
);

describe('the clipboard', () => {
  test.each([
    [
      '1\trail\r\n2\tpost\r\n',
      [
        ['1', 'rail'],
        ['2', 'post'],
      ],
    ],
    ['"a\nb"\t"say ""no"""', [['a\nb', 'say "no"']]],
    ['3/4"\t1" bar', [['3/4"', '1" bar']]],
    ['"open\tx', [['"open', 'x']]],
    ['', [['']]],
  ])('reads %j', (text, cells) => {
    expect(readClipboard(text)).toEqual(cells);
  });

  test('is read back as it was written', () => {
    const cells = [
      ['a\tb', 'say "no"'],
      ['line\nbreak', ''],
    ];
    expect(readClipboard(writeClipboard(cells))).toEqual(cells);
  });

  test('holds the cells of a block', () => {
    expect(blockCells(rows, { top: 0, bottom: 1, left: 0, right: 1 })).toEqual([
      ['1', 'rail'],
      ['2', 'post'],
    ]);
  });

  test('fills down and across, and past the last row adds rows', () => {
    const cells = [
      ['post', 'bought'],
      ['beam', 'made'],
      ['', ''],
    ];
    expect(pasteEdits(rows, { row: 1, column: 1 }, cells, () => 'new')).toEqual([
      { id: 'b', texts: { name: 'post', kind: 'bought' } },
      { id: 'new', texts: { name: 'beam', kind: 'made' } },
    ]);
  });
});

describe('keys', () => {
  const size = { rows: 3, columns: 3 };
  test.each([
    ['ArrowDown', false, [2, 1]],
    ['ArrowDown', true, [2, 1]],
    ['ArrowLeft', false, [1, 0]],
    ['End', true, [2, 2]],
    ['Home', false, [1, 0]],
    ['PageUp', false, [0, 1]],
  ])('%s (to the edge: %s) leads on', (key, jump, [row, column]) => {
    expect(moveByKey(key, jump, { row: 1, column: 1 }, size)).toEqual({ row, column });
  });

  test('Tab leaves the grid at the end of a row, unless something is being typed', () => {
    expect(moveByTab(false, false, { row: 0, column: 2 }, size)).toBeNull();
    expect(moveByTab(false, true, { row: 0, column: 2 }, size)).toEqual({ row: 1, column: 0 });
    expect(moveByTab(true, true, { row: 1, column: 0 }, size)).toEqual({ row: 0, column: 2 });
    expect(moveByTab(false, true, { row: 2, column: 2 }, size)).toBeNull();
  });
});
