import {
  cameraParams,
  CameraRow,
  ChangeCameraInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { changeCamera } from '../../../../../../../../../features/footage/server/change-camera.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeCamera,
  params: cameraParams,
  body: ChangeCameraInput,
  answer: CameraRow,
  form: {
    page: ({ workshop, build, camera }) => `${paths.cameras(workshop, build)}?edit=${camera}`,
    done: ({ id }, { workshop, build }) => `${paths.cameras(workshop, build)}#camera-${id}`,
  },
});
