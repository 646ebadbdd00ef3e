import { clipParts } from '../../../db/schema/footage.ts';
import { eq } from 'drizzle-orm';
import { verb } from '../../../server/verb.ts';
import { type ChangeClip } from '../footage.ts';
import { requireCamera, requireParts, requireStage } from './find-choices.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { setClip } from './set-clip.ts';

/** Changes a clip's camera, stage, parts and pace. @throws Conflict; Invalid for what is not of the build */
export const changeClip = verb({ may: 'footage.change' }, async (context, input: ChangeClip & ClipRef) => {
  const { db, workshop } = context;
  const stored = await loadClipAt(context, input);
  await requireCamera(context, input.camera);
  await requireStage(context, stored.buildId, input.stage);
  await requireParts(context, stored.buildId, input.parts);
  await db.delete(clipParts).where(eq(clipParts.clipId, stored.id));
  const unique = [...new Set(input.parts)];
  if (unique.length > 0)
    await db
      .insert(clipParts)
      .values(unique.map((partId) => ({ workshopId: workshop.id, clipId: stored.id, partId })));
  return setClip(context, stored, {
    cameraId: input.camera,
    stageId: input.stage,
    paceNum: input.pace.num,
    paceDen: input.pace.den,
  });
});
