import { and, eq, inArray, isNull, or } from 'drizzle-orm';
import { messages, subscribers } from '../../../db/schema/audience.ts';
import { verb } from '../../../server/verb.ts';
import { DONE, LEAVE_PURPOSE } from '../audience.ts';
import { loadSubscription } from './load-subscription.ts';

/**
 * Takes an address off a list, by the link of a mail that never expires. Whatever else would bring the same mails
 * ends with it: of a build, the workshop's list too; of the workshop, those of its builds. A mail that still waits
 * is not sent. Once more does no harm.
 * @throws NotFound for a link that is not ours
 */
export const leave = verb(
  { may: 'mailed-link.follow' },
  async (context, input: { readonly subscriber: string; readonly token: string }) => {
    const { db, now } = context;
    const left = await loadSubscription(context, LEAVE_PURPOSE, input.subscriber, input.token);
    const gone = await db
      .update(subscribers)
      .set({ state: 'left', leftAt: now })
      .where(
        and(
          eq(subscribers.workshopId, left.workshopId),
          eq(subscribers.email, left.email),
          inArray(subscribers.state, ['asked', 'confirmed']),
          left.buildId === null
            ? undefined
            : or(eq(subscribers.buildId, left.buildId), isNull(subscribers.buildId)),
        ),
      )
      .returning({ id: subscribers.id });
    if (gone.length > 0) {
      await db.delete(messages).where(
        and(
          inArray(
            messages.subscriberId,
            gone.map(({ id }) => id),
          ),
          eq(messages.state, 'waiting'),
        ),
      );
    }
    return DONE;
  },
);
