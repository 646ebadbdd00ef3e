import { brotliDecompressSync } from 'node:zlib';
import { expect, test } from 'vitest';
import { ask } from './support/ask.ts';
import { makeGate } from './support/gate.ts';
import { startFront } from './support/start-front.ts';

const SECURITY = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'same-origin',
  'x-frame-options': 'DENY',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), microphone=(), geolocation=()',
  'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
};

test('every kind of answer carries the security headers and its number', async () => {
  const front = await startFront({
    render: (req, _res, next) => {
      if (req.url === '/fails') throw new Error('inside');
      next();
    },
  });
  for (const path of [
    '/robots.txt',
    '/_astro/app.abc123.js',
    '/_astro/gone.js',
    '/fails',
    '/unknown',
    '/healthz',
    '/%',
  ]) {
    const { headers } = await ask(front, path);
    expect(headers, path).toMatchObject(SECURITY);
    expect(headers['x-request-id'], path).toMatch(/^[\da-f-]{36}$/);
    expect(headers, path).not.toHaveProperty('strict-transport-security');
  }
});

test('an answer keeps its own policy and loses what is internal', async () => {
  const front = await startFront({
    render: (_req, res) => {
      res.setHeader('X-Powered-By', 'something');
      res.writeHead(200, [
        'Content-Security-Policy',
        "default-src 'self'",
        'X-Page-Tags',
        'build:1',
        'Set-Cookie',
        'a=1',
        'Set-Cookie',
        'b=2',
      ]);
      res.end();
    },
  });
  const { headers } = await ask(front, '/bench');
  expect(headers['content-security-policy']).toBe("default-src 'self'");
  expect(headers['set-cookie']).toEqual(['a=1', 'b=2']);
  expect(headers).not.toHaveProperty('x-powered-by');
  expect(headers).not.toHaveProperty('x-page-tags');
});

test('a 304 of the application is given no policy, which would replace that of the kept page', async () => {
  const front = await startFront({
    render: (_req, res) => {
      res.writeHead(304);
      res.end();
    },
  });
  expect((await ask(front, '/bench')).headers).not.toHaveProperty('content-security-policy');
});

test('an error says its number and nothing of its cause', async () => {
  const front = await startFront({
    render: () => Promise.reject(new Error('secret detail')),
  });
  const { status, text, headers } = await ask(front, '/bench?typed=1');
  expect(status).toBe(500);
  expect(text).toContain(headers['x-request-id']);
  expect(text).not.toMatch(/secret|at /);
  await expect
    .poll(() => front.log)
    .toMatchObject([
      { requestId: headers['x-request-id'], err: { message: 'secret detail' } },
      { requestId: headers['x-request-id'], method: 'GET', path: '/bench', status: 500, cache: 'none' },
    ]);
});

test('text is compressed on its way out; event streams and pictures are not', async () => {
  const front = await startFront({
    render: (req, res) => {
      res.writeHead(200, {
        'content-type':
          req.url === '/html' ? 'text/html' : req.url === '/events' ? 'text/event-stream' : 'image/png',
      });
      res.end('a'.repeat(5_000));
    },
  });
  const headers = { 'accept-encoding': 'gzip, br' };
  const html = await ask(front, '/html', { headers });
  expect(html.headers).toMatchObject({ 'content-encoding': 'br', vary: 'Accept-Encoding' });
  expect(brotliDecompressSync(html.body).toString()).toBe('a'.repeat(5_000));
  for (const path of ['/events', '/picture']) {
    expect((await ask(front, path, { headers })).headers).not.toHaveProperty('content-encoding');
  }
});

test('files with hashed names are kept for good, others for minutes, and asked for again by ETag', async () => {
  const front = await startFront({});
  const hashed = await ask(front, '/_astro/app.abc123.js');
  expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  const robots = await ask(front, '/robots.txt');
  expect(robots).toMatchObject({
    text: 'User-agent: *\n',
    headers: { 'cache-control': 'public, max-age=300' },
  });
  const again = await ask(front, '/robots.txt', { headers: { 'if-none-match': robots.headers.etag ?? '' } });
  expect(again).toMatchObject({ status: 304 });
  const range = await ask(front, '/robots.txt', { headers: { range: 'bytes=9-2' } });
  expect(range).toMatchObject({ status: 200, text: 'User-agent: *\n' });
  expect(await ask(front, '/_astro/gone.js')).toMatchObject({
    status: 404,
    headers: { 'cache-control': 'no-store' },
  });
  expect((await ask(front, '/_astro/../../../../etc/passwd')).text).toBe('rendered');
});

test('an unknown address gets the page that the application has for it, or a sentence', async () => {
  const front = await startFront({
    render: (req, res, next) => {
      if (req.url !== '/404') {
        next();
        return;
      }
      res.writeHead(404);
      res.end('our own page');
    },
  });
  expect(await ask(front, '/nothing')).toMatchObject({ status: 404, text: 'our own page' });
  const bare = await startFront({
    render: (_req, _res, next) => {
      next();
    },
  });
  expect(await ask(bare, '/nothing')).toMatchObject({
    status: 404,
    text: 'There is nothing at this address.\n',
  });
});

test('HEAD of a dynamic answer has no body', async () => {
  const front = await startFront({});
  expect(await ask(front, '/bench', { method: 'HEAD' })).toMatchObject({ status: 200, text: '' });
});

test('an answer is passed on as it is written', async () => {
  const gate = makeGate();
  const front = await startFront({
    render: async (_req, res) => {
      res.writeHead(200, { 'content-type': 'text/event-stream' });
      res.write('first');
      await gate.opened;
      res.end('last');
    },
  });
  const response = await fetch(`http://${front.host}/events`);
  const reader = response.body!.getReader();
  expect(new TextDecoder().decode((await reader.read()).value)).toBe('first');
  gate.open();
  expect(new TextDecoder().decode((await reader.read()).value)).toBe('last');
});
