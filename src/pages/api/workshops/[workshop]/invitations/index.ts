import { inviteMember } from '../../../../../features/workshops/server/invite-member.ts';
import { InviteInput, MadeId, workshopParam } from '../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../paths.ts';
import { apiRoute } from '../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: inviteMember,
  params: workshopParam,
  body: InviteInput,
  answer: MadeId,
  limit: [{ name: 'invite', by: 'account', tries: 30, seconds: 86_400 }],
  form: {
    page: ({ workshop }) => paths.team(workshop),
    done: (_result, { workshop }) => paths.team(workshop),
  },
});
