import { sql, type SQL } from 'drizzle-orm';
import pg from 'pg';
import { type Logger } from 'pino';
import { ChangeCounter, EVERY_PAGE, type PageChanges } from './change-counter.ts';

/** The channel on which the web processes hear of changes. */
const PAGE_CHANNEL = 'page_changed';

/** PostgreSQL refuses a payload of 8000 bytes or more. */
const PAYLOAD_BYTES = 7_900;

/** Past so many notices, one that empties the cache costs less. */
const MOST_NOTICES = 8;

const TAG = /^[\w:.-]+$/;

/** Anything of drizzle-orm that runs a statement: a transaction or the database itself. */
export type ChangeWriter = { execute(query: SQL): PromiseLike<unknown> };

/**
 * The payloads that carry the tags, each within PostgreSQL's limit.
 * @throws TypeError for a tag that is neither `*` nor a plain word such as `build:ID`
 */
export function pageChangePayloads(tags: readonly string[]): string[] {
  const bad = tags.find((tag) => tag !== EVERY_PAGE && !TAG.test(tag));
  if (bad !== undefined) throw new TypeError(`Not a page tag: ${JSON.stringify(bad)}`);
  if (tags.includes(EVERY_PAGE)) return [EVERY_PAGE];
  const payloads: string[] = [];
  let payload = '';
  for (const tag of new Set(tags)) {
    // A tag is ASCII, so its length is its size in bytes.
    if (payload !== '' && payload.length + 1 + tag.length > PAYLOAD_BYTES) {
      payloads.push(payload);
      payload = '';
    }
    payload = payload === '' ? tag : `${payload},${tag}`;
    if (tag.length > PAYLOAD_BYTES) return [EVERY_PAGE];
  }
  if (payload !== '') payloads.push(payload);
  return payloads.length > MOST_NOTICES ? [EVERY_PAGE] : payloads;
}

/**
 * Tells every web process that the public pages with these tags have changed. Call it in the transaction that
 * writes: PostgreSQL sends the notice when it commits, and never when it does not.
 * @param tags such as `workshop:ID` and `build:ID`, or `*` for every page; none announces nothing
 * @throws TypeError for a tag of another form
 */
export async function announcePageChanges(db: ChangeWriter, tags: readonly string[]): Promise<void> {
  for (const payload of pageChangePayloads(tags)) {
    await db.execute(sql`select pg_notify(${PAGE_CHANNEL}, ${payload})`);
  }
}

const FIRST_RETRY_MS = 100;
const LONGEST_RETRY_MS = 10_000;
/** A connection that died without a word is found out after at most these two together. */
const HEARTBEAT_MS = 10_000;
const HEARTBEAT_TIMEOUT_MS = 5_000;

export type ListenOptions = {
  readonly connectionString: string;
  readonly log: Logger;
};

/**
 * Listens for changes to public pages on a connection of its own. Losing it counts as a change of everything,
 * `live` is false until it is back, and it is tried again with growing pauses until closed.
 * @returns after the first attempt, whether it worked or not
 */
export async function listenForPageChanges({ connectionString, log }: ListenOptions): Promise<PageChanges> {
  const changes = new ChangeCounter();
  let client: pg.Client | undefined;
  let live = false;
  let closed = false;
  let retryMs = FIRST_RETRY_MS;
  let retryTimer: NodeJS.Timeout | undefined;
  let heartbeat: NodeJS.Timeout | undefined;

  function lose(lost: pg.Client, error?: Error): void {
    if (client !== lost) return;
    client = undefined;
    clearInterval(heartbeat);
    const wasLive = live;
    live = false;
    if (wasLive) changes.move([EVERY_PAGE]);
    // Ending it politely could wait for a peer that is gone.
    lost.end().catch(() => undefined);
    if (closed) return;
    log.warn({ err: error, retryMs }, 'not hearing page changes; public pages are not kept');
    retryTimer = setTimeout(() => void connect(), retryMs);
    retryMs = Math.min(retryMs * 2, LONGEST_RETRY_MS);
  }

  async function connect(): Promise<void> {
    const next = new pg.Client({
      connectionString,
      application_name: 'centrepop page changes',
      keepAlive: true,
      connectionTimeoutMillis: 5_000,
      query_timeout: HEARTBEAT_TIMEOUT_MS,
    });
    client = next;
    next.on('error', (error) => {
      lose(next, error);
    });
    next.on('end', () => {
      lose(next);
    });
    next.on('notification', ({ payload = '' }) => {
      if (client === next && live && payload !== '') changes.move(payload.split(','));
    });
    try {
      await next.connect();
      await next.query(`listen ${PAGE_CHANNEL}`);
    } catch (error) {
      lose(next, error instanceof Error ? error : new Error(String(error)));
      return;
    }
    if (client !== next) return;
    retryMs = FIRST_RETRY_MS;
    live = true;
    // What changed while nobody listened is unknown: no render that began before now may be kept.
    changes.move([EVERY_PAGE]);
    heartbeat = setInterval(() => {
      next.query('select 1').catch((error: unknown) => {
        lose(next, error instanceof Error ? error : new Error(String(error)));
      });
    }, HEARTBEAT_MS);
    heartbeat.unref();
    log.debug('hearing page changes');
  }

  await connect();

  return {
    get live() {
      return live;
    },
    counter: () => changes.counter(),
    movedSince: (tags, since) => changes.movedSince(tags, since),
    subscribe: (listener) => changes.subscribe(listener),
    async close() {
      closed = true;
      clearTimeout(retryTimer);
      const open = client;
      client = undefined;
      live = false;
      clearInterval(heartbeat);
      await open?.end().catch(() => undefined);
    },
  };
}
