import { and, desc, eq } from 'drizzle-orm';
import { workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { read } from '../../../server/verb.ts';

/** The newest workshops, as the front door shows them. */
export const listNewWorkshops = read({ may: 'account.enter' }, async ({ db }) => {
  const items = await db
    .select({ slug: workshopSlugs.slug, name: workshops.name, since: workshops.createdAt })
    .from(workshops)
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .orderBy(desc(workshops.id))
    .limit(12);
  return { items, nextCursor: null };
});
