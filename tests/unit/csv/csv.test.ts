import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { decodeText } from '../../../src/domain/csv/decode-text.ts';
import { escapeFormula, unescapeFormula } from '../../../src/domain/csv/formula-cells.ts';
import { findDelimiter, readCsv } from '../../../src/domain/csv/read-csv.ts';
import { writeCsv } from '../../../src/domain/csv/write-csv.ts';

function cellsOf(text: string): readonly (readonly string[])[] {
  const read = readCsv(text);
  if (!read.ok) throw new Error(read.error);
  return read.value.rows.map(({ cells }) => cells);
}

describe('a list', () => {
  test.each([
    ['a,b\n1,2', ','],
    ['a;b\n1,5;2', ';'],
    ['a\tb;c\n1\t2', '\t'],
    ['only one column\nof names', ','],
    ['"a,b,c";x\n"d,e";y', ';'],
  ])('%j has its delimiter found', (text, delimiter) => {
    expect(findDelimiter(text)).toBe(delimiter);
  });

  test('is read with quotes, inch marks, empty rows and old line ends', () => {
    expect(cellsOf('\uFEFFno,name\r\n1,"a ""b"", c"\r\n,\r\n\r\n2,3/4" bar\r\n')).toEqual([
      ['no', 'name'],
      ['1', 'a "b", c'],
      ['2', '3/4" bar'],
    ]);
  });

  test('counts lines as the file does', () => {
    const read = readCsv('a,b\n1,"x\ny"\n\n2,z');
    expect(read.ok && read.value.rows.map(({ line }) => line)).toEqual([1, 2, 5]);
  });

  test('that breaks off says so', () => {
    const read = readCsv('a,b\n1,"cut o');
    expect(read).toMatchObject({ ok: false });
    expect(!read.ok && read.error).toContain('breaks off');
  });

  test('that is empty has no rows', () => {
    expect(cellsOf('')).toEqual([]);
    expect(cellsOf('\n , \n')).toEqual([]);
  });

  test('is read back as it was written', () => {
    const cell = fc.string({ unit: 'grapheme', maxLength: 12 }).map((text) => text.replace(/\r/g, '').trim());
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.constant('x'), cell, cell), { minLength: 1 }), (rows) => {
        const read = readCsv(writeCsv(rows), ',');
        expect(read.ok && read.value.rows.map(({ cells }) => cells)).toEqual(rows);
      }),
    );
  });
});

describe('formulas', () => {
  test.each(['=1+1', '+44', '-3', '@x', "'=1", "''-3"])('%j is harmless and comes back', (cell) => {
    expect(escapeFormula(cell)).toBe(`'${cell}`);
    expect(unescapeFormula(escapeFormula(cell))).toBe(cell);
  });

  test('other cells stay, apostrophes included', () => {
    for (const cell of ["'tis", '3/4"', "'", 'a=b']) {
      expect(escapeFormula(cell)).toBe(cell);
      expect(unescapeFormula(cell)).toBe(cell);
    }
  });
});

describe('a file', () => {
  const bytes = (...all: (number[] | string)[]) =>
    Uint8Array.from(
      all.flatMap((some) => (typeof some === 'string' ? [...Buffer.from(some, 'utf8')] : some)),
    );
  const wide = (text: string) => [...Buffer.from(text, 'utf16le')];

  test.each([
    ['UTF-8', bytes('né')],
    ['UTF-8', bytes([0xef, 0xbb, 0xbf], 'né')],
    ['UTF-16', bytes([0xff, 0xfe], wide('né'))],
    ['UTF-16', bytes(wide('no,né'))],
    ['Windows-1252', bytes([0x6e, 0xe9])],
  ])('in %s is read as that', (encoding, given) => {
    const decoded = decodeText(given);
    expect(decoded).toMatchObject({ ok: true, value: { encoding } });
    expect(decoded.ok && decoded.value.text.endsWith('né')).toBe(true);
  });

  test.each([
    ['a picture', Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 1, 2, 3])],
    ['UTF-16 that is cut off', Uint8Array.from([0xff, 0xfe, 0x6e, 0, 0x6f])],
    ['UTF-8 by its mark alone', Uint8Array.from([0xef, 0xbb, 0xbf, 0xe9, 0x20])],
  ])('that is %s is refused with a sentence', (_what, given) => {
    expect(decodeText(given)).toMatchObject({ ok: false });
  });
});
