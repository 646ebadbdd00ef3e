import { read } from '../../../server/verb.ts';
import { loadOpenInvitation } from './load-open-invitation.ts';

/** An invitation as its link shows it. @throws NotFound when the link is not the one that was mailed, or is over */
export const getInvitation = read(
  { may: 'invitation.read' },
  async (context, { invitation, token }: { invitation: string; token: string }) => {
    const { email, role, workshopName, inviter } = await loadOpenInvitation(context, invitation, token);
    return { email, role, workshopName, inviter };
  },
);
