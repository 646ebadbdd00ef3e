import { and, eq } from 'drizzle-orm';
import { memberships } from '../../src/db/schema/workshops.ts';
import { type TeamRole } from '../../src/domain/roles.ts';
import { INVITATION_PURPOSE } from '../../src/features/workshops/workshop.ts';
import { signToken } from '../../src/server/auth/signed-token.ts';
import { type Services } from '../../src/server/services.ts';

/** Someone's place in a workshop's team: its id and role; undefined when they have none. */
export async function memberOf(
  services: Services,
  workshopId: string,
  accountId: string,
): Promise<{ id: string; role: TeamRole } | undefined> {
  const [member] = await services.db
    .select({ id: memberships.id, role: memberships.role })
    .from(memberships)
    .where(and(eq(memberships.workshopId, workshopId), eq(memberships.accountId, accountId)));
  return member;
}

/** The token of an invitation's link. */
export function invitationToken(services: Services, invitation: string): string {
  return signToken(services.settings.AUTH_SECRET, INVITATION_PURPOSE, invitation);
}
