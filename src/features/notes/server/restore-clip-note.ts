import { eq } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef } from '../../footage/server/load-clip.ts';
import {
  announceClipNotes,
  loadClipOfNotes,
  lockClipNote,
  requireMayChangeOnClip,
} from './load-clip-note.ts';

type Target = ClipRef & { readonly note: string; readonly version: number };

/** Brings a deleted note on a clip back. @throws NotFound, Conflict, Forbidden */
export const restoreClipNote = verb({ may: 'draft-note.change' }, async (context, input: Target) => {
  const clip = await loadClipOfNotes(context, input);
  const stored = await lockClipNote(context, clip, input, { deleted: true });
  if (!stored.proposed) requireMayChangeOnClip(context, clip, [stored.kind]);
  const version = stored.version + 1;
  await context.db
    .update(notes)
    .set({ deletedAt: null, version, updatedAt: context.now })
    .where(eq(notes.id, stored.id));
  await announceClipNotes(context, clip);
  return { id: stored.id, version };
});
