import { type Rate } from '../time/rate.ts';

/** Where a note stands in an episode, in frames of one rate; without an end it is an instant. */
export interface NotePlace {
  readonly frame: number;
  readonly endFrame: number | null;
}

/** The longest that a note without an end of its own holds, in seconds. Our own choice. */
export const NOTE_HOLDS_SECONDS = 20;

/** Notes in the order of the episode; at one frame those without an end, and otherwise as they came. */
export function sortNotes<Note extends NotePlace>(notes: readonly Note[]): Note[] {
  const length = (note: Note) => (note.endFrame === null ? 0 : note.endFrame - note.frame);
  return [...notes].sort((a, b) => a.frame - b.frame || length(a) - length(b));
}

/**
 * The frame at which a note stops holding: its own end, or else the next note that begins later, at most 20 s on.
 * @param others all notes of the episode, at the same rate, in any order
 * @param lengthFrames where the video ends, when that is known
 */
export function effectiveEnd(
  note: NotePlace,
  others: readonly NotePlace[],
  rate: Rate,
  lengthFrames: number | null = null,
): number {
  const holds = Math.floor((NOTE_HOLDS_SECONDS * rate.num) / rate.den);
  const later = others.map((other) => other.frame).filter((frame) => frame > note.frame);
  const end = note.endFrame ?? Math.min(note.frame + holds, ...later);
  return lengthFrames === null ? end : Math.min(end, lengthFrames);
}
