import { expect, test, vi } from 'vitest';
import { type Render } from '../../../src/server/http/page-render.ts';
import { ask } from './support/ask.ts';
import { startFront } from './support/start-front.ts';

const echo: Render = (req, res, _next, locals) => {
  res.end(JSON.stringify({ url: req.url, headers: req.headers, locals }));
};

type Echo = { url: string; headers: Record<string, string>; locals: { clientAddress: string } };

test('another host is answered 421 with a sentence, on kept pages too', async () => {
  const render = vi.fn<Render>((_req, res) => {
    res.writeHead(200, { 'x-page-tags': 'build:1' });
    res.end('page');
  });
  const front = await startFront({ render });
  await ask(front, '/w/a');
  for (const path of ['/', '/w/a', '/robots.txt']) {
    const answer = await ask(front, path, { headers: { host: 'evil.example' } });
    expect(answer).toMatchObject({ status: 421, text: `This server answers only for ${front.host}.\n` });
  }
  expect(render).toHaveBeenCalledTimes(1);
});

test('another loopback name is sent to PUBLIC_URL, when only reading', async () => {
  const front = await startFront({});
  const host = `localhost:${String(front.port)}`;
  const get = await ask(front, '/w/a?t=1:20', { headers: { host } });
  expect(get).toMatchObject({ status: 308, headers: { location: `http://${front.host}/w/a?t=1:20` } });
  expect(await ask(front, '/', { method: 'HEAD', headers: { host } })).toMatchObject({ status: 308 });
  expect(await ask(front, '/', { method: 'POST', headers: { host }, body: 'x' })).toMatchObject({
    status: 421,
  });
  const elsewhere = await ask(front, '//evil.example/', { headers: { host } });
  expect(elsewhere.headers.location).toBe(`http://${front.host}//evil.example/`);
});

test('a client cannot say where it comes from or what it asked for', async () => {
  const front = await startFront({ render: echo });
  const spoofed = {
    'x-forwarded-for': '203.0.113.9',
    'x-forwarded-host': 'evil.example',
    'x-forwarded-proto': 'https',
    forwarded: 'for=203.0.113.9;host=evil.example',
    'x-real-ip': '203.0.113.9',
  };
  const { headers, locals } = JSON.parse((await ask(front, '/bench', { headers: spoofed })).text) as Echo;
  expect(locals.clientAddress).toBe('127.0.0.1');
  expect(headers).toEqual({
    host: front.host,
    connection: 'close',
    'x-forwarded-for': '127.0.0.1',
    'x-forwarded-host': front.host,
    'x-forwarded-proto': 'http',
  });
});

test('a trusted proxy is believed as far as its own entry', async () => {
  const front = await startFront({
    render: echo,
    trustedProxies: ['127.0.0.0/8'],
    publicUrl: 'https://shop.example',
  });
  const answer = await ask(front, '/bench', { headers: { 'x-forwarded-for': '192.0.2.1, 203.0.113.9' } });
  const { headers, locals } = JSON.parse(answer.text) as Echo;
  expect(locals.clientAddress).toBe('203.0.113.9');
  expect(headers).toMatchObject({
    'x-forwarded-for': '203.0.113.9',
    'x-forwarded-host': 'shop.example',
    'x-forwarded-proto': 'https',
  });
  expect(answer.headers['strict-transport-security']).toBe('max-age=31536000');
});

test('health is told whatever the host, and not logged', async () => {
  let healthy: () => Promise<boolean> | boolean = () => true;
  const front = await startFront({ isHealthy: () => healthy() });
  const look = () => ask(front, '/healthz', { headers: { host: 'anything.example' } });
  expect(await look()).toMatchObject({ status: 200, text: 'ok\n', headers: { 'cache-control': 'no-store' } });
  healthy = () => false;
  expect(await look()).toMatchObject({ status: 503 });
  healthy = () => Promise.reject(new Error('no database'));
  expect(await look()).toMatchObject({ status: 503, text: 'This server cannot reach what it needs.\n' });
  healthy = () => new Promise<boolean>(() => undefined);
  expect(await look()).toMatchObject({ status: 503 });
  expect(front.log).toEqual([]);
});
