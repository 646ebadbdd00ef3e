import { setTimeout as wait } from 'node:timers/promises';
import { pino } from 'pino';
import { Client } from 'pg';
import { findFreePort } from '../../scripts/ports.ts';
import { accountMails } from '../../src/process-mails.ts';
import { readServiceSettings } from '../../src/server/env.ts';
import { openServices } from '../../src/server/services.ts';
import { addSubscribers, announce, publishedEpisode, type Tally, tally } from '../support/audience.ts';
import { childrenOf, PROGRAMS } from '../support/child-processes.ts';
import { outboxAt } from '../support/outbox.ts';
import { aPerson, inWorkshop, workshopOf } from '../support/people.ts';
import { type StartedProduct, startProduct } from '../support/started-product.ts';
import { throwawayFolder } from '../support/throwaway.ts';

export const SUBSCRIBERS = 500;
const VICTIMS = ['worker', 'web', 'mail', 'PostgreSQL'] as const;
type Victim = (typeof VICTIMS)[number];

/** A round that has not come to its end by then has lost its way. */
const ROUND_MS = 10 * 60_000;
const POLL_MS = 200;
const KILLS_OF_EACH = 2;

/** How one round went. */
export interface Round extends Tally {
  readonly kills: Readonly<Record<Victim, number>>;
  /** Messages by state when it was over. */
  readonly states: Readonly<Record<string, number>>;
  readonly seconds: number;
  /** Nobody lost, no more doubled than could have been in flight, each double under its first Message-ID. */
  readonly held: boolean;
}

/**
 * Announces an episode to 500 subscribers on a whole copy of the product, and kills its worker, web server, mail
 * server and database with SIGKILL at random moments meanwhile, each twice.
 * @param random gives numbers from 0 to 1
 */
export async function announceUnderFire(random: () => number): Promise<Round> {
  const folder = throwawayFolder('chaos');
  const product = await startProduct({
    PORT: String(await findFreePort()),
    DATA_DIR: folder.path,
    DEMO: '0',
    LOG_LEVEL: 'error',
    // Half a minute of mail, so that there is a middle to be killed in.
    MAIL_PER_MINUTE: '1000',
  });
  try {
    await start(product);
    const begun = Date.now();
    const kills = { worker: 0, web: 0, mail: 0, PostgreSQL: 0 };
    const plan = planKills(random);
    let states: Record<string, number> = {};
    for (;;) {
      if (Date.now() - begun > ROUND_MS) {
        const said = product.printed().slice(-2_000);
        throw new Error(`A round was not over in time: ${JSON.stringify({ states, kills })}\n${said}`);
      }
      await wait(POLL_MS);
      const now = await readStates(product);
      states = now?.states ?? states;
      if (now?.announcement === 'sent') break;
      const [next] = plan;
      if (next === undefined || (states['sent'] ?? 0) < next.at) continue;
      await wait(random() * 1_000);
      if (!kill(product, next.victim)) continue;
      kills[next.victim] += 1;
      plan.shift();
    }
    const counted = tally(
      await outboxAt(product.environment['OUTBOX_URL'] ?? '').messages({ limit: '1000' }),
    );
    const all = Object.values(kills).reduce((sum, count) => sum + count, 0);
    return {
      ...counted,
      kills,
      states,
      seconds: Math.round((Date.now() - begun) / 1000),
      held:
        counted.addresses === SUBSCRIBERS &&
        states['sent'] === SUBSCRIBERS &&
        counted.strange === 0 &&
        // A worker sends one at a time in each of its two jobs.
        counted.doubled <= 2 * all,
    };
  } finally {
    await product.stop();
    folder.remove();
  }
}

/** Who is killed, and after how many sent messages, in the order in which it happens. */
function planKills(random: () => number): { victim: Victim; at: number }[] {
  return VICTIMS.flatMap((victim) => Array<Victim>(KILLS_OF_EACH).fill(victim))
    .map((victim) => ({ victim, at: Math.floor(random() * SUBSCRIBERS * 0.9) }))
    .sort((a, b) => a.at - b.at);
}

async function start({ environment }: StartedProduct): Promise<void> {
  const settings = readServiceSettings(environment);
  const services = await openServices({
    settings,
    log: pino({ level: 'silent' }),
    accountMails: accountMails(settings.PUBLIC_URL),
    worker: false,
  });
  const owner = await aPerson(services, { secondFactor: true });
  const context = await inWorkshop(services, owner, (await workshopOf(services, owner)).slug);
  const press = await publishedEpisode(context);
  const of = { workshopId: context.workshop.id, buildId: press.buildId };
  await addSubscribers(services, of, 'reader', SUBSCRIBERS);
  await announce(context, press);
  await services.close();
}

/** Null while the database is down. */
async function readStates({ environment }: StartedProduct) {
  const client = new Client({ connectionString: environment['DATABASE_URL'] });
  client.on('error', () => undefined);
  try {
    await client.connect();
    const { rows } = await client.query<{ state: string; count: number }>(
      'select state, count(*)::int as count from messages group by state',
    );
    const { rows: found } = await client.query<{ state: string }>('select state from announcements');
    return {
      announcement: found[0]?.state,
      states: Object.fromEntries(rows.map(({ state, count }) => [state, count])) as Record<string, number>,
    };
  } catch {
    return null;
  } finally {
    await client.end().catch(() => undefined);
  }
}

/** @returns false while that part is not running */
function kill(product: StartedProduct, victim: Victim): boolean {
  const found = childrenOf(product.process.pid).find(({ command }) => command.includes(PROGRAMS[victim]));
  if (!found) return false;
  process.kill(found.pid, 'SIGKILL');
  return true;
}
