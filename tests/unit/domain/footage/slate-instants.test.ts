import fc from 'fast-check';
import { expect, test } from 'vitest';
import { slateInstants } from '../../../../src/domain/footage/slate-instants.ts';

test('a film of a minute is looked at in its first and its last 15 seconds, five times a second', () => {
  const [first = [], last = [], ...more] = slateInstants(60);
  expect(more).toEqual([]);
  expect([first.length, first[0], first[1], first.at(-1)]).toEqual([75, 0.1, 0.3, 14.9]);
  expect([last.length, last[0], last.at(-1)]).toEqual([75, 45.1, 59.9]);
});

test('a film of 20 seconds is looked at once throughout', () => {
  const all = slateInstants(20).flat();
  expect([all.length, all[0], all.at(-1)]).toEqual([100, 0.1, 19.9]);
});

test('a film of a few seconds is one stretch', () => {
  expect(slateInstants(0.5)).toEqual([[0.1, 0.3]]);
});

test('instants rise, and lie in the film however long it is', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.01, max: 36_000, noNaN: true }), (seconds) => {
      const all = slateInstants(seconds).flat();
      expect(all.length).toBeGreaterThan(0);
      for (const [index, at] of all.entries()) {
        expect(at).toBeGreaterThan(all[index - 1] ?? 0);
        expect(at).toBeLessThan(seconds);
      }
    }),
  );
});
