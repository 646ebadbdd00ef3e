import {
  stretchParams,
  StretchRow,
  VersionInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { restoreStretch } from '../../../../../../../../../features/footage/server/restore-stretch.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreStretch,
  params: stretchParams,
  body: VersionInput,
  answer: StretchRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: (_, { workshop, build }) => paths.footage(workshop, build),
  },
});
