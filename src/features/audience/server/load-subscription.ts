import { and, eq } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { builds } from '../../../db/schema/builds.ts';
import { workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { isSignedToken } from '../../../server/auth/signed-token.ts';
import { type Context } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';

/**
 * A subscription by its mailed link.
 * @param purpose what the link is for
 * @throws NotFound for a token that is not ours, or a subscription that is gone
 */
export async function loadSubscription(
  { db, services }: Context,
  purpose: string,
  id: string,
  token: string,
) {
  const [row] = await db
    .select({
      id: subscribers.id,
      workshopId: subscribers.workshopId,
      buildId: subscribers.buildId,
      email: subscribers.email,
      state: subscribers.state,
      askedAt: subscribers.askedAt,
      workshop: { name: workshops.name, slug: workshopSlugs.slug },
      build: builds.name,
    })
    .from(subscribers)
    .innerJoin(workshops, eq(workshops.id, subscribers.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .leftJoin(builds, eq(builds.id, subscribers.buildId))
    .where(eq(subscribers.id, id));
  if (!row || !isSignedToken(services.settings.AUTH_SECRET, purpose, id, token)) {
    throw new NotFound('This link is not whole, or its list is gone. It');
  }
  return row;
}
