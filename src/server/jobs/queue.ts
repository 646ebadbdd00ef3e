import { type SQL, sql } from 'drizzle-orm';
import pg from 'pg';
import PgBoss from 'pg-boss';
import { v5 as uuidv5 } from 'uuid';
import { type Database } from '../../db/client.ts';
import { type EventIds, type EventName } from '../../domain/events.ts';
import { type Services } from '../services.ts';

const EVENTS_QUEUE = 'events';

// Any fixed number other than the migrations' does.
const QUEUES_LOCK = 734_202;

export const DEAD_LETTERS = 'dead-letters';

/** deadlock_detected (PostgreSQL, appendix A, class 40). */
const DEADLOCK = '40P01';
const DEADLOCK_TRIES = 5;

/** A job whose worker says nothing for so long is given to another. */
const LIVING_SECONDS = 120;
const TELL_MS = 20_000;

export interface EventJob {
  readonly event: EventName;
  readonly ids: EventIds;
}

/** Reads the rows again by their ids; running it twice does no harm, and rows that are gone end it quietly. */
export type JobHandler = (services: Services, ids: EventIds) => Promise<void>;

/** A job: its queue's name, how often to try, and its handler, imported when it first runs. */
export interface JobDefinition {
  readonly name: string;
  /** The event it follows, or when it runs by itself: five fields of cron, in UTC. */
  readonly on: EventName | { readonly cron: string };
  /** Runs when a worker starts, too: for what the last one may have been killed in. */
  readonly alsoAtStart?: boolean;
  /** Set for long work: a job of a worker that lives may take so long; of one that was killed it is back sooner. */
  readonly longestSeconds?: number;
  readonly tries: number;
  readonly retryDelaySeconds: number;
  readonly load: () => Promise<JobHandler>;
}

export interface JobQueue {
  readonly boss: PgBoss;
  /**
   * Tells what happened, in the caller's transaction: it is told exactly if that commits.
   * @throws when the queue does not take it
   */
  enqueue(db: Database, event: EventName, ids: EventIds): Promise<void>;
  /** Makes the queues that are not there yet. */
  createQueues(names: readonly string[]): Promise<void>;
  close(): Promise<void>;
}

/**
 * Joins the job queue. The worker looks after the queue's tables; other processes only send.
 * @param url postgres://…
 * @param options.maintain true in the worker
 */
export async function openJobQueue(
  url: string,
  options: { readonly maintain: boolean; readonly onError: (error: Error) => void },
): Promise<JobQueue> {
  const boss = new PgBoss({
    connectionString: url,
    max: options.maintain ? 6 : 2,
    migrate: false,
    supervise: options.maintain,
    schedule: options.maintain,
    // A killed worker's job comes back after this long, not after two minutes.
    maintenanceIntervalSeconds: 15,
    monitorStateIntervalSeconds: 30,
  });
  boss.on('error', options.onError);
  await inTurn(url, () => boss.start());
  const createQueues = (names: readonly string[]) => createMissingQueues(boss, url, names);
  await createQueues([EVENTS_QUEUE]);
  return {
    boss,
    createQueues,
    async enqueue(db, event, ids) {
      const id = await boss.send(EVENTS_QUEUE, { event, ids } satisfies EventJob, {
        db: { executeSql: (text, values) => executeInTransaction(db, text, values) },
        retryLimit: 5,
        retryBackoff: true,
        expireInSeconds: 60,
      });
      if (id === null) throw new Error(`The event ${event} was not taken by the queue.`);
    },
    close: () => boss.stop({ graceful: true, wait: true, timeout: 10_000 }),
  };
}

/** One process at a time: starting makes queues too, each is a table of its own, and two that make tables deadlock. */
async function inTurn(url: string, work: () => Promise<unknown>): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [QUEUES_LOCK]);
    await work();
  } finally {
    await client.end();
  }
}

async function createMissingQueues(boss: PgBoss, url: string, names: readonly string[]): Promise<void> {
  await inTurn(url, async () => {
    for (const name of [DEAD_LETTERS, ...names]) await createQueue(boss, name);
  });
}

/** A worker's housekeeping takes no turn: whoever PostgreSQL stops to end a deadlock with it goes again. */
async function createQueue(boss: PgBoss, name: string, triesLeft = DEADLOCK_TRIES): Promise<void> {
  if (await boss.getQueue(name)) return;
  try {
    await boss.createQueue(name, name === DEAD_LETTERS ? { name } : { name, deadLetter: DEAD_LETTERS });
  } catch (error) {
    if (triesLeft <= 1 || !(error instanceof pg.DatabaseError) || error.code !== DEADLOCK) throw error;
    await createQueue(boss, name, triesLeft - 1);
  }
}

/** Runs pg-boss's numbered placeholders through Drizzle, so that its insert is part of our transaction. */
async function executeInTransaction(
  db: Database,
  text: string,
  values: unknown[],
): Promise<{ rows: unknown[] }> {
  const pieces = text.split(/\$(\d+)/);
  const statement = pieces.map((piece, index): SQL =>
    index % 2 === 0 ? sql.raw(piece) : sql`${sql.param(values[Number(piece) - 1])}`,
  );
  const { rows } = await db.execute(sql.join(statement));
  return { rows };
}

/**
 * Works through the queue: each event goes to the queue of every job that asked for it; each job then runs by
 * itself and is tried again by itself.
 * @param definitions the static table of jobs
 * @param run given a job and its ids; throws to be tried again
 */
export async function workQueue(
  queue: JobQueue,
  definitions: readonly JobDefinition[],
  run: (definition: JobDefinition, ids: EventIds, jobId: string) => Promise<void>,
): Promise<void> {
  const { boss } = queue;
  await queue.createQueues(definitions.map(({ name }) => name));
  await boss.work<EventJob>(EVENTS_QUEUE, { pollingIntervalSeconds: 0.5 }, async ([job]) => {
    if (!job) return;
    for (const definition of definitions) {
      if (definition.on !== job.data.event) continue;
      await boss.send(definition.name, job.data.ids, {
        // Handed out twice by a worker killed between send and completion, it still runs once.
        id: uuidv5(definition.name, job.id),
        retryLimit: definition.tries - 1,
        retryDelay: definition.retryDelaySeconds,
        retryBackoff: true,
        expireInSeconds: definition.longestSeconds ?? LIVING_SECONDS,
      });
    }
  });
  for (const definition of definitions) {
    if (typeof definition.on === 'object') await boss.schedule(definition.name, definition.on.cron);
    if (definition.alsoAtStart) await boss.send(definition.name, {});
    await boss.work<EventIds>(definition.name, { pollingIntervalSeconds: 0.5 }, async ([job]) => {
      if (!job) return;
      // What a schedule sends has no ids.
      const work = () => run(definition, (job.data as EventIds | null) ?? {}, job.id);
      await (definition.longestSeconds === undefined
        ? work()
        : whileAlive(boss, definition.name, job.id, work));
    });
  }
}

/** Runs long work and keeps telling the queue that its worker lives, so that a killed one is noticed soon. */
async function whileAlive(boss: PgBoss, name: string, id: string, work: () => Promise<void>): Promise<void> {
  const database = boss.getDb();
  const tell = () =>
    database.executeSql(
      // The queue asks whether started_on + expire_in has passed; trying again sets started_on anew.
      `update pgboss.job set started_on = now() - expire_in + $3 * interval '1 second'
       where name = $1 and id = $2 and state = 'active'`,
      [name, id, LIVING_SECONDS],
    );
  await tell();
  const timer = setInterval(() => {
    // A database that is away for a moment is told the next time.
    void tell().catch(() => undefined);
  }, TELL_MS);
  try {
    await work();
  } finally {
    clearInterval(timer);
  }
}
