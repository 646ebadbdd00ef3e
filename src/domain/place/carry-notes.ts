import type Fraction from 'fraction.js';
import { type Edit, rateOf, type Segment } from '../edit/edit.ts';
import { type ClipMoment, type NotePlaces, placeNotes } from './place-notes.ts';

/**
 * What a new edit does to a note: its main place stays or moves; it is lost; it comes back; or it is in neither.
 */
export type NoteCarry = 'stays' | 'moves' | 'lost' | 'back' | 'absent';

export interface CarriedNote {
  readonly carry: NoteCarry;
  /** How far the main place moves, in seconds of the episode; null where it has none in one of the edits. */
  readonly by: Fraction | null;
  readonly before: NotePlaces;
  readonly after: NotePlaces;
  /** The segment that held a lost note; null for the others. */
  readonly dropped: Segment | null;
}

/** Places in seconds of their episodes, which may have different rates. */
function seconds(places: NotePlaces, edit: Edit): Fraction | null {
  return places.places[0]?.at.div(rateOf(edit.rate)) ?? null;
}

/**
 * What becomes of notes when a new edit takes the place of an old one.
 * @param moments where the notes were made
 * @returns for each, in the same order, where it was and will be
 */
export function carryNotes(before: Edit, after: Edit, moments: readonly ClipMoment[]): CarriedNote[] {
  const then = placeNotes(before, moments);
  const now = placeNotes(after, moments);
  return then.map((old, index) => {
    const next = now[index] ?? { status: 'lost' as const, places: [], byPicture: false };
    const [from, to] = [seconds(old, before), seconds(next, after)];
    const by = from === null || to === null ? null : to.sub(from);
    return {
      carry: sayCarry(from !== null, by, to !== null),
      by,
      before: old,
      after: next,
      dropped: from !== null && to === null ? (old.places[0]?.segment ?? null) : null,
    };
  });
}

function sayCarry(was: boolean, by: Fraction | null, is: boolean): NoteCarry {
  if (by !== null) return by.equals(0) ? 'stays' : 'moves';
  if (was) return 'lost';
  return is ? 'back' : 'absent';
}
