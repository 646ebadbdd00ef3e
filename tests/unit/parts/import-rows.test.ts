import { describe, expect, test } from 'vitest';
import { readCsv } from '../../../src/domain/csv/read-csv.ts';
import { looksHeaded, matchColumns } from '../../../src/features/parts/import-columns.ts';
import { planImport } from '../../../src/features/parts/import-rows.ts';
import { type Part, PartInput } from '../../../src/features/parts/part.ts';

const EXISTING: Part[] = [
  { ...PartInput.parse({ number: 'K03', name: 'key', quantity: 4 }), id: 'k', version: 7 },
];
const COLUMNS = { number: 0, name: 1, quantity: 2 };

function plan(text: string, choice: 'leave' | 'update' = 'leave') {
  const read = readCsv(text);
  if (!read.ok) throw new Error(read.error);
  let count = 0;
  return planImport(read.value.rows, COLUMNS, EXISTING, choice, () => `new-${String((count += 1))}`);
}

describe('columns', () => {
  test.each([
    [['Part No.', 'Description', 'Qty'], { number: 0, name: 1, quantity: 2 }],
    [['number', 'name', 'aliases'], { number: 0, name: 1, aliases: 2 }],
    [['Note', 'Material', 'Size', 'Item'], { number: 3, material: 1, size: 2, remark: 0 }],
    [['blue', 'green'], {}],
  ])('%j are matched by their heads', (heads, columns) => {
    expect(matchColumns(heads)).toEqual(columns);
  });

  test('a first row of numbers and names is no head', () => {
    expect(looksHeaded(['101', 'base rail'])).toBe(false);
    expect(looksHeaded(['No', 'anything'])).toBe(true);
  });
});

describe('rows', () => {
  test('are added with the usual values where the list says nothing', () => {
    const { rows, changes, problems } = plan('101,base rail,2\n102,upright\n');
    expect(problems).toBe(0);
    expect(rows.map(({ outcome }) => outcome)).toEqual(['add', 'add']);
    expect(changes).toMatchObject([
      { do: 'add', id: 'new-1', fields: { number: '101', quantity: 2, kind: 'made' } },
      { do: 'add', id: 'new-2', fields: { quantity: 1, inPlans: true } },
    ]);
  });

  test('that are there are left or updated; an empty cell changes nothing', () => {
    expect(plan('k03,spline key,').rows[0]?.outcome).toBe('leave');
    expect(plan('k03,spline key,', 'update').changes).toMatchObject([
      { do: 'change', id: 'k', version: 7, fields: { number: 'k03', name: 'spline key', quantity: 4 } },
    ]);
    expect(plan('K03,key,4', 'update').rows[0]?.outcome).toBe('same');
  });

  test('each say all that is wrong with them', () => {
    const { rows, problems } = plan('1,rail,1\n,nameless,1\n2,,1\n1,again,many\nA/1,slash,0\n');
    expect(problems).toBe(5);
    expect(rows.map((row) => row.problems)).toEqual([
      ['Number 1 also stands on line 4. Keep one of them.'],
      ['Enter a number.'],
      ['Enter a name.'],
      [
        'Needed says “many”. Enter how many are needed: a whole number from 1 to 9999.',
        'Number 1 also stands on line 1. Keep one of them.',
      ],
      [
        'Number says “A/1”. Leave the slash out of the number: A/2 could be A-2.',
        'Needed says “0”. Enter how many are needed: a whole number from 1 to 9999.',
      ],
    ]);
  });
});
