import { Agent } from 'node:http';
import { connect } from 'node:net';
import { once } from 'node:events';
import { expect, test, vi } from 'vitest';
import { type Render } from '../../../src/server/http/page-render.ts';
import { ask } from './support/ask.ts';
import { makeGate } from './support/gate.ts';
import { startFront } from './support/start-front.ts';

test('a request in flight finishes, with its connection closed after it', async () => {
  const gate = makeGate();
  const render = vi.fn<Render>(async (_req, res) => {
    await gate.opened;
    res.end('finished');
  });
  const front = await startFront({ render });
  const agent = new Agent({ keepAlive: true });
  const asking = ask(front, '/bench', { agent });
  await expect.poll(() => render.mock.calls.length).toBe(1);
  const closed = front.close();
  await expect(ask(front, '/bench')).rejects.toThrow(/ECONNREFUSED/);
  gate.open();
  expect(await asking).toMatchObject({ status: 200, text: 'finished', headers: { connection: 'close' } });
  await closed;
  agent.destroy();
});

test('an answer that had begun before is finished too', async () => {
  const gate = makeGate();
  const render = vi.fn<Render>(async (_req, res) => {
    res.write('begun, ');
    await gate.opened;
    res.end('finished');
  });
  const front = await startFront({ render });
  const agent = new Agent({ keepAlive: true });
  const asking = ask(front, '/bench', { agent });
  await expect.poll(() => render.mock.calls.length).toBe(1);
  const startedAt = Date.now();
  const closed = front.close();
  gate.open();
  expect(await asking).toMatchObject({ text: 'begun, finished' });
  await closed;
  expect(Date.now() - startedAt).toBeLessThan(2_000);
  agent.destroy();
});

test('idle connections are ended at once, used ones, unused ones and those that only read kept pages', async () => {
  const front = await startFront({
    render: (_req, res) => {
      res.writeHead(200, { 'x-page-tags': 'build:1' });
      res.end('page');
    },
  });
  await ask(front, '/w/a');
  const agent = new Agent({ keepAlive: true });
  await ask(front, '/bench', { agent });
  const lane = new Agent({ keepAlive: true });
  await ask(front, '/w/a', { agent: lane });
  const unused = connect(front.port, '127.0.0.1');
  await once(unused, 'connect');
  unused.on('error', () => undefined).resume();
  const startedAt = Date.now();
  await front.close();
  expect(Date.now() - startedAt).toBeLessThan(1_000);
  agent.destroy();
  lane.destroy();
});

test('a request that does not finish is cut off when the time is over', async () => {
  const front = await startFront({ render: () => undefined, times: { drain: 200 } });
  const asking = ask(front, '/bench');
  asking.catch(() => undefined);
  await new Promise((resolve) => setTimeout(resolve, 100));
  await front.close();
  await expect(asking).rejects.toThrow();
});

test('health says that the server is stopping', async () => {
  const gate = makeGate();
  const front = await startFront({
    render: async (_req, res) => {
      res.write('begun, ');
      await gate.opened;
      res.end('finished');
    },
  });
  const socket = connect(front.port, '127.0.0.1');
  let heard = '';
  socket.on('data', (chunk: Buffer) => {
    heard += chunk.toString();
  });
  const ended = once(socket, 'close');
  const line = (path: string) => `GET ${path} HTTP/1.1\r\nHost: ${front.host}\r\n\r\n`;
  socket.write(line('/bench'));
  await expect.poll(() => heard).toContain('begun, ');
  const closed = front.close();
  // The one kind of connection that is still open: its answer had begun before the stop.
  socket.write(line('/healthz'));
  gate.open();
  await Promise.all([closed, ended]);
  expect(heard).toMatch(/finished[^]*HTTP\/1\.1 503 [^]*Connection: close[^]*This server is stopping\.\n$/);
});
