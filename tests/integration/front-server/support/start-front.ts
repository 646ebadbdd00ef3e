import { mkdirSync, writeFileSync } from 'node:fs';
import { once } from 'node:events';
import { createServer } from 'node:net';
import { type AddressInfo } from 'node:net';
import { join } from 'node:path';
import { pino } from 'pino';
import { onTestFinished } from 'vitest';
import { ChangeCounter, type PageChanges } from '../../../../src/server/http/change-counter.ts';
import { type FrontServerOptions } from '../../../../src/server/http/front-options.ts';
import { startFrontServer } from '../../../../src/server/http/front-server.ts';
import { throwawayFolder } from '../../../support/throwaway.ts';

/** Changes made by the test itself. */
export type TestChanges = PageChanges & { move(tags: readonly string[]): void; setLive(live: boolean): void };

export function testChanges(): TestChanges {
  const counter = new ChangeCounter();
  let live = true;
  return {
    get live() {
      return live;
    },
    setLive: (now) => {
      live = now;
    },
    move: (tags) => {
      counter.move(tags);
    },
    counter: () => counter.counter(),
    movedSince: (tags, since) => counter.movedSince(tags, since),
    subscribe: (listener) => counter.subscribe(listener),
    close: () => Promise.resolve(),
  };
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}

export type LogLine = Record<string, unknown>;

/** A running front server; `port` is where it listens. */
export type TestFront = { port: number; host: string; log: LogLine[]; close(): Promise<void> };

/** Starts a front server for one test: pages below /w/ are public. It is closed when the test ends. */
export async function startFront(options: Partial<FrontServerOptions>): Promise<TestFront> {
  const folder = throwawayFolder('front');
  mkdirSync(join(folder.path, '_astro'));
  writeFileSync(join(folder.path, '_astro/app.abc123.js'), `/* ${'x'.repeat(3_000)} */`);
  writeFileSync(join(folder.path, 'robots.txt'), 'User-agent: *\n');
  const port = options.port ?? (await freePort());
  const log: LogLine[] = [];
  const front = await startFrontServer({
    host: '127.0.0.1',
    port,
    publicUrl: `http://127.0.0.1:${String(port)}`,
    trustedProxies: [],
    clientDir: folder.path,
    render: (_req, res) => {
      res.end('rendered');
    },
    changes: testChanges(),
    isHealthy: () => true,
    isPublicPage: (path) => path.startsWith('/w/'),
    log: pino({ base: null }, { write: (line: string) => log.push(JSON.parse(line) as LogLine) }),
    ...options,
  });
  let closing: Promise<void> | undefined;
  const close = () => (closing ??= front.close());
  onTestFinished(async () => {
    await close();
    folder.remove();
  });
  return { port, host: new URL(options.publicUrl ?? `http://127.0.0.1:${String(port)}`).host, log, close };
}
