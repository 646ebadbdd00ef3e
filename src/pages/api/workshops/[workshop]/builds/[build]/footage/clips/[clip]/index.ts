import { ChangeClipInput, clipParams, ClipRow } from '../../../../../../../../../features/footage/footage.ts';
import { changeClip } from '../../../../../../../../../features/footage/server/change-clip.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeClip,
  params: clipParams,
  body: ChangeClipInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
