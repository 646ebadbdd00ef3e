import { changeRole } from '../../../../../../features/workshops/server/change-role.ts';
import {
  ChangeRoleInput,
  idParam,
  MadeId,
  workshopParam,
} from '../../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeRole,
  params: workshopParam.extend({ member: idParam }),
  body: ChangeRoleInput,
  answer: MadeId,
  form: {
    page: ({ workshop }) => paths.team(workshop),
    done: (_result, { workshop }) => paths.team(workshop),
  },
});
