import {
  cameraParams,
  CameraRow,
  VersionInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { restoreCamera } from '../../../../../../../../../features/footage/server/restore-camera.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreCamera,
  params: cameraParams,
  body: VersionInput,
  answer: CameraRow,
  form: {
    page: ({ workshop, build }) => paths.cameras(workshop, build),
    done: ({ id }, { workshop, build }) => `${paths.cameras(workshop, build)}#camera-${id}`,
  },
});
