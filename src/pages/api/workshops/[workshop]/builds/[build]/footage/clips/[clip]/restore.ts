import { clipParams, ClipRow, VersionInput } from '../../../../../../../../../features/footage/footage.ts';
import { restoreClip } from '../../../../../../../../../features/footage/server/restore-clip.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreClip,
  params: clipParams,
  body: VersionInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
