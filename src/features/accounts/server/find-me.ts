import { and, asc, eq } from 'drizzle-orm';
import { memberships, workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { read } from '../../../server/verb.ts';

/** Who is signed in and which workshops they have a role in, by name; null when nobody is. */
export const findMe = read({ may: 'account.enter' }, async ({ db, actor }) => {
  if (actor.kind === 'anyone') return null;
  const rows = await db
    .select({ slug: workshopSlugs.slug, name: workshops.name, role: memberships.role })
    .from(memberships)
    .innerJoin(workshops, eq(workshops.id, memberships.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .where(eq(memberships.accountId, actor.id))
    .orderBy(asc(workshops.name), asc(workshops.id));
  return { name: actor.name, email: actor.email, secondFactor: actor.secondFactor, workshops: rows };
});
