import { Client } from 'pg';
import { expect, inject, test } from 'vitest';
import { openJobQueue } from '../../../src/server/jobs/queue.ts';
import { testDatabase } from '../../support/database.ts';

const databaseUrl = await testDatabase();

/** As a superuser, who alone may say how long to wait before looking for a deadlock. */
async function connect(): Promise<Client> {
  const address = new URL(inject('superuserUrl'));
  address.pathname = new URL(databaseUrl).pathname;
  const client = new Client({ connectionString: address.href });
  await client.connect();
  return client;
}

/** Waits until someone waits for a lock in this database. */
async function someoneWaits(client: Client): Promise<void> {
  await expect
    .poll(async () => {
      const { rows } = await client.query<{ waiting: string }>(
        `select count(*) as waiting from pg_stat_activity
         where datname = current_database() and wait_event_type = 'Lock'`,
      );
      return Number(rows[0]?.waiting);
    })
    .toBe(1);
}

test('a process whose new queue is given up to end a deadlock makes it again', async () => {
  const housekeeper = await connect();
  const watcher = await connect();
  const queue = await openJobQueue(databaseUrl, {
    maintain: false,
    onError: (error) => {
      throw error;
    },
  });
  // So that the other side is the one that PostgreSQL stops.
  await housekeeper.query(`set deadlock_timeout = '1min'`);
  await housekeeper.query('begin');
  await housekeeper.query('lock table pgboss.job in access exclusive mode');
  const made = queue.createQueues(['made-in-a-deadlock']);
  await someoneWaits(watcher);
  await housekeeper.query('lock table pgboss.queue in access exclusive mode');
  await housekeeper.query('commit');
  await made;
  expect(await queue.boss.getQueue('made-in-a-deadlock')).toMatchObject({ name: 'made-in-a-deadlock' });
  await queue.close();
  await Promise.all([housekeeper.end(), watcher.end()]);
});
