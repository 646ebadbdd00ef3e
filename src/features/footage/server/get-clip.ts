import { and, asc, eq, isNull } from 'drizzle-orm';
import { slates } from '../../../db/schema/footage.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { proposeJoin } from '../../../domain/footage/propose-join.ts';
import { type ClipRef, loadClip } from './load-clip.ts';
import { loadSaid } from './load-said.ts';
import { presentClips } from './present-clips.ts';

/** A clip with its slates, its neighbours, and the one that its camera may have split it from. @throws NotFound */
export const getClip = read({ may: 'workshop.see-bench' }, async (context, ref: ClipRef) => {
  const row = await loadClip(context, ref);
  const all = await presentClips(context, row.buildId);
  const at = all.findIndex(({ id }) => id === row.id);
  const clip = all[at];
  if (clip === undefined) throw new NotFound('This clip');
  const read = await context.db
    .select({ id: slates.id, frame: slates.frame, shopAt: slates.shopAt, readBy: slates.readBy })
    .from(slates)
    .where(and(eq(slates.clipId, row.id), isNull(slates.deletedAt)))
    .orderBy(asc(slates.frame));
  const before = all.find(({ id }) => id === clip.continuesId) ?? null;
  return {
    ...clip,
    ...(await loadSaid(context.db, row.fileId)),
    frames: row.frames,
    frameTimes: row.frameTimes,
    startSet: row.startSetAt !== null,
    createdWall: row.createdWall,
    createdOffset: row.createdOffset,
    slates: read,
    before,
    proposedBefore: before === null ? proposeJoin(clip, all) : null,
    previous: all[at - 1] ?? null,
    next: all[at + 1] ?? null,
  };
});
