import { and, eq, isNull } from 'drizzle-orm';
import { invitations, memberships } from '../../../db/schema/workshops.ts';
import { Forbidden, NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadOpenInvitation } from './load-open-invitation.ts';

/**
 * Takes an invitation up, once, for the account whose confirmed address was invited. Someone on the team already
 * keeps the role they have.
 */
export const acceptInvitation = verb(
  { may: 'invitation.accept' },
  async (context, { invitation: id, token }: { invitation: string; token: string }) => {
    const { db, actor, now } = context;
    const invitation = await loadOpenInvitation(context, id, token);
    if (actor.email !== invitation.email) {
      throw new Forbidden(
        `This invitation is for ${invitation.email}, and you are signed in as ${actor.email}. Sign in with that address to take it up.`,
      );
    }
    const [taken] = await db
      .update(invitations)
      .set({ acceptedAt: now })
      .where(and(eq(invitations.id, id), isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt)))
      .returning({ id: invitations.id });
    if (!taken) throw new NotFound('This invitation');
    await db
      .insert(memberships)
      .values({ workshopId: invitation.workshopId, accountId: actor.id, role: invitation.role })
      .onConflictDoNothing();
    return { slug: invitation.slug };
  },
);
