import { removeMember } from '../../../../../../features/workshops/server/remove-member.ts';
import { idParam, MadeId, workshopParam } from '../../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: removeMember,
  params: workshopParam.extend({ member: idParam }),
  body: NONE,
  answer: MadeId,
  form: {
    page: ({ workshop }) => paths.team(workshop),
    done: (_result, { workshop }) => paths.team(workshop),
  },
});
