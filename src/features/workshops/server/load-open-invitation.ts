import { and, eq, gt, isNull } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { invitations, workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { isSignedToken } from '../../../server/auth/signed-token.ts';
import { type Context } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { INVITATION_PURPOSE } from '../workshop.ts';

/** Reads an invitation that still holds, by its mailed link. @throws NotFound */
export async function loadOpenInvitation({ db, services, now }: Context, id: string, token: string) {
  if (!isSignedToken(services.settings.AUTH_SECRET, INVITATION_PURPOSE, id, token)) {
    throw new NotFound('This invitation');
  }
  const [row] = await db
    .select({
      id: invitations.id,
      email: invitations.email,
      role: invitations.role,
      workshopId: invitations.workshopId,
      workshopName: workshops.name,
      slug: workshopSlugs.slug,
      inviter: accounts.name,
    })
    .from(invitations)
    .innerJoin(workshops, eq(workshops.id, invitations.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .innerJoin(accounts, eq(accounts.id, invitations.invitedBy))
    .where(
      and(
        eq(invitations.id, id),
        isNull(invitations.acceptedAt),
        isNull(invitations.withdrawnAt),
        gt(invitations.expiresAt, now),
      ),
    );
  if (!row) throw new NotFound('This invitation was taken up or withdrawn, or is too old. It');
  return row;
}
