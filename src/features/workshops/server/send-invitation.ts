import { and, eq, gt, isNull } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { invitations, workshops } from '../../../db/schema/workshops.ts';
import { paths } from '../../../paths.ts';
import { signToken } from '../../../server/auth/signed-token.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { invitationMail } from '../emails.ts';
import { INVITATION_DAYS, INVITATION_PURPOSE } from '../workshop.ts';

/** Mails an invitation that still waits. Its link is the same however often it is mailed. */
export const sendInvitation: JobHandler = async ({ db, mailer, settings }, ids) => {
  const id = ids['invitationId'] ?? '';
  const [invitation] = await db
    .select({
      email: invitations.email,
      role: invitations.role,
      workshop: workshops.name,
      inviter: accounts.name,
    })
    .from(invitations)
    .innerJoin(workshops, eq(workshops.id, invitations.workshopId))
    .innerJoin(accounts, eq(accounts.id, invitations.invitedBy))
    .where(
      and(
        eq(invitations.id, id),
        isNull(invitations.acceptedAt),
        isNull(invitations.withdrawnAt),
        gt(invitations.expiresAt, new Date()),
      ),
    );
  if (!invitation) return;
  const token = signToken(settings.AUTH_SECRET, INVITATION_PURPOSE, id);
  await mailer.send({
    to: invitation.email,
    mail: invitationMail({
      ...invitation,
      days: INVITATION_DAYS,
      link: settings.PUBLIC_URL + paths.invitation(id, token),
    }),
    messageId: `<invitation.${id}@${new URL(settings.PUBLIC_URL).hostname}>`,
  });
};
