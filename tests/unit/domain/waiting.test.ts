import fc from 'fast-check';
import { expect, test } from 'vitest';
import { sortWaiting, URGENCIES, type Waiting } from '../../../src/domain/waiting.ts';

function item(urgency: Waiting['urgency'], what: string, due: string | null = null): Waiting {
  return { urgency, what, href: '/bench', due: due === null ? null : new Date(due) };
}

test('what is urgent comes first; among equals what is due sooner, then what is not due at all', () => {
  const sorted = sortWaiting([
    item('whenever', 'f', '2026-01-01'),
    item('soon', 'e'),
    item('soon', 'd', '2026-03-02'),
    item('soon', 'c', '2026-03-01'),
    item('now', 'b'),
    item('now', 'a', '2030-01-01'),
  ]);
  expect(sorted.map(({ what }) => what).join('')).toBe('abcdef');
});

test('what is due at the same time, or never, stays in its order', () => {
  const sorted = sortWaiting([item('soon', '1'), item('soon', '2'), item('soon', '3')]);
  expect(sorted.map(({ what }) => what)).toEqual(['1', '2', '3']);
});

test('sorting loses nothing, changes nothing that it was given, and sorts what it sorted the same', () => {
  const waiting = fc.record({
    urgency: fc.constantFrom(...URGENCIES),
    what: fc.string(),
    href: fc.constant('/bench'),
    due: fc.option(fc.date({ noInvalidDate: true })),
  });
  fc.assert(
    fc.property(fc.array(waiting), (given) => {
      const before = [...given];
      const sorted = sortWaiting(given);
      expect(given).toEqual(before);
      expect(new Set(sorted)).toEqual(new Set(given));
      expect(sorted).toHaveLength(given.length);
      expect(sortWaiting(sorted)).toEqual(sorted);
    }),
  );
});
