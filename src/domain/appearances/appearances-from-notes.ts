import { effectiveEnd, type NotePlace } from '../notes/note-place.ts';
import { type Rate } from '../time/rate.ts';
import { type Appearance } from './appearance.ts';

/** A note with the parts it names, in its own order. */
export interface NoteWithParts extends NotePlace {
  readonly partIds: readonly string[];
}

/** What follows for the bench from notes, and what was set by hand. */
export interface AppearanceSources {
  readonly notes: readonly NoteWithParts[];
  /** Set by hand, at the same rate. */
  readonly byHand?: readonly Appearance[];
  readonly rate: Rate;
  /** Where the video ends, when that is known: nothing appears after it. */
  readonly lengthFrames?: number | null;
}

/**
 * When each part is in view: through a note that names it, or from there until the next note and at most 20 s,
 * and where it was set by hand. In the order of the episode; empty stretches are left out.
 */
export function appearancesFromNotes({
  notes,
  byHand = [],
  rate,
  lengthFrames = null,
}: AppearanceSources): Appearance[] {
  const end = lengthFrames ?? Number.POSITIVE_INFINITY;
  const named = notes.flatMap((note) => {
    const to = effectiveEnd(note, notes, rate, lengthFrames);
    return note.partIds.map((partId) => ({ partId, from: note.frame, to }));
  });
  return [...named, ...byHand.map((appearance) => ({ ...appearance, to: Math.min(appearance.to, end) }))]
    .filter(({ from, to }) => from < to)
    .sort((a, b) => a.from - b.from);
}
