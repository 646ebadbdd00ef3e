import { pino } from 'pino';
import { accountMails } from '../process-mails.ts';
import { startProcess } from '../process-life.ts';
import { isLoopback, readServiceSettings } from '../server/env.ts';
import { openServices } from '../server/services.ts';
import { seedDemo } from './demo.ts';
import { keepConfirmations } from './people.ts';

// Prints one line of JSON an account.
await startProcess(async () => {
  const settings = readServiceSettings();
  if (!isLoopback(new URL(settings.DATABASE_URL).hostname)) {
    throw Object.assign(
      new Error('The demo has known passwords and goes into a database on this machine only.'),
      {
        code: 'DEMO_REFUSED',
      },
    );
  }
  const { mails, tokenFor } = keepConfirmations(accountMails(settings.PUBLIC_URL));
  const services = await openServices({
    settings,
    log: pino({ name: 'seed', level: 'warn' }, pino.destination(2)),
    accountMails: mails,
    worker: false,
  });
  const accounts = await seedDemo(services, tokenFor);
  await services.close();
  process.stdout.write(accounts.map((account) => `${JSON.stringify(account)}\n`).join(''));
});
