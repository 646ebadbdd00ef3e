import { and, eq, isNull, lte } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { accounts } from '../../../db/schema/accounts.ts';
import { invitations, memberships } from '../../../db/schema/workshops.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Invite, INVITATION_DAYS } from '../workshop.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/** Invites someone to the team by mail. @throws Invalid at `email` for a member, or one invited already */
export const inviteMember = verb(
  { may: 'team.change' },
  async ({ db, actor, workshop, now, services }, { email, role }: Invite) => {
    if (actor.kind !== 'account') throw new Error('Only an account can invite.');
    const [member] = await db
      .select({ id: memberships.id })
      .from(memberships)
      .innerJoin(accounts, eq(accounts.id, memberships.accountId))
      .where(and(eq(memberships.workshopId, workshop.id), eq(accounts.email, email)));
    if (member) throw new Invalid({ email: 'They are on the team already.' });
    await db
      .update(invitations)
      .set({ withdrawnAt: now })
      .where(
        and(
          eq(invitations.workshopId, workshop.id),
          eq(invitations.email, email),
          isNull(invitations.acceptedAt),
          isNull(invitations.withdrawnAt),
          lte(invitations.expiresAt, now),
        ),
      );
    const id = newId();
    await onUniqueViolation(
      {
        invitations_open_unique: {
          email: 'They are invited already. Withdraw that invitation to send another.',
        },
      },
      () =>
        db.insert(invitations).values({
          id,
          workshopId: workshop.id,
          email,
          role,
          invitedBy: actor.id,
          createdAt: now,
          expiresAt: new Date(now.getTime() + INVITATION_DAYS * DAY_MS),
        }),
    );
    await services.jobs.enqueue(db, 'invitation-made', { invitationId: id });
    return { id };
  },
);
