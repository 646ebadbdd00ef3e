import { slateParams, IdRow } from '../../../../../../../../../../../features/footage/footage.ts';
import { removeSlate } from '../../../../../../../../../../../features/footage/server/remove-slate.ts';
import { paths } from '../../../../../../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: removeSlate,
  params: slateParams,
  body: NONE,
  answer: IdRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: (_, { workshop, build, clip }) => paths.clip(workshop, build, clip),
  },
});
