import { clipParams, ClipRow, VersionInput } from '../../../../../../../../../features/footage/footage.ts';
import { partClip } from '../../../../../../../../../features/footage/server/part-clip.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: partClip,
  params: clipParams,
  body: VersionInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
