import { pino } from 'pino';
import { bufferLines } from './server/http/buffered-log.ts';
import { accountMails } from './process-mails.ts';
import { type ServiceSettings } from './server/env.ts';
import { openServices, type Services } from './server/services.ts';

/**
 * The services of one process, with the features' own words in its mails.
 * @param name the process, as its log lines say it
 */
export function openProcessServices(
  settings: ServiceSettings,
  name: 'web' | 'worker' | 'seed' | 'admin',
): Promise<Services> {
  return openServices({
    settings,
    log: pino({ name, level: settings.LOG_LEVEL }, bufferLines(pino.destination(1))),
    accountMails: accountMails(settings.PUBLIC_URL),
    worker: name === 'worker',
  });
}
