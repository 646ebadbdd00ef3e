import { and, asc, eq, isNull } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { invitations, memberships } from '../../../db/schema/workshops.ts';
import { may } from '../../../domain/permissions.ts';
import { read } from '../../../server/verb.ts';

/**
 * The team, in the order they joined, and the invitations that nobody took up, those that have run out too.
 * Addresses are for the owner alone.
 */
export const listTeam = read({ may: 'team.see' }, async ({ db, workshop, role }) => {
  const seesAddresses = may(role, 'team.change');
  const members = await db
    .select({
      id: memberships.id,
      accountId: memberships.accountId,
      name: accounts.name,
      email: accounts.email,
      role: memberships.role,
      secondFactor: accounts.twoFactorEnabled,
    })
    .from(memberships)
    .innerJoin(accounts, eq(accounts.id, memberships.accountId))
    .where(eq(memberships.workshopId, workshop.id))
    .orderBy(asc(memberships.id));
  const waiting = seesAddresses
    ? await db
        .select({
          id: invitations.id,
          email: invitations.email,
          role: invitations.role,
          expiresAt: invitations.expiresAt,
        })
        .from(invitations)
        .where(
          and(
            eq(invitations.workshopId, workshop.id),
            isNull(invitations.acceptedAt),
            isNull(invitations.withdrawnAt),
          ),
        )
        .orderBy(asc(invitations.id))
    : [];
  return {
    members: members.map((member) => ({ ...member, email: seesAddresses ? member.email : null })),
    invitations: waiting,
  };
});
