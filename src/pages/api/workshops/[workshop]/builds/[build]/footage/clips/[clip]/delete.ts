import { clipParams, ClipRow, VersionInput } from '../../../../../../../../../features/footage/footage.ts';
import { deleteClip } from '../../../../../../../../../features/footage/server/delete-clip.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteClip,
  params: clipParams,
  body: VersionInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id, version }, { workshop, build }) =>
      paths.footage(workshop, build, { deleted: id, version: String(version) }),
  },
});
