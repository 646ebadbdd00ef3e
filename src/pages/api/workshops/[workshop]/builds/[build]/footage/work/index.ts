import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { AddStretchInput, StretchRow } from '../../../../../../../../features/footage/footage.ts';
import { addStretch } from '../../../../../../../../features/footage/server/add-stretch.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addStretch,
  params: buildParams,
  body: AddStretchInput,
  answer: StretchRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: (_, { workshop, build, day }) => paths.footage(workshop, build, { day }),
  },
});
