import { describe, expect, it } from 'vitest';
import { chapterAt } from '../../../../src/domain/chapters/chapter.ts';
import { checkChapters } from '../../../../src/domain/chapters/check-chapters.ts';

const at = (...starts: number[]) =>
  starts.map((seconds) => ({ start: seconds * 1000, title: `From ${String(seconds)}` }));
const rules = (starts: number[], length: number | null) =>
  checkChapters(at(...starts), length).map(({ rule, index }) => [rule, index]);

// Common practice of video hosts, read from three help pages: first at 0:00, three at least, rising, 10 s each.
describe('checkChapters', () => {
  it.each<[string, number[], number | null, [string, number | null][]]>([
    ['three of 10 s', [0, 10, 20], 30_000, []],
    ['the last of them too short before the end', [0, 10, 20], 29_999, [['short', 2]]],
    ['the last of them of unknown length', [0, 10, 20], null, []],
    ['the first at 0:01', [1, 20, 40], null, [['first', 0]]],
    ['two', [0, 60], null, [['few', null]]],
    ['none', [], null, [['few', null]]],
    ['one of 9.999 s', [0, 9.999, 40], null, [['short', 0]]],
    ['two at one time', [0, 60, 60], null, [['order', 2]]],
    ['one that goes back', [0, 60, 30], null, [['order', 2]]],
    ['one after the end', [0, 60, 120], 100_000, [['end', 2]]],
  ])('says of %s what is wrong', (_name, starts, length, faults) => {
    expect(rules(starts, length)).toEqual(faults);
  });

  it('wants a title', () => {
    const faults = checkChapters([...at(0, 10), { start: 20_000, title: ' ' }], null);
    expect(faults).toEqual([{ rule: 'title', index: 2, sentence: 'The chapter at 0:20 has no title.' }]);
  });
});

describe('chapterAt', () => {
  const chapters = at(0, 10, 20);

  it.each([
    [0, 0],
    [9999, 0],
    [10_000, 1],
    [99_999, 2],
  ])('at %i ms is number %i', (time, index) => {
    expect(chapterAt(chapters, time)).toBe(index);
  });

  it('is none before the first', () => {
    expect(chapterAt(at(5), 4999)).toBeNull();
  });
});
