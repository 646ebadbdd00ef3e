import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';
import type { Mail } from '../../domain/mail.ts';
import { isLoopback, type ServiceSettings } from '../env.ts';
import { cleanLine } from './clean-text.ts';
import { isMailAddress, maskAddress } from './mail-address.ts';
import { classifyMailError, MailDeferred, MailRefused } from './mail-errors.ts';
import { readMailFrom } from './mail-from.ts';
import { mailHeaders, type MailHeaders } from './mail-headers.ts';
import { renderMail } from './render-mail.ts';

/** One mail to one person. */
export type Outgoing = {
  /** One bare address. */
  readonly to: string;
  readonly mail: Mail;
  /** The name to show as the sender; the address is always that of MAIL_FROM. */
  readonly from?: { readonly name: string };
  /** One bare address. */
  readonly replyTo?: string;
  /** Extra header lines by name, such as List-Unsubscribe; each becomes exactly one line. */
  readonly headers?: MailHeaders;
  /** With its angle brackets; made here when left out. */
  readonly messageId?: string;
};

export type Mailer = {
  /**
   * Sends one mail and comes back once the server has taken it.
   * @throws MailRefused when it never will, MailDeferred when it may later
   * @throws RangeError for a header, Message-ID or link that cannot be written
   */
  send(outgoing: Outgoing): Promise<void>;
  /** Whether it is being shut down and sends no more. */
  readonly closed: boolean;
  /** Lets what is being sent finish, then closes the connections. */
  close(): Promise<void>;
};

/** Time limits in milliseconds: to connect, to be greeted, without a sign of life, and for a mail in all. */
export const MAIL_LIMITS = { connect: 10_000, greeting: 10_000, idle: 60_000, whole: 120_000 };

type MailSettings = Pick<
  ServiceSettings,
  'SMTP_URL' | 'MAIL_FROM' | 'DKIM_DOMAIN' | 'DKIM_SELECTOR' | 'DKIM_PRIVATE_KEY'
>;

function readDkim(settings: MailSettings) {
  const { DKIM_DOMAIN: domainName, DKIM_SELECTOR: keySelector, DKIM_PRIVATE_KEY: key } = settings;
  if (domainName === undefined && keySelector === undefined && key === undefined) return undefined;
  if (domainName === undefined || keySelector === undefined || key === undefined) {
    throw new RangeError('DKIM_DOMAIN, DKIM_SELECTOR and DKIM_PRIVATE_KEY must be set together.');
  }
  // A key set in a one-line variable has its line breaks written out.
  return { domainName, keySelector, privateKey: key.replace(/\\n/g, '\n') };
}

function openTransport(settings: MailSettings, limits: typeof MAIL_LIMITS) {
  const server = new URL(settings.SMTP_URL);
  const loopback = isLoopback(server.hostname);
  const dkim = readDkim(settings);
  return createTransport({
    url: settings.SMTP_URL,
    pool: true,
    maxConnections: 4,
    // A broken connection may come after the mail was taken: whoever asked decides about a second try.
    maxRequeues: 0,
    idleTimeout: 30_000,
    connectionTimeout: limits.connect,
    dnsTimeout: limits.connect,
    greetingTimeout: limits.greeting,
    socketTimeout: limits.idle,
    allowInternalNetworkInterfaces: loopback,
    // A password never crosses a network in the clear.
    requireTLS: server.protocol === 'smtp:' && server.username !== '' && !loopback,
    disableFileAccess: true,
    disableUrlAccess: true,
    ...(dkim && { dkim }),
  });
}

function checkRecipients({ to, replyTo }: Outgoing): void {
  for (const address of replyTo === undefined ? [to] : [to, replyTo]) {
    if (!isMailAddress(address)) throw new MailRefused(553, 'That is not a mail address.');
  }
}

/**
 * Opens the way out for mail: a pool of connections to SMTP_URL, opened when first needed.
 * @param log gets a line a mail, without whole addresses, subjects or links
 * @throws RangeError when MAIL_FROM or the DKIM settings cannot be used
 */
export function openMailer(settings: MailSettings, log: Logger, limits = MAIL_LIMITS): Mailer {
  const sender = readMailFrom(settings.MAIL_FROM);
  const transport = openTransport(settings, limits);
  const underway = new Set<Promise<void>>();
  let closed = false;

  async function deliver(outgoing: Outgoing): Promise<void> {
    if (closed) throw new MailDeferred(undefined, 'mail is being shut down');
    checkRecipients(outgoing);
    const { to, mail, from, replyTo, headers, messageId } = outgoing;
    const message = {
      ...renderMail(mail),
      from: { address: sender.address, name: from ? cleanLine(from.name) : sender.name },
      to: { address: to, name: '' },
      ...(replyTo !== undefined && { replyTo: { address: replyTo, name: '' } }),
      ...mailHeaders(headers, messageId),
    };
    const about = { to: maskAddress(to) };
    try {
      const sent = await transport.sendMail({ ...message, signal: AbortSignal.timeout(limits.whole) });
      log.info({ ...about, messageId: sent.messageId }, 'mail sent');
    } catch (error) {
      const sorted = classifyMailError(error);
      log.warn({ ...about, code: sorted.code, kind: sorted.name }, sorted.message);
      throw sorted;
    }
  }

  return {
    get closed() {
      return closed;
    },
    send(outgoing) {
      const sending = deliver(outgoing);
      underway.add(sending);
      return sending.finally(() => underway.delete(sending));
    },
    async close() {
      closed = true;
      await Promise.allSettled(underway);
      transport.close();
    },
  };
}
