import { editParams, TakenEdit } from '../../../../../../../../../../features/episodes/edit.ts';
import { takeEditAgain } from '../../../../../../../../../../features/episodes/server/take-edit-again.ts';
import { paths } from '../../../../../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: takeEditAgain,
  params: editParams,
  body: NONE,
  answer: TakenEdit,
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: ({ number }, { workshop, build, episode }) => paths.edit(workshop, build, episode, number),
  },
});
