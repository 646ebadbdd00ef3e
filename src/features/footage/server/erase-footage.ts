import { and, eq, lt, notExists, or } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { editClips } from '../../../db/schema/episodes.ts';
import { cameras, clips, slates, workStretches } from '../../../db/schema/footage.ts';
import { anchors } from '../../../db/schema/notes.ts';

const following = alias(clips, 'following');

/** Erases cameras, clips, slates and hours that were deleted before an instant; what something stands on stays. */
export async function eraseFootage(db: Database, before: Date): Promise<void> {
  await db.delete(slates).where(lt(slates.deletedAt, before));
  await db.delete(workStretches).where(lt(workStretches.deletedAt, before));
  await db.delete(clips).where(
    and(
      lt(clips.deletedAt, before),
      notExists(
        db
          .select({ id: anchors.id })
          .from(anchors)
          .where(or(eq(anchors.clipId, clips.id), eq(anchors.endClipId, clips.id))),
      ),
      notExists(db.select({ id: editClips.editId }).from(editClips).where(eq(editClips.clipId, clips.id))),
      notExists(db.select({ id: following.id }).from(following).where(eq(following.continuesId, clips.id))),
    ),
  );
  await db
    .delete(cameras)
    .where(
      and(
        lt(cameras.deletedAt, before),
        notExists(db.select({ id: clips.id }).from(clips).where(eq(clips.cameraId, cameras.id))),
      ),
    );
}
