import { Agent } from 'node:http';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';
import { describe, expect, test, vi } from 'vitest';
import { type Render } from '../../../src/server/http/page-render.ts';
import { ask, talk } from './support/ask.ts';
import { makeGate } from './support/gate.ts';
import { startFront, testChanges } from './support/start-front.ts';

const PAGE = `<p>${'A maker turns a stand for the lathe. '.repeat(100)}</p>`;

function pageRender(tags = 'build:1', more: Record<string, string> = {}) {
  return vi.fn<Render>((req, res) => {
    res.writeHead(200, { 'content-type': 'text/html; charset=utf-8', 'x-page-tags': tags, ...more });
    res.end(`${PAGE}<!-- ${req.url ?? ''} -->`);
  });
}

describe.each([
  ['on one connection', () => new Agent({ keepAlive: true, maxSockets: 1 })],
  ['on a connection for each', () => undefined],
])('a kept page, asked for %s', (_how, makeAgent) => {
  test('is rendered once and has the same bytes, with an ETag for each encoding', async () => {
    const render = pageRender();
    const front = await startFront({ render });
    const agent = makeAgent();
    const etags = new Set<unknown>();
    for (const [encoding, decode] of [
      ['identity', (body: Buffer) => body],
      ['gzip', gunzipSync],
      ['br', brotliDecompressSync],
    ] as const) {
      for (let times = 0; times < 2; times += 1) {
        const headers = { 'accept-encoding': encoding };
        const answer = await ask(front, '/w/a', { headers, ...(agent && { agent }) });
        expect(answer.status).toBe(200);
        expect(decode(answer.body).toString()).toBe(`${PAGE}<!-- /w/a -->`);
        expect(answer.headers['content-encoding']).toBe(encoding === 'identity' ? undefined : encoding);
        expect(answer.headers).toMatchObject({
          'cache-control': 'public, no-cache',
          vary: 'Accept-Encoding',
          'content-length': String(answer.body.length),
          'x-content-type-options': 'nosniff',
          'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
        });
        expect(answer.headers).not.toHaveProperty('x-page-tags');
        etags.add(answer.headers.etag);
        const again = await ask(front, '/w/a', {
          headers: { ...headers, 'if-none-match': answer.headers.etag ?? '' },
          ...(agent && { agent }),
        });
        expect(again).toMatchObject({ status: 304, text: '' });
        expect(again.headers).toMatchObject({
          etag: answer.headers.etag,
          'cache-control': 'public, no-cache',
        });
        // A policy in a 304 would replace that of the page which the browser has kept.
        expect(again.headers).not.toHaveProperty('content-security-policy');
      }
    }
    expect(etags.size).toBe(3);
    expect(render).toHaveBeenCalledTimes(1);
    agent?.destroy();
  });
});

test('HEAD answers with the headers of GET and no body, kept or not', async () => {
  const front = await startFront({ render: pageRender() });
  const first = await ask(front, '/w/a', { method: 'HEAD' });
  const second = await ask(front, '/w/a', { method: 'HEAD' });
  const get = await ask(front, '/w/a');
  for (const { status, headers, text } of [first, second]) {
    expect({ status, text }).toEqual({ status: 200, text: '' });
    expect(headers).toMatchObject({
      etag: get.headers.etag,
      'content-length': get.headers['content-length'],
    });
  }
});

test('a query is ignored', async () => {
  const render = pageRender();
  const front = await startFront({ render });
  const answers = [
    await ask(front, '/w/a?t=1'),
    await ask(front, '/w/a?t=2&x=/../y'),
    await ask(front, '/w/%61'),
  ];
  expect(new Set(answers.map(({ text }) => text))).toEqual(new Set([`${PAGE}<!-- /w/a -->`]));
  expect(render).toHaveBeenCalledTimes(1);
});

test('a render sees nothing of who asked', async () => {
  const render = pageRender();
  const front = await startFront({ render, locals: () => ({ installation: 'here' }) });
  await ask(front, '/w/a?token=1', {
    headers: { cookie: 'session=1', authorization: 'Bearer 1', 'accept-language': 'de', 'user-agent': 'x' },
  });
  const [req, , , locals] = render.mock.calls[0]!;
  expect(req.url).toBe('/w/a');
  expect(req.headers).toEqual({
    host: front.host,
    'x-forwarded-host': front.host,
    'x-forwarded-proto': 'http',
  });
  expect(locals).toEqual({
    installation: 'here',
    requestId: expect.any(String) as string,
    clientAddress: '',
  });
});

test('a hundred who ask at once cause one render', async () => {
  const gate = makeGate();
  const page = pageRender();
  const render = vi.fn<Render>(async (...args) => {
    await gate.opened;
    await page(...args);
  });
  const front = await startFront({ render });
  const asking = Array.from({ length: 100 }, () => ask(front, '/w/a'));
  await expect.poll(() => render.mock.calls.length).toBe(1);
  gate.open();
  const answers = await Promise.all(asking);
  expect(answers.every(({ status }) => status === 200)).toBe(true);
  expect(render).toHaveBeenCalledTimes(1);
});

test('a page whose tag moves during its render is sent and not kept; who asks after the change gets a new one', async () => {
  const gate = makeGate();
  const changes = testChanges();
  let state = 'before';
  const render = vi.fn<Render>(async (_req, res) => {
    const seen = state;
    if (render.mock.calls.length === 1) await gate.opened;
    res.writeHead(200, { 'x-page-tags': 'workshop:1, build:1' });
    res.end(seen);
  });
  const front = await startFront({ render, changes });
  const early = ask(front, '/w/a');
  await expect.poll(() => render.mock.calls.length).toBe(1);
  state = 'after';
  changes.move(['build:1']);
  const late = ask(front, '/w/a');
  // The late one is waiting for the render that began before the change.
  await new Promise((resolve) => setTimeout(resolve, 50));
  gate.open();
  expect((await early).text).toBe('before');
  expect((await late).text).toBe('after');
  expect((await ask(front, '/w/a')).text).toBe('after');
  expect(render).toHaveBeenCalledTimes(2);
});

test('another tag that moves does not keep a page from being kept', async () => {
  const changes = testChanges();
  const render = vi.fn<Render>((_req, res) => {
    changes.move(['build:2']);
    res.writeHead(200, { 'x-page-tags': 'build:1' });
    res.end('page');
  });
  const front = await startFront({ render, changes });
  await ask(front, '/w/a');
  await ask(front, '/w/a');
  expect(render).toHaveBeenCalledTimes(1);
});

test('while changes are not heard, pages are served and not kept', async () => {
  const changes = testChanges();
  const render = pageRender();
  const front = await startFront({ render, changes });
  changes.setLive(false);
  const first = await ask(front, '/w/a', { headers: { 'accept-encoding': 'br' } });
  const second = await ask(front, '/w/a', {
    headers: { 'accept-encoding': 'br', 'if-none-match': first.headers.etag ?? '' },
  });
  expect([first.status, second.status]).toEqual([200, 304]);
  expect(render).toHaveBeenCalledTimes(2);
});

test.each([
  ['without tags', { 'x-page-tags': '' }, 200],
  ['that sets a cookie', { 'set-cookie': 'a=1' }, 200],
  ['that is an error', {}, 404],
])('an answer %s is sent as it is and not kept', async (_what, headers, status) => {
  const render = vi.fn<Render>((_req, res) => {
    res.writeHead(status, { 'x-page-tags': 'build:1', ...headers });
    res.end(`answer ${String(render.mock.calls.length)}`);
  });
  const front = await startFront({ render });
  expect(await ask(front, '/w/a')).toMatchObject({ status, text: 'answer 1' });
  expect(await ask(front, '/w/a')).toMatchObject({ status, text: 'answer 2' });
});

test('a cookie that a public page sets reaches one reader only', async () => {
  const gate = makeGate();
  const render = vi.fn<Render>(async (_req, res) => {
    const mine = render.mock.calls.length;
    await gate.opened;
    res.writeHead(200, { 'x-page-tags': 'build:1', 'set-cookie': `session=${String(mine)}` });
    res.end('page');
  });
  const front = await startFront({ render });
  const asking = [ask(front, '/w/a'), ask(front, '/w/a'), ask(front, '/w/a')];
  await expect.poll(() => render.mock.calls.length).toBe(1);
  gate.open();
  const cookies = (await Promise.all(asking)).map(({ headers }) => headers['set-cookie']?.[0]);
  expect(new Set(cookies).size).toBe(3);
});

test('a redirect keeps the moment that was asked for', async () => {
  const front = await startFront({
    render: (_req, res) => {
      res.writeHead(301, { location: '/w/new' });
      res.end();
    },
  });
  expect((await ask(front, '/w/old?t=1:20')).headers.location).toBe('/w/new?t=1:20');
});

test('a public page is only read', async () => {
  const front = await startFront({ render: pageRender() });
  expect(await ask(front, '/w/a', { method: 'POST', body: 'x' })).toMatchObject({ status: 405 });
});

test('a failing render answers all who wait with 500 and is tried again by the next', async () => {
  const page = pageRender();
  const render = vi.fn<Render>((...args) => {
    if (render.mock.calls.length === 1) throw new Error('the database is asleep');
    return page(...args);
  });
  const front = await startFront({ render });
  const failed = await ask(front, '/w/a');
  expect(failed).toMatchObject({ status: 500 });
  expect(failed.text).toContain(failed.headers['x-request-id']);
  expect(failed.text).not.toContain('asleep');
  expect(await ask(front, '/w/a')).toMatchObject({ status: 200 });
});

test('a render that hangs is given up', async () => {
  const front = await startFront({ render: () => undefined, times: { render: 100 } });
  expect(await ask(front, '/w/a')).toMatchObject({ status: 500 });
});

test('a connection may go from kept pages to anything else and be pipelined', async () => {
  const front = await startFront({ render: pageRender() });
  await ask(front, '/w/a');
  const line = (path: string, more = '') => `GET ${path} HTTP/1.1\r\nHost: ${front.host}\r\n${more}\r\n`;
  const heard = await talk(
    front,
    line('/w/a'),
    line('/w/a'),
    line('/w/a') + line('/w/b'),
    line('/w/a').slice(0, 9),
    line('/w/a').slice(9),
    line('/w/a', 'Connection: close\r\n'),
  );
  const statuses = [...heard.matchAll(/HTTP\/1\.1 (\d+)/g)].map(([, status]) => status);
  expect(statuses).toEqual(['200', '200', '200', '200', '200', '200']);
  expect(heard.match(/<!-- \/w\/b -->/g)).toHaveLength(1);
  expect(front.log.map(({ path, cache }) => `${String(path)} ${String(cache)}`)).toEqual([
    '/w/a miss',
    '/w/a hit',
    '/w/a hit',
    '/w/a hit',
    '/w/b miss',
    '/w/a hit',
    '/w/a hit',
  ]);
});
