import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { StartStretchInput, StretchRow } from '../../../../../../../../features/footage/footage.ts';
import { startStretch } from '../../../../../../../../features/footage/server/start-stretch.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: startStretch,
  params: buildParams,
  body: StartStretchInput,
  answer: StretchRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: (_, { workshop, build }) => paths.footage(workshop, build),
  },
});
