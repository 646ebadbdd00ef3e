import { and, count, eq, isNull } from 'drizzle-orm';
import { cameras, clips } from '../../../db/schema/footage.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadCameraAt } from './load-camera.ts';

type Target = { readonly build: string; readonly camera: string; readonly version: number };

/** Deletes a camera that no clip is of; for 30 days it can be brought back. @throws Invalid, Conflict */
export const deleteCamera = verb({ may: 'footage.change' }, async (context, input: Target) => {
  const { db, now } = context;
  await loadBuild(context, input.build);
  const stored = await loadCameraAt(context, input.camera, input);
  const [used] = await db
    .select({ times: count() })
    .from(clips)
    .where(and(eq(clips.cameraId, stored.id), isNull(clips.deletedAt)));
  if (used && used.times > 0) {
    const said = used.times === 1 ? 'One clip is' : `${String(used.times)} clips are`;
    throw new Invalid({ '': `${said} of this camera, so it stays. Give them another camera first.` });
  }
  const version = stored.version + 1;
  await db.update(cameras).set({ deletedAt: now, version, updatedAt: now }).where(eq(cameras.id, stored.id));
  return { id: stored.id, version };
});
