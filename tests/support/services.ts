import { pino } from 'pino';
import { afterAll, afterEach, expect } from 'vitest';
import { accountMails } from '../../src/process-mails.ts';
import { type Mail } from '../../src/domain/mail.ts';
import { keepConfirmations } from '../../src/seed/people.ts';
import { type AccountMails } from '../../src/server/auth/auth.ts';
import { readServiceSettings } from '../../src/server/env.ts';
import { openServices, type Services } from '../../src/server/services.ts';
import { testDatabase } from './database.ts';
import { openOutbox, type Outbox } from './outbox.ts';

/** Where the tests' product says it is: pages of this origin may write. */
export const PUBLIC_URL = 'http://shed.test';

/** One account mail as it was asked for: which, and what it was given. */
export interface AskedMail {
  readonly mail: keyof AccountMails;
  readonly name?: string;
  readonly newEmail?: string;
  readonly token?: string;
}

/** The real services of one test file. */
export interface TestServices extends Services {
  /** The mail server's outbox: every mail that was sent, and how it is to behave. */
  readonly outbox: Outbox;
  /** The newest confirmation token mailed to someone, by name, known before the mail has arrived. */
  readonly tokenFor: (name: string) => string;
  /**
   * Every account mail asked for so far, in order, known before the answer that asked for it: that none was asked
   * for needs no waiting. Whether it went out is for the outbox to say.
   */
  readonly asked: AskedMail[];
  /** What was logged as a warning or worse since the last test; whoever expects it takes it with `splice(0)`. */
  readonly logged: string[];
}

/**
 * Opens the product's own services on a database of this file's and an SMTP server in this process. Call it once,
 * at the top of the file: `const services = await testServices();`. It closes itself after the tests.
 *
 * A test that logs a warning or an error fails, as one that prints to the console does: an answer of 500 does not
 * pass unseen.
 * @param options.worker whether it looks after the job queue, which tests of jobs need
 */
export async function testServices(options: { readonly worker?: boolean } = {}): Promise<TestServices> {
  const databaseUrl = await testDatabase();
  const outbox = await openOutbox();
  const settings = readServiceSettings({
    PUBLIC_URL,
    DATABASE_URL: databaseUrl,
    SMTP_URL: outbox.smtpUrl,
    MAIL_FROM: 'Centrepop <post@centrepop.test>',
    AUTH_SECRET: 'a-secret-of-the-tests-and-nothing-else',
    S3_ENDPOINT: 'http://127.0.0.1:1',
    S3_ACCESS_KEY_ID: 'none',
    S3_SECRET_ACCESS_KEY: 'none',
  });
  const logged: string[] = [];
  const asked: AskedMail[] = [];
  const { mails, tokenFor } = keepConfirmations(recordAsked(accountMails(settings.PUBLIC_URL), asked));
  const services = await openServices({
    settings,
    log: pino({ level: 'warn' }, { write: (line: string) => void logged.push(line) }),
    accountMails: mails,
    worker: options.worker ?? false,
  });
  afterEach(() => {
    expect(logged.splice(0), 'the test logged warnings or errors').toEqual([]);
  });
  afterAll(async () => {
    await services.close();
    await outbox.close();
  });
  return { ...services, outbox, tokenFor, asked, logged };
}

function recordAsked(mails: AccountMails, asked: AskedMail[]): AccountMails {
  return new Proxy(mails, {
    get: (target, mail: keyof AccountMails) => (props: Omit<AskedMail, 'mail'>) => {
      asked.push({ mail, ...props });
      return (target[mail] as (given: typeof props) => Mail)(props);
    },
  });
}
