import { type CameraFields } from '../footage.ts';

export const NAME_TAKEN = {
  cameras_name_unique: { name: 'There is a camera of this name. Choose another name.' },
};

/** The columns that a form fills. */
export function cameraColumns({ name, creationMeans, localAsUtc, timeZone }: CameraFields) {
  return { name, creationMeans, localAsUtc, timeZone };
}
