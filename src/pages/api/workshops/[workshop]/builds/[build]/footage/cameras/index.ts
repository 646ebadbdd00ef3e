import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { AddCameraInput, CameraRow } from '../../../../../../../../features/footage/footage.ts';
import { addCamera } from '../../../../../../../../features/footage/server/add-camera.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addCamera,
  params: buildParams,
  body: AddCameraInput,
  answer: CameraRow,
  form: {
    page: ({ workshop, build }) => `${paths.cameras(workshop, build)}?add=1`,
    done: ({ id }, { workshop, build }) => `${paths.cameras(workshop, build)}#camera-${id}`,
  },
});
