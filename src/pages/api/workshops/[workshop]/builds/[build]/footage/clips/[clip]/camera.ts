import { clipParams, ClipRow, VersionInput } from '../../../../../../../../../features/footage/footage.ts';
import { giveCamera } from '../../../../../../../../../features/footage/server/give-camera.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: giveCamera,
  params: clipParams,
  body: VersionInput,
  answer: ClipRow,
  form: {
    page: ({ workshop, build, clip }) => paths.clip(workshop, build, clip),
    done: ({ id }, { workshop, build }) => paths.clip(workshop, build, id),
  },
});
