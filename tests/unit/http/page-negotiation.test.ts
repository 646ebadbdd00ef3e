import { expect, test } from 'vitest';
import { choosePageEncoding, matchesEtag } from '../../../src/server/http/page-negotiation.ts';

test.each([
  [undefined, 'identity'],
  ['', 'identity'],
  ['gzip, deflate, br, zstd', 'br'],
  ['gzip, deflate', 'gzip'],
  ['deflate', 'identity'],
  ['br;q=0.2, gzip;q=0.8', 'gzip'],
  ['br;q=0, gzip', 'gzip'],
  ['br;q=0', 'identity'],
  ['GZIP;Q=1', 'gzip'],
  ['*', 'br'],
  ['identity, gzip;q=0.5', 'identity'],
])('chooses for Accept-Encoding %s the form %s', (header, form) => {
  expect(choosePageEncoding(header)).toBe(form);
});

test.each([
  ['"a"', true],
  ['W/"a"', true],
  ['"b", "a"', true],
  ['*', true],
  ['"a-br"', false],
  ['a', false],
  [undefined, false],
])('If-None-Match %s against "a" is %s', (header, matches) => {
  expect(matchesEtag(header, '"a"')).toBe(matches);
});
