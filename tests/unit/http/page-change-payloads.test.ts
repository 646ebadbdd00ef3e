import { expect, test } from 'vitest';
import { pageChangePayloads } from '../../../src/server/http/page-changes.ts';

const tags = (count: number) =>
  Array.from({ length: count }, (_item, at) => `build:${String(at).padStart(36, '0')}`);

test('tags go out together, each once', () => {
  expect(pageChangePayloads(['workshop:1', 'build:2', 'build:2'])).toEqual(['workshop:1,build:2']);
  expect(pageChangePayloads([])).toEqual([]);
});

test('no payload reaches the limit of PostgreSQL, and no tag is lost', () => {
  const many = tags(1_000);
  const payloads = pageChangePayloads(many);
  expect(payloads.every((payload) => Buffer.byteLength(payload) < 8_000)).toBe(true);
  expect(payloads.flatMap((payload) => payload.split(','))).toEqual(many);
});

test('very many tags are said as *', () => {
  expect(pageChangePayloads(tags(5_000))).toEqual(['*']);
  expect(pageChangePayloads(['build:1', '*'])).toEqual(['*']);
});

test.each(['', 'a,b', 'build: 1', 'build:é'])('%j is no tag', (tag) => {
  expect(() => pageChangePayloads([tag])).toThrow(TypeError);
});
