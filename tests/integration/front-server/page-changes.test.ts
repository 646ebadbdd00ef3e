import { drizzle } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import { pino } from 'pino';
import { afterAll, expect, onTestFinished, test, vi } from 'vitest';
import { announcePageChanges, listenForPageChanges } from '../../../src/server/http/page-changes.ts';
import { type Render } from '../../../src/server/http/page-render.ts';
import { testDatabase } from '../../support/database.ts';
import { ask } from './support/ask.ts';
import { startFront } from './support/start-front.ts';

const databaseUrl = await testDatabase();
const pool = new pg.Pool({ connectionString: databaseUrl });
const db = drizzle(pool);
afterAll(() => pool.end());

/** The render of a page that says how often it was rendered. */
function countingRender(): Render {
  let times = 0;
  return (_req, res) => {
    times += 1;
    res.writeHead(200, { 'x-page-tags': 'workshop:1,build:1' });
    res.end(`render ${String(times)}`);
  };
}

async function listen() {
  const changes = await listenForPageChanges({
    connectionString: databaseUrl,
    log: pino({ level: 'silent' }),
  });
  onTestFinished(() => changes.close());
  return changes;
}

async function killListeners(): Promise<void> {
  const killed = await pool.query(
    `select pg_terminate_backend(pid) from pg_stat_activity
     where application_name = 'centrepop page changes' and datname = current_database()`,
  );
  expect(killed.rowCount).toBeGreaterThan(0);
}

test('all servers on one database drop a page within a second of the change that commits', async () => {
  const fronts = [
    await startFront({ render: countingRender(), changes: await listen() }),
    await startFront({ render: countingRender(), changes: await listen() }),
  ];
  const texts = () => Promise.all(fronts.map(async (front) => (await ask(front, '/w/a')).text));
  expect(await texts()).toEqual(['render 1', 'render 1']);
  await db.transaction(async (tx) => {
    await announcePageChanges(tx, ['build:1']);
    await new Promise((resolve) => setTimeout(resolve, 200));
    // Nobody may act on what is not committed.
    expect(await texts()).toEqual(['render 1', 'render 1']);
  });
  await vi.waitUntil(async () => (await texts()).every((text) => text === 'render 2'), { timeout: 1_000 });
});

test('a transaction that is rolled back announces nothing', async () => {
  const changes = await listen();
  const heard = vi.fn();
  changes.subscribe(heard);
  await expect(
    db.transaction(async (tx) => {
      await announcePageChanges(tx, ['build:1']);
      throw new Error('changed my mind');
    }),
  ).rejects.toThrow('changed my mind');
  await db.transaction((tx) => announcePageChanges(tx, ['build:2', 'workshop:2']));
  await expect.poll(() => heard.mock.calls).toEqual([[['build:2', 'workshop:2']]]);
});

test('losing the connection empties the cache and nothing is kept until it is back', async () => {
  const changes = await listen();
  const front = await startFront({ render: countingRender(), changes });
  await ask(front, '/w/a');
  expect((await ask(front, '/w/a')).text).toBe('render 1');

  await killListeners();
  await expect.poll(() => changes.live, { interval: 2 }).toBe(false);
  expect((await ask(front, '/w/a')).text).toBe('render 2');

  await expect.poll(() => changes.live, { timeout: 5_000 }).toBe(true);
  const kept = (await ask(front, '/w/a')).text;
  expect((await ask(front, '/w/a')).text).toBe(kept);
  await announcePageChanges(db, ['workshop:1']);
  await vi.waitUntil(async () => (await ask(front, '/w/a')).text !== kept, { timeout: 1_000 });
});

test('a page rendered across a lost connection is not kept', async () => {
  const changes = await listen();
  let times = 0;
  const front = await startFront({
    changes,
    render: async (_req, res) => {
      times += 1;
      if (times === 1) {
        await killListeners();
        await expect.poll(() => changes.live, { interval: 2 }).toBe(false);
        await expect.poll(() => changes.live, { timeout: 5_000 }).toBe(true);
      }
      res.writeHead(200, { 'x-page-tags': 'build:1' });
      res.end(`render ${String(times)}`);
    },
  });
  expect((await ask(front, '/w/a')).text).toBe('render 1');
  expect((await ask(front, '/w/a')).text).toBe('render 2');
});

test('a database that is not there yet does not keep the server from starting', async () => {
  const changes = await listenForPageChanges({
    connectionString: 'postgres://nobody@127.0.0.1:1/none',
    log: pino({ level: 'silent' }),
  });
  expect(changes.live).toBe(false);
  await changes.close();
});
