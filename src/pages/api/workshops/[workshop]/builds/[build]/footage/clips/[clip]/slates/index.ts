import { AddSlateInput, clipParams, IdRow } from '../../../../../../../../../../features/footage/footage.ts';
import { addSlate } from '../../../../../../../../../../features/footage/server/add-slate.ts';
import { paths } from '../../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addSlate,
  params: clipParams,
  body: AddSlateInput,
  answer: IdRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: (_, { workshop, build, clip }) => paths.clip(workshop, build, clip),
  },
});
