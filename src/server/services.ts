import { type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { type Logger } from 'pino';
import { openDatabase } from '../db/client.ts';
import { requireMigrated } from '../db/migrate.ts';
import { type AccountMails, type Auth, openAuth } from './auth/auth.ts';
import { type ServiceSettings } from './env.ts';
import { type JobQueue, openJobQueue } from './jobs/queue.ts';
import { openRateLimiter, type RateLimiter } from './limits/rate-limiter.ts';
import { type Mailer, openMailer, type Outgoing } from './mail/send-mail.ts';
import { openStorage, type Storage } from './storage/storage.ts';

/** What one process works with; opened once, handed on in the context. */
export interface Services {
  readonly settings: ServiceSettings;
  readonly db: NodePgDatabase;
  readonly auth: Auth;
  readonly mailer: Mailer;
  /** Sends a mail at once, for one with a token in it; whoever asked does not wait, and one that fails is only logged. */
  sendAtOnce(outgoing: Outgoing): void;
  readonly jobs: JobQueue;
  readonly storage: Storage;
  readonly limiter: RateLimiter;
  readonly log: Logger;
  /** Whether the database answers. */
  isHealthy(): Promise<boolean>;
  /** Lets mail that is on its way go out, then closes everything. */
  close(): Promise<void>;
}

/**
 * Opens everything that a process needs.
 * @param parts.accountMails what the account mails say
 * @param parts.worker whether this process looks after the job queue
 * @throws DatabaseVersionError when the database does not fit this code
 */
export async function openServices(parts: {
  readonly settings: ServiceSettings;
  readonly log: Logger;
  readonly accountMails: AccountMails;
  readonly worker: boolean;
}): Promise<Services> {
  const { settings, log } = parts;
  const database = openDatabase(settings.DATABASE_URL, {
    onIdleError: (error) => log.warn({ error: error.message }, 'A database connection was lost.'),
  });
  await requireMigrated(database.pool);
  const jobs = await openJobQueue(settings.DATABASE_URL, {
    maintain: parts.worker,
    onError: (error) => log.warn({ error: error.message }, 'The job queue met an error.'),
  });
  const mailer = openMailer(settings, log);
  const storage = openStorage(settings, log);
  const onTheirWay = new Set<Promise<void>>();
  function sendAtOnce(outgoing: Outgoing): void {
    const sending = mailer
      .send(outgoing)
      .catch((error: unknown) => {
        log.error({ error: error instanceof Error ? error.message : String(error) }, 'A mail was not sent.');
      })
      .finally(() => onTheirWay.delete(sending));
    onTheirWay.add(sending);
  }
  return {
    settings,
    db: database.db,
    auth: openAuth({
      settings,
      db: database.db,
      mails: parts.accountMails,
      log,
      sendLater: (to, mail) => {
        sendAtOnce({ to, mail });
      },
    }),
    mailer,
    sendAtOnce,
    jobs,
    storage,
    limiter: openRateLimiter(database.pool),
    log,
    isHealthy: async () => {
      const { rowCount } = await database.pool.query('select 1');
      return rowCount === 1;
    },
    close: async () => {
      await Promise.allSettled(onTheirWay);
      await mailer.close();
      storage.close();
      await jobs.close();
      await database.close();
    },
  };
}
