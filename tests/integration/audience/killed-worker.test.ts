import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { eq } from 'drizzle-orm';
import { afterEach, expect, test, vi } from 'vitest';
import { announcements, messages } from '../../../src/db/schema/audience.ts';
import { addSubscribers, announce, publishedEpisode, tally } from '../../support/audience.ts';
import { aWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';
import { ROOT } from '../../support/started-product.ts';

const services = await testServices();
const shed = await aWorkshop(services);
const { settings } = services;

const workers = new Set<ReturnType<typeof spawn>>();
afterEach(async () => {
  for (const worker of workers) {
    const ended = once(worker, 'exit');
    worker.kill('SIGKILL');
    if (worker.exitCode === null && worker.signalCode === null) await ended;
  }
  workers.clear();
});

/** A worker in a process of its own, once it works. */
async function startWorker() {
  const worker = spawn(process.execPath, ['--import', 'tsx', 'src/worker.ts'], {
    cwd: ROOT,
    env: {
      PATH: process.env['PATH'],
      ROLE: 'worker',
      LOG_LEVEL: 'silent',
      PUBLIC_URL: settings.PUBLIC_URL,
      DATABASE_URL: settings.DATABASE_URL,
      SMTP_URL: settings.SMTP_URL,
      MAIL_FROM: settings.MAIL_FROM,
      MAIL_PER_MINUTE: '1200',
      AUTH_SECRET: settings.AUTH_SECRET,
      S3_ENDPOINT: settings.S3_ENDPOINT,
      S3_ACCESS_KEY_ID: settings.S3_ACCESS_KEY_ID,
      S3_SECRET_ACCESS_KEY: settings.S3_SECRET_ACCESS_KEY,
    },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  workers.add(worker);
  await once(worker, 'message');
  return worker;
}

const mails = () => services.outbox.messages({ limit: '1000' });

test(
  'a worker killed in the middle of an announcement: the next goes on, nobody is lost, one mail at most is doubled',
  { timeout: 120_000 },
  async () => {
    const press = await publishedEpisode(shed.owner);
    await addSubscribers(services, { workshopId: shed.id, buildId: press.buildId }, 'reader', 60);
    const worker = await startWorker();
    const { id } = await announce(shed.owner, press);
    await vi.waitFor(async () => expect((await mails()).length).toBeGreaterThan(5), { timeout: 30_000 });
    worker.kill('SIGKILL');
    await once(worker, 'exit');
    expect((await mails()).length).toBeLessThan(60);
    // Its claim is let run out now, instead of in half a minute.
    await services.db
      .update(messages)
      .set({ claimedUntil: new Date(0) })
      .where(eq(messages.state, 'sending'));
    await startWorker();
    await vi.waitFor(
      async () => {
        const [row] = await services.db.select().from(announcements).where(eq(announcements.id, id));
        expect(row?.state).toBe('sent');
      },
      { timeout: 60_000, interval: 200 },
    );
    const { addresses, doubled, strange } = tally(await mails());
    expect({ addresses, strange }).toEqual({ addresses: 60, strange: 0 });
    expect(doubled).toBeLessThanOrEqual(1);
  },
);
