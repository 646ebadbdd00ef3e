import { expect, test } from 'vitest';
import { readRequestTarget } from '../../../src/server/http/request-target.ts';

const ORIGIN = 'http://shop.example';
const read = (url: string, method = 'GET') => readRequestTarget(method, url, ORIGIN);

test.each([
  ['/w/a?t=1', '/w/a', '?t=1'],
  ['/w/../bench/x', '/bench/x', ''],
  ['/w/%2e%2E/bench', '/bench', ''],
  ['/w/%61-%c3%a9', '/w/a-%C3%A9', ''],
  ['/w/a%2Fb', '/w/a%2Fb', ''],
  ['/w/%252e%252e/x', '/w/%252e%252e/x', ''],
  ['//other.example/x', '//other.example/x', ''],
  [`${ORIGIN}/w/a?b`, '/w/a', '?b'],
])('reads %s as path %s and query %s', (url, path, query) => {
  expect(read(url)).toEqual({ path, query });
});

test.each([
  ['/%', 400],
  ['/%ff', 400],
  ['/a%00b', 400],
  ['*', 400],
  ['http://other.example/', 400],
  [`/${'a'.repeat(8 * 1024)}`, 414],
])('refuses %s', (url, status) => {
  expect(read(url)).toMatchObject({ status });
});

test('tells methods that are not allowed from those that it does not know', () => {
  expect(read('/', 'TRACE')).toMatchObject({ status: 405 });
  expect(read('/', 'PROPFIND')).toMatchObject({ status: 501 });
});
