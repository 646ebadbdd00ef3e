import { eq } from 'drizzle-orm';
import { cameras } from '../../../db/schema/footage.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type CameraFields } from '../footage.ts';
import { announceCamera } from './announce-footage.ts';
import { cameraColumns, NAME_TAKEN } from './camera-columns.ts';
import { loadCameraAt } from './load-camera.ts';

type Change = CameraFields & { readonly build: string; readonly camera: string; readonly version: number };

/** Changes a camera; every clip of it is timed anew. @throws Conflict; Invalid at `name` */
export const changeCamera = verb({ may: 'footage.change' }, async (context, input: Change) => {
  const { db, now } = context;
  await loadBuild(context, input.build);
  const stored = await loadCameraAt(context, input.camera, input);
  const version = stored.version + 1;
  await onUniqueViolation(NAME_TAKEN, () =>
    db
      .update(cameras)
      .set({ ...cameraColumns(input), version, updatedAt: now })
      .where(eq(cameras.id, stored.id)),
  );
  await announceCamera(context, stored.id);
  return { id: stored.id, version };
});
