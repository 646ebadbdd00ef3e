import { z } from 'zod';
import { NOTE_KINDS } from '../../domain/note-kinds.ts';
import { runningText } from '../../domain/plain-text.ts';
import { clipParams } from '../footage/footage.ts';
import { NOTE_TEXT_LENGTH, version } from './note.ts';

const id = z.uuid('That is not an id of ours.');
export const clipNoteParams = clipParams.extend({ note: id });

const text = runningText(NOTE_TEXT_LENGTH).pipe(z.string().min(1, 'Write what the note says.'));
const kind = z.enum(NOTE_KINDS, 'Choose what kind of note it is.').default('step');

/** The id is made by whoever adds the note, so that one sent twice is kept once. */
export const AddClipNoteInput = z.object({
  id,
  kind,
  text,
  /** Since the clip's first frame, at its rate; in milliseconds where its frames come unevenly. */
  frame: z.int('Choose a moment of the clip.').min(0).max(864_000_000),
});
export type AddClipNote = z.output<typeof AddClipNoteInput>;
export const ChangeClipNoteInput = z.object({ kind, text, version });
export const ClipNoteVersion = z.object({ version });
export const ClipNoteRow = z.object({ id, version: z.number() });
