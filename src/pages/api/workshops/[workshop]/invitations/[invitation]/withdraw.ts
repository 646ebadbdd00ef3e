import { withdrawInvitation } from '../../../../../../features/workshops/server/withdraw-invitation.ts';
import { idParam, MadeId, workshopParam } from '../../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: withdrawInvitation,
  params: workshopParam.extend({ invitation: idParam }),
  body: NONE,
  answer: MadeId,
  form: {
    page: ({ workshop }) => paths.team(workshop),
    done: (_result, { workshop }) => paths.team(workshop),
  },
});
