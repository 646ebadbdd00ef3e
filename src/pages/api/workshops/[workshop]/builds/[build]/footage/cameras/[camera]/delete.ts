import {
  cameraParams,
  CameraRow,
  VersionInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { deleteCamera } from '../../../../../../../../../features/footage/server/delete-camera.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteCamera,
  params: cameraParams,
  body: VersionInput,
  answer: CameraRow,
  form: {
    page: ({ workshop, build }) => paths.cameras(workshop, build),
    done: ({ id, version }, { workshop, build }) =>
      `${paths.cameras(workshop, build)}?deleted=${id}&version=${String(version)}`,
  },
});
