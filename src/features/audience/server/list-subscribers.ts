import { and, desc, eq, lt } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { builds } from '../../../db/schema/builds.ts';
import { read } from '../../../server/verb.ts';

const PAGE = 200;

/**
 * The subscribers of a workshop, whoever asked last first.
 * @param input.before the cursor of the page before
 */
export const listSubscribers = read(
  { may: 'address.see' },
  async ({ db, workshop }, input: { readonly before?: string | undefined }) => {
    const rows = await db
      .select({
        id: subscribers.id,
        email: subscribers.email,
        state: subscribers.state,
        build: builds.name,
        askedAt: subscribers.askedAt,
        confirmedAt: subscribers.confirmedAt,
      })
      .from(subscribers)
      .leftJoin(builds, eq(builds.id, subscribers.buildId))
      .where(
        and(
          eq(subscribers.workshopId, workshop.id),
          input.before === undefined ? undefined : lt(subscribers.id, input.before),
        ),
      )
      .orderBy(desc(subscribers.id))
      .limit(PAGE + 1);
    const items = rows.slice(0, PAGE);
    return { items, nextCursor: rows.length > PAGE ? (items.at(-1)?.id ?? null) : null };
  },
);
