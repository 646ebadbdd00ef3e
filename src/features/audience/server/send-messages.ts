import { setTimeout as wait } from 'node:timers/promises';
import { and, eq, sql } from 'drizzle-orm';
import { messages } from '../../../db/schema/audience.ts';
import { evenPace, waitAfterTry } from '../../../domain/audience/announcement-rules.ts';
import { paths } from '../../../paths.ts';
import { signToken } from '../../../server/auth/signed-token.ts';
import { TooMany } from '../../../server/errors.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { MailDeferred, MailRefused } from '../../../server/mail/mail-errors.ts';
import { type Services } from '../../../server/services.ts';
import { LEAVE_PURPOSE } from '../audience.ts';
import { announcementMail } from '../emails.ts';
import { CLAIM_SECONDS, claimMessage, findWork, renewClaim, settleAnnouncements } from './claim-message.ts';

/** A lap ends before the next minute's does, so that what one worker leaves is soon another's. */
const LAP_MS = 50_000;
const LONGEST_PAUSE_MS = 30_000;

type Claimed = NonNullable<Awaited<ReturnType<typeof claimMessage>>>;
type Outcome =
  | { readonly state: 'sent' }
  | { readonly state: 'refused' | 'failed'; readonly problem: string }
  | {
      readonly state: 'waiting';
      readonly problem: string;
      readonly seconds: number;
      readonly serverAway: boolean;
    };

/**
 * Sends messages that are due, one at a time, at the pace of MAIL_PER_MINUTE, until none is left or the lap is over.
 * Any number of workers do so side by side: each message is claimed by one of them.
 * @param ids.announcementId only of this announcement; of all when left out
 */
export const sendMessages: JobHandler = async (services, ids) => {
  const { db, mailer } = services;
  const only = ids['announcementId'];
  const end = Date.now() + LAP_MS;
  let pauseMs = 1_000;
  while (Date.now() < end && !mailer.closed) {
    const work = await patiently(services, () => findWork(db, only));
    if (work === 'none') break;
    if (work === 'later') {
      await patiently(services, () => settleAnnouncements(db));
      await wait(1_000);
      continue;
    }
    const turnMs = await waitForTurn(services);
    if (turnMs > 0) {
      await wait(Math.min(turnMs, 1_000));
      continue;
    }
    const message = await patiently(services, () => claimMessage(db, only));
    if (message === null) continue;
    const outcome = await deliver(services, message);
    await patiently(services, () => record(services, message.id, outcome));
    const away = outcome.state === 'waiting' && outcome.serverAway;
    // While the server is away the list would use up its tries to no end.
    if (away) await wait(Math.min(pauseMs, Math.max(0, end - Date.now())));
    pauseMs = away ? Math.min(pauseMs * 2, LONGEST_PAUSE_MS) : 1_000;
  }
  await patiently(services, () => settleAnnouncements(db));
};

/** How long the pace that all workers share makes this one wait, in milliseconds; 0 is its turn. */
async function waitForTurn({ limiter, settings }: Services): Promise<number> {
  const { count, seconds } = evenPace(settings.MAIL_PER_MINUTE);
  try {
    await limiter.count({ name: 'announcements', by: 'address', tries: count, seconds }, 'everyone');
    return 0;
  } catch (error) {
    if (error instanceof TooMany) return Math.max(10, error.retryAfterSeconds * 1000);
    throw error;
  }
}

async function deliver(services: Services, message: Claimed): Promise<Outcome> {
  const { mailer, settings, db, log } = services;
  const renewing = setInterval(
    () => {
      // A database that is away for a moment is told the next time.
      void renewClaim(db, message.id).catch(() => undefined);
    },
    (CLAIM_SECONDS * 1000) / 3,
  );
  const token = signToken(settings.AUTH_SECRET, LEAVE_PURPOSE, message.subscriberId);
  try {
    await mailer.send({
      to: message.email,
      from: { name: message.content.workshop },
      mail: announcementMail({
        ...message.content,
        leave: settings.PUBLIC_URL + paths.leave(message.subscriberId, token),
      }),
      messageId: message.messageId,
      // RFC 8058: both headers, the first an https address that takes a POST.
      headers: {
        'List-Unsubscribe': `<${settings.PUBLIC_URL}${paths.api.leave(message.subscriberId, token)}>`,
        'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
      },
    });
    return { state: 'sent' };
  } catch (error) {
    if (error instanceof MailRefused) return { state: 'refused', problem: error.message };
    if (!(error instanceof MailDeferred)) {
      log.error({ err: error, message: message.id }, 'A message could not be written.');
      return { state: 'failed', problem: 'The mail could not be written.' };
    }
    const seconds = waitAfterTry(message.tries);
    if (seconds === null) return { state: 'failed', problem: error.message };
    // 421 closes the service; without a code nothing answered; 5xx here is about us, not about the recipient.
    const serverAway = error.code === undefined || error.code === 421 || error.code >= 500;
    return { state: 'waiting', problem: error.message, seconds, serverAway };
  } finally {
    clearInterval(renewing);
  }
}

async function record({ db }: Services, id: string, outcome: Outcome): Promise<void> {
  await db
    .update(messages)
    .set({
      state: outcome.state,
      claimedUntil: null,
      updatedAt: sql`now()`,
      problem: outcome.state === 'sent' ? null : outcome.problem,
      ...(outcome.state === 'sent' && { sentAt: sql`now()` }),
      ...(outcome.state === 'waiting' && {
        notBefore: sql`now() + ${outcome.seconds} * interval '1 second'`,
      }),
    })
    .where(and(eq(messages.id, id), eq(messages.state, 'sending')));
}

const PATIENCE_MS = 20_000;

/**
 * Does something with the database, again for a while when its connection breaks: a mail that is out and not
 * recorded would go out twice.
 */
async function patiently<Result>({ mailer }: Services, work: () => Promise<Result>): Promise<Result> {
  const end = Date.now() + PATIENCE_MS;
  for (;;) {
    try {
      return await work();
    } catch (error) {
      if (Date.now() > end || mailer.closed) throw error;
      await wait(500);
    }
  }
}
