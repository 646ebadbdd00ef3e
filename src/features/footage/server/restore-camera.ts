import { eq } from 'drizzle-orm';
import { cameras } from '../../../db/schema/footage.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadCameraAt } from './load-camera.ts';

type Target = { readonly build: string; readonly camera: string; readonly version: number };

/** Brings a deleted camera back. @throws Invalid when another has its name by now; Conflict */
export const restoreCamera = verb({ may: 'footage.change' }, async (context, input: Target) => {
  const { db, now } = context;
  await loadBuild(context, input.build);
  const stored = await loadCameraAt(context, input.camera, { version: input.version, deleted: true });
  const version = stored.version + 1;
  const taken = { cameras_name_unique: { '': 'Another camera has its name by now. Rename that one first.' } };
  await onUniqueViolation(taken, () =>
    db.update(cameras).set({ deletedAt: null, version, updatedAt: now }).where(eq(cameras.id, stored.id)),
  );
  return { id: stored.id, version };
});
