import { eq } from 'drizzle-orm';
import { anchors } from '../../../db/schema/notes.ts';
import { read } from '../../../server/verb.ts';
import { type ClipRef, loadClip } from '../../footage/server/load-clip.ts';
import { loadFootageNotes } from './load-footage-notes.ts';

/** The notes that stand on a clip, in its order. @throws NotFound */
export const listClipNotes = read({ may: 'workshop.see-bench' }, async (context, ref: ClipRef) => {
  const clip = await loadClip(context, ref);
  const items = await loadFootageNotes(context, clip.buildId, eq(anchors.clipId, clip.id));
  return { items: items.toSorted((a, b) => (a.seconds ?? 0) - (b.seconds ?? 0)), nextCursor: null };
});
