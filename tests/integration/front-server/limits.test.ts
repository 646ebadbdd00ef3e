import { type IncomingMessage, type ServerResponse } from 'node:http';
import { connect } from 'node:net';
import { expect, test, vi } from 'vitest';
import { type Render } from '../../../src/server/http/page-render.ts';
import { ask, talk } from './support/ask.ts';
import { startFront } from './support/start-front.ts';

/** An application that reads the whole body and says how long it was. */
async function reading(req: IncomingMessage, res: ServerResponse): Promise<void> {
  let length = 0;
  for await (const chunk of req as AsyncIterable<Buffer>) length += chunk.length;
  res.end(String(length));
}

const chunked = { 'transfer-encoding': 'chunked' };
const MEBIBYTE = 1024 * 1024;

test.each([
  ['announced', {}],
  ['streamed', chunked],
])('a body of one mebibyte passes, %s', async (_how, headers) => {
  const front = await startFront({ render: reading });
  const answer = await ask(front, '/api/a', { method: 'POST', body: Buffer.alloc(MEBIBYTE), headers });
  expect(answer).toMatchObject({ status: 200, text: String(MEBIBYTE) });
});

test.each([
  ['announced', {}],
  ['streamed', chunked],
])('a larger body is refused with a sentence and the connection closed, %s', async (_how, headers) => {
  const front = await startFront({ render: reading });
  const answer = await ask(front, '/api/a', { method: 'POST', body: Buffer.alloc(3 * MEBIBYTE), headers });
  expect(answer).toMatchObject({ status: 413, text: 'A request may bring at most 1048576 bytes here.\n' });
  expect(answer.headers.connection).toBe('close');
  await expect.poll(() => front.log.filter(({ msg }) => msg === 'request')).toMatchObject([{ status: 413 }]);
  expect(front.log.filter(({ level }) => level === 50)).toEqual([]);
});

test('a path may have a limit of its own', async () => {
  const front = await startFront({ render: reading, bodyLimit: (path) => (path === '/api/table' ? 10 : 5) });
  const post = (path: string) => ask(front, path, { method: 'POST', body: '12345678' });
  expect(await post('/api/table')).toMatchObject({ status: 200, text: '8' });
  expect(await post('/api/other')).toMatchObject({ status: 413 });
});

test('a client that asks first is told before it sends', async () => {
  const front = await startFront({ render: reading });
  const head = `POST /api/a HTTP/1.1\r\nHost: ${front.host}\r\nExpect: 100-continue\r\nConnection: close\r\n`;
  expect(await talk(front, `${head}Content-Length: 2\r\n\r\n`, 'ok')).toMatch(
    /^HTTP\/1\.1 100 [^]*HTTP\/1\.1 200 /,
  );
  expect(await talk(front, `${head}Content-Length: 9999999\r\n\r\n`)).toMatch(/^HTTP\/1\.1 413 /);
});

test.each([
  ['POST /api/a HTTP/1.1\r\nHost: HOST\r\nContent-Length: 5\r\nTransfer-Encoding: chunked\r\n\r\n', 400],
  ['GET /% HTTP/1.1\r\nHost: HOST\r\nConnection: close\r\n\r\n', 400],
  ['GET /a%00 HTTP/1.1\r\nHost: HOST\r\nConnection: close\r\n\r\n', 400],
  [`GET /${'a'.repeat(9_000)} HTTP/1.1\r\nHost: HOST\r\nConnection: close\r\n\r\n`, 414],
  [`GET / HTTP/1.1\r\nHost: HOST\r\nX-A: ${'a'.repeat(20_000)}\r\n\r\n`, 431],
  ['TRACE / HTTP/1.1\r\nHost: HOST\r\nConnection: close\r\n\r\n', 405],
  ['PROPFIND / HTTP/1.1\r\nHost: HOST\r\nConnection: close\r\n\r\n', 501],
  ['BREW / HTTP/1.1\r\nHost: HOST\r\n\r\n', 400],
  ['GET / HTTP/1.1\r\n\r\n', 400],
])('%j is answered %d and never reaches the application', async (bytes, status) => {
  const render = vi.fn<Render>();
  const front = await startFront({ render });
  expect(await talk(front, bytes.replaceAll('HOST', front.host))).toMatch(`HTTP/1.1 ${String(status)} `);
  expect(render).not.toHaveBeenCalled();
});

test('slow headers and a silent connection are ended', async () => {
  const front = await startFront({ times: { headers: 200 } });
  const startedAt = Date.now();
  const [slow] = await Promise.all([talk(front, 'GET / HTTP/1.1\r\n', 'Host: '), talk(front)]);
  expect(slow).toMatch(/^HTTP\/1\.1 408 /);
  expect(Date.now() - startedAt).toBeLessThan(3_000);
});

test('a client that leaves in the middle of its body leaves nothing behind', async () => {
  const ended = vi.fn();
  const front = await startFront({
    render: async (req, res) => {
      await reading(req, res).catch(ended);
    },
  });
  const socket = connect(front.port, '127.0.0.1');
  socket.write(`POST /api/a HTTP/1.1\r\nHost: ${front.host}\r\nContent-Length: 100\r\n\r\nhalf`);
  await new Promise((resolve) => setTimeout(resolve, 100));
  socket.destroy();
  await expect.poll(() => ended.mock.calls.length).toBe(1);
  await expect.poll(() => front.log).toMatchObject([{ path: '/api/a', aborted: true }]);
});
