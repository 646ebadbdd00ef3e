import { clipParams, ClipRow, JoinClipInput } from '../../../../../../../../../features/footage/footage.ts';
import { joinClip } from '../../../../../../../../../features/footage/server/join-clip.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: joinClip,
  params: clipParams,
  body: JoinClipInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
