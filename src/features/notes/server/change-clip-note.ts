import { eq } from 'drizzle-orm';
import { type z } from 'zod';
import { notes } from '../../../db/schema/notes.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef } from '../../footage/server/load-clip.ts';
import { type ChangeClipNoteInput } from '../clip-note.ts';
import {
  announceClipNotes,
  loadClipOfNotes,
  lockClipNote,
  requireMayChangeOnClip,
} from './load-clip-note.ts';

type Change = z.output<typeof ChangeClipNoteInput> & ClipRef & { readonly note: string };

/** Changes what a note on a clip says; what it said before is kept. @throws NotFound, Conflict, Forbidden */
export const changeClipNote = verb({ may: 'draft-note.change' }, async (context, input: Change) => {
  const clip = await loadClipOfNotes(context, input);
  const stored = await lockClipNote(context, clip, input);
  if (!stored.proposed) requireMayChangeOnClip(context, clip, [stored.kind, input.kind]);
  const version = stored.version + 1;
  await context.db
    .update(notes)
    .set({ kind: input.kind, text: input.text, version, updatedAt: context.now })
    .where(eq(notes.id, stored.id));
  await announceClipNotes(context, clip);
  return { id: stored.id, version };
});
