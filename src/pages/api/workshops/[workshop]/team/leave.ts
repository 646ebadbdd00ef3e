import { leaveTeam } from '../../../../../features/workshops/server/leave-team.ts';
import { MadeId, workshopParam } from '../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: leaveTeam,
  params: workshopParam,
  body: NONE,
  answer: MadeId,
  form: { page: ({ workshop }) => paths.team(workshop), done: () => paths.signIn() },
});
