import { and, eq, isNull } from 'drizzle-orm';
import { slates } from '../../../db/schema/footage.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceTimes } from './announce-footage.ts';
import { type ClipRef, loadClip } from './load-clip.ts';

/** Takes a slate away; every clip of its camera is timed anew. @throws NotFound */
export const removeSlate = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly slate: string }) => {
    const { db, now } = context;
    const clip = await loadClip(context, input);
    const [gone] = await db
      .update(slates)
      .set({ deletedAt: now, updatedAt: now })
      .where(and(eq(slates.id, input.slate), eq(slates.clipId, clip.id), isNull(slates.deletedAt)))
      .returning({ id: slates.id });
    if (!gone) throw new NotFound('This slate');
    await announceTimes(context, clip);
    return gone;
  },
);
