import { and, eq } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { CONFIRM_DAYS, CONFIRM_PURPOSE, DONE } from '../audience.ts';
import { loadSubscription } from './load-subscription.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/**
 * Confirms a subscription by its mailed link; once more does no harm. Whoever has left asks anew.
 * @throws NotFound for a link that is not ours, Invalid for one that is too old
 */
export const confirmSubscription = verb(
  { may: 'mailed-link.follow' },
  async (context, input: { readonly subscriber: string; readonly token: string }) => {
    const { db, now } = context;
    const { id, state, askedAt } = await loadSubscription(
      context,
      CONFIRM_PURPOSE,
      input.subscriber,
      input.token,
    );
    if (state === 'confirmed') return DONE;
    if (state !== 'asked' || now.getTime() - askedAt.getTime() > CONFIRM_DAYS * DAY_MS) {
      throw new Invalid({ '': 'This link is over. Ask on the page again to get a new one.' });
    }
    await db
      .update(subscribers)
      .set({ state: 'confirmed', confirmedAt: now, leftAt: null, bouncedAt: null })
      .where(and(eq(subscribers.id, id), eq(subscribers.state, 'asked')));
    return DONE;
  },
);
