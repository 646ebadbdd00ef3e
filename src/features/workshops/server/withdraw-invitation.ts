import { and, eq, isNull } from 'drizzle-orm';
import { invitations } from '../../../db/schema/workshops.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';

/** Withdraws an invitation that waits: its link stops working. */
export const withdrawInvitation = verb(
  { may: 'team.change' },
  async ({ db, workshop, now }, { invitation }: { invitation: string }) => {
    const [withdrawn] = await db
      .update(invitations)
      .set({ withdrawnAt: now })
      .where(
        and(
          eq(invitations.id, invitation),
          eq(invitations.workshopId, workshop.id),
          isNull(invitations.acceptedAt),
          isNull(invitations.withdrawnAt),
        ),
      )
      .returning({ id: invitations.id });
    if (!withdrawn) throw new NotFound('This invitation');
    return { id: withdrawn.id };
  },
);
