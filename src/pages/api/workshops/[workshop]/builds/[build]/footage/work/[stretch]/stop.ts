import {
  stretchParams,
  StretchRow,
  VersionInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { stopStretch } from '../../../../../../../../../features/footage/server/stop-stretch.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: stopStretch,
  params: stretchParams,
  body: VersionInput,
  answer: StretchRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: (_, { workshop, build }) => paths.footage(workshop, build),
  },
});
