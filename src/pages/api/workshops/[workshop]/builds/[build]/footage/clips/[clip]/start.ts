import { clipParams, ClipRow, SetStartInput } from '../../../../../../../../../features/footage/footage.ts';
import { setClipStart } from '../../../../../../../../../features/footage/server/set-clip-start.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: setClipStart,
  params: clipParams,
  body: SetStartInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
