import { eq } from 'drizzle-orm';
import { clipThumbnails } from '../../../db/schema/footage.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { type ClipRef, loadClip } from './load-clip.ts';

/** The small picture of a clip that stays at home. @throws NotFound */
export const getThumbnail = read({ may: 'workshop.see-bench' }, async (context, ref: ClipRef) => {
  const clip = await loadClip(context, ref);
  const [found] = await context.db
    .select({ jpeg: clipThumbnails.jpeg })
    .from(clipThumbnails)
    .where(eq(clipThumbnails.clipId, clip.id));
  if (!found) throw new NotFound('This picture');
  return found;
});
