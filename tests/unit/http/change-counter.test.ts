import { expect, test, vi } from 'vitest';
import { ChangeCounter } from '../../../src/server/http/change-counter.ts';

test('a tag has moved since a number exactly when it was named after it', () => {
  const changes = new ChangeCounter();
  changes.move(['build:1']);
  const now = changes.counter();
  expect(changes.movedSince(['build:1'], now)).toBe(false);
  changes.move(['build:2']);
  expect(changes.movedSince(['build:1'], now)).toBe(false);
  expect(changes.movedSince(['build:1', 'build:2'], now)).toBe(true);
});

test('* moves every tag', () => {
  const changes = new ChangeCounter();
  const now = changes.counter();
  changes.move(['*']);
  expect(changes.movedSince(['build:1'], now)).toBe(true);
  expect(changes.movedSince(['build:1'], changes.counter())).toBe(false);
});

test('forgetting tags makes others look changed, never the reverse', () => {
  const changes = new ChangeCounter(2);
  const now = changes.counter();
  for (const tag of ['build:1', 'build:2', 'build:3']) changes.move([tag]);
  for (const tag of ['build:1', 'build:2', 'build:3']) expect(changes.movedSince([tag], now)).toBe(true);
  expect(changes.movedSince(['build:1'], changes.counter())).toBe(false);
});

test('listeners hear each change until they leave', () => {
  const changes = new ChangeCounter();
  const listener = vi.fn();
  const leave = changes.subscribe(listener);
  changes.move(['build:1']);
  leave();
  changes.move(['build:2']);
  expect(listener.mock.calls).toEqual([[['build:1']]]);
});
