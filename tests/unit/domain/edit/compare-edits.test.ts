import { describe, expect, it } from 'vitest';
import { compareEdits } from '../../../../src/domain/edit/compare-edits.ts';
import { type Edit } from '../../../../src/domain/edit/edit.ts';
import { proposeClips } from '../../../../src/domain/edit/propose-clips.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { suggestRates } from '../../../../src/domain/edit/suggest-rates.ts';

function edit(...lines: readonly string[]): Edit {
  const read = readEdl(lines.join('\n'), { rate: { num: 25, den: 1 } });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

const OLD = edit('1 A V C 0 50 0 50', '2 B V C 0 50 50 100', '3 C V C 0 50 100 150', '4 D V C 0 50 150 200');

function changes(...lines: readonly string[]) {
  return compareEdits(OLD, edit(...lines)).map(({ change, before, after }) => [
    change,
    before?.clip ?? after?.clip,
  ]);
}

describe('A new edit beside the one before', () => {
  it('says what is the same, moved, trimmed, new and dropped', () => {
    expect(
      changes('1 A V C 0 50 0 50', '2 C V C 0 50 50 100', '3 D V C 10 50 100 140', '4 E V C 0 9 140 149'),
    ).toEqual([
      ['same', 'A'],
      ['moved', 'C'],
      ['trimmed', 'D'],
      ['new', 'E'],
      ['dropped', 'B'],
    ]);
  });

  it('pairs each use once: a second one is new, and so is another stretch of the clip', () => {
    expect(changes('1 A V C 0 50 0 50', '2 A V C 0 50 50 100', '3 B V C 60 70 100 110').slice(0, 3)).toEqual([
      ['same', 'A'],
      ['new', 'A'],
      ['new', 'B'],
    ]);
  });

  it('pairs what is cut in two with the larger piece', () => {
    const old = edit('1 A V C 0 100 0 100');
    const next = edit('1 A V C 0 10 0 10', '2 A V C 40 100 10 70');
    expect(compareEdits(old, next).map(({ change }) => change)).toEqual(['new', 'trimmed']);
  });
});

describe('The rates of a list that says none', () => {
  const rates = (text: string) =>
    suggestRates(text).map(({ num, den }) => (den === 1 ? String(num) : `${String(num)}/1001`));

  it.each([
    ['1 A V C 00:00:00:00 00:00:01:24 01:00:00:00 01:00:01:24', ['25', '30000/1001', '30']],
    ['1 A V C 00:00:00;00 00:00:01;10 01:00:00;00 01:00:01;10', ['30000/1001', '60000/1001']],
    ['FCM: DROP FRAME\n1 A V C 00:00:00:00 00:00:01:40 0 0', ['60000/1001']],
    ['1 A V C 00:00:00:00 00:00:01:70 0 0', []],
  ])('of %j', (list, expected) => {
    expect(rates(list).slice(0, 3)).toEqual(expected);
  });
});

describe('Clips proposed for the names of a list', () => {
  const footage = [
    { id: 'monday', name: 'C0001.MP4', labels: [0, 60] as const },
    { id: 'tuesday', name: 'C0001.MP4', labels: [3600, 3660] as const },
    { id: 'phone', name: 'IMG_4.mov', labels: null },
  ];
  const propose = (...lines: readonly string[]) =>
    proposeClips(edit(...lines).picture, footage).map(({ name, clips }) => [name, ...clips]);

  it('are told apart by their labels, and offered all where these do not decide', () => {
    expect(propose('1 c0001 V C 01:00:01:00 01:00:02:00 0 25')).toEqual([['c0001', 'tuesday']]);
    expect(propose('1 C0001 V C 02:00:00:00 02:00:01:00 0 25')).toEqual([['C0001', 'monday', 'tuesday']]);
  });

  it('are found by the file where the list’s own name says nothing', () => {
    expect(propose('1 AX V C 0 25 0 25', '* FROM CLIP NAME: Take 3', '* SOURCE FILE: IMG_4.MOV')).toEqual([
      ['Take 3', 'phone'],
    ]);
    expect(propose('1 Z9 V C 0 25 0 25')).toEqual([['Z9']]);
  });
});
