import { and, asc, eq, isNull } from 'drizzle-orm';
import { invitations } from '../../../db/schema/workshops.ts';
import { may } from '../../../domain/permissions.ts';
import { read } from '../../../server/verb.ts';
import { type Waiting } from '../../../domain/waiting.ts';
import { paths } from '../../../paths.ts';

/** What of the team waits for whoever asks: invitations that nobody has taken up. */
export const listWaitingInvitations = read(
  { may: 'workshop.see-bench' },
  async ({ db, workshop, role, now }): Promise<readonly Waiting[]> => {
    if (!may(role, 'team.change')) return [];
    const rows = await db
      .select({ email: invitations.email, role: invitations.role, expiresAt: invitations.expiresAt })
      .from(invitations)
      .where(
        and(
          eq(invitations.workshopId, workshop.id),
          isNull(invitations.acceptedAt),
          isNull(invitations.withdrawnAt),
        ),
      )
      .orderBy(asc(invitations.expiresAt));
    return rows.map(({ email, role: invited, expiresAt }) => {
      const over = expiresAt <= now;
      return {
        urgency: over ? 'soon' : 'whenever',
        what: over
          ? `The invitation of ${email} has run out. Send another, or withdraw it.`
          : `${email} has not taken up the invitation as ${invited} yet.`,
        href: paths.team(workshop.slug),
        due: expiresAt,
      };
    });
  },
);
