import { expect, test } from 'vitest';
import { readPlainRequest } from '../../../src/server/http/plain-request.ts';

const HOST = 'Host: shop.example\r\n';
const get = (headers: string, line = 'GET /w/a?t=1:20 HTTP/1.1') => `${line}\r\n${headers}\r\n`;

test('reads the path, the host and what matters for a kept page', () => {
  const text = get(
    `${HOST}accept-encoding: br\r\nIf-None-Match:  "x" \r\nCookie: a=b\r\nConnection: Keep-Alive\r\n`,
  );
  expect(readPlainRequest(text)).toEqual({
    path: '/w/a',
    host: 'shop.example',
    acceptEncoding: 'br',
    ifNoneMatch: '"x"',
  });
});

test.each([
  ['another method', get(HOST, 'POST /w/a HTTP/1.1')],
  ['HEAD', get(HOST, 'HEAD /w/a HTTP/1.1')],
  ['HTTP/1.0', get(HOST, 'GET /w/a HTTP/1.0')],
  ['an absolute target', get(HOST, 'GET http://shop.example/w/a HTTP/1.1')],
  ['no host', get('Accept: */*\r\n')],
  ['two hosts', get(HOST + 'host: other.example\r\n')],
  ['a body announced by length', get(HOST + 'CONTENT-LENGTH: 0\r\n')],
  ['a body in chunks', get(HOST + 'Transfer-Encoding : chunked\r\n')],
  ['a body in chunks, plainly', get(HOST + 'Transfer-Encoding: chunked\r\n')],
  ['an upgrade', get(HOST + 'Upgrade: websocket\r\n')],
  ['an expectation', get(HOST + 'Expect: 100-continue\r\n')],
  ['closing the connection', get(HOST + 'Connection: close\r\n')],
  ['a folded line', get(HOST + 'X-A: 1\r\n two\r\n')],
  ['a bare line feed', get(HOST + 'X-A: 1\nTransfer-Encoding: chunked\r\n')],
  ['a bare carriage return', get(HOST + 'X-A: 1\rX-B: 2\r\n')],
  ['a NUL', get(HOST + 'X-A: \0\r\n')],
  ['two requests', get(HOST) + get(HOST)],
  ['half a request', get(HOST).slice(0, -2)],
  ['bytes after the request', `${get(HOST)}x`],
  ['more than 8 KiB', get(`${HOST}Cookie: ${'a'.repeat(9_000)}\r\n`)],
])('leaves %s to the HTTP server', (_what, text) => {
  expect(readPlainRequest(text)).toBeNull();
});
