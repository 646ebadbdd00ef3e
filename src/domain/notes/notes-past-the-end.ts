import { type NotePlace } from './note-place.ts';

/** The notes that begin where the video has ended: its last frame is the one before lengthFrames. */
export function notesPastTheEnd<Note extends NotePlace>(
  notes: readonly Note[],
  lengthFrames: number,
): Note[] {
  return notes.filter((note) => note.frame >= lengthFrames);
}
