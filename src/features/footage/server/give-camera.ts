import { newId } from '../../../db/columns.ts';
import { cameras } from '../../../db/schema/footage.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { findCamera } from './find-camera.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { loadSaid } from './load-said.ts';
import { setClip } from './set-clip.ts';

/**
 * Gives a clip the camera that its file names; one that the workshop does not have yet is made.
 * @throws Conflict; Invalid when the file names none
 */
export const giveCamera = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly version: number }) => {
    const { db, workshop } = context;
    const stored = await loadClipAt(context, input);
    const { filmedWith: name } = await loadSaid(db, stored.fileId);
    if (name === null)
      throw new Invalid({ camera: 'The file names no camera. Choose one from the list, or add it first.' });
    // When two people do this at once, the second takes what the first made.
    await db.insert(cameras).values({ id: newId(), workshopId: workshop.id, name }).onConflictDoNothing();
    const camera = await findCamera(db, workshop.id, name);
    return setClip(context, stored, { cameraId: camera?.id ?? null });
  },
);
