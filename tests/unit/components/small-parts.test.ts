import { describe, expect, it } from 'vitest';
import { matchOptions } from '../../../src/components/match-options.ts';
import { findByLetters, nextIndex } from '../../../src/components/next-index.ts';
import { formatClock } from '../../../src/components/rule/clock.ts';

describe('the clock on the rule', () => {
  it.each([
    [0, '0:00'],
    [58, '0:58'],
    [848.9, '14:08'],
    [3750, '1:02:30'],
    [-1, '0:00'],
  ])('reads %d s as %s', (seconds, text) => {
    expect(formatClock(seconds)).toBe(text);
  });
});

describe('keys in a list', () => {
  const keys = { back: 'ArrowUp', on: 'ArrowDown' };

  it('go round at both ends', () => {
    expect(nextIndex('ArrowDown', 2, 3, keys)).toBe(0);
    expect(nextIndex('ArrowUp', 0, 3, keys)).toBe(2);
  });

  it('enter a list that has no current entry', () => {
    expect(nextIndex('ArrowDown', -1, 3, keys)).toBe(0);
    expect(nextIndex('ArrowUp', -1, 3, keys)).toBe(2);
  });

  it('lead nowhere in an empty list or with another key', () => {
    expect(nextIndex('ArrowDown', 0, 0, keys)).toBeNull();
    expect(nextIndex('a', 0, 3, keys)).toBeNull();
  });

  it('find the next entry by its letter and come back to the first', () => {
    const labels = ['Move', 'Open', 'Mark'];
    expect(findByLetters(labels, 'm', 0)).toBe(2);
    expect(findByLetters(labels, 'm', 2)).toBe(0);
    expect(findByLetters(labels, 'x', 0)).toBe(-1);
  });
});

describe('options matched by what is typed', () => {
  const options = [
    { value: '1', label: 'cylinder', detail: '124' },
    { value: '2', label: 'port adapter', detail: '125' },
    { value: '3', label: 'adapter plate' },
  ];

  it('are all of them when nothing is typed', () => {
    expect(matchOptions(options, '  ')).toBe(options);
  });

  it('hold every word, in the label or the detail', () => {
    expect(matchOptions(options, '125 adap').map(({ value }) => value)).toEqual(['2']);
  });

  it('begin with those that start that way', () => {
    expect(matchOptions(options, 'adapter').map(({ value }) => value)).toEqual(['3', '2']);
  });
});
