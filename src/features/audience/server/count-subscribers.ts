import { count, eq } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { SUBSCRIBER_STATES, type SubscriberState } from '../../../domain/audience/audience-states.ts';
import { read } from '../../../server/verb.ts';

/** How many subscriptions a workshop has, by state. */
export const countSubscribers = read(
  { may: 'address.see' },
  async ({ db, workshop }): Promise<Readonly<Record<SubscriberState, number>>> => {
    const rows = await db
      .select({ state: subscribers.state, count: count() })
      .from(subscribers)
      .where(eq(subscribers.workshopId, workshop.id))
      .groupBy(subscribers.state);
    const counts = Object.fromEntries(SUBSCRIBER_STATES.map((state) => [state, 0]));
    for (const row of rows) counts[row.state] = row.count;
    return counts as Record<SubscriberState, number>;
  },
);
