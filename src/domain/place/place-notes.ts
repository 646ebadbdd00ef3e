import Fraction from 'fraction.js';
import { type Edit, type Segment } from '../edit/edit.ts';
import { byImportance, type ClipUse, indexClipUses, recordOf } from './clip-uses.ts';

/** Whether a note is about what is seen or what is said. */
export type Sense = 'picture' | 'sound';

/** A moment of a clip. */
export interface ClipMoment {
  readonly clip: string;
  /** Seconds from the clip's label 00:00:00:00, exact. */
  readonly at: Fraction;
  readonly sense: Sense;
}

/** A place of a note in the episode. */
export interface Place {
  /** Frames of the episode, exact: not always whole. */
  readonly at: Fraction;
  readonly segment: Segment;
}

/** placed: the moment is in the edit; snapped: it is moved to the nearest that is; lost: it is not in this edit. */
export type PlaceStatus = 'placed' | 'snapped' | 'lost';

export interface NotePlaces {
  readonly status: PlaceStatus;
  /** The main place first, the longest use; then the others in the order of the episode. Empty when lost. */
  readonly places: readonly Place[];
  /** Whether the picture was taken for a note about sound, because the edit has no sound track. */
  readonly byPicture: boolean;
}

/** How far outside of a used stretch a moment is still moved to its edge, in seconds. Our own choice. */
export const SNAP_SECONDS = 3;

const SNAP = new Fraction(SNAP_SECONDS);

/** The uses that hold each of some moments of one clip; or the nearest ones, and how far they are. */
function* sweep(
  uses: readonly ClipUse[],
  moments: readonly Fraction[],
): Generator<{ readonly holding: readonly ClipUse[]; readonly nearest: readonly ClipUse[] }> {
  let next = 0;
  let holding: ClipUse[] = [];
  let ended: ClipUse[] = [];
  for (const at of moments) {
    for (let use = uses[next]; use !== undefined && use.in.compare(at) <= 0; use = uses[next]) {
      holding.push(use);
      next += 1;
    }
    const over = holding.filter((use) => use.out.compare(at) <= 0);
    if (over.length > 0) holding = holding.filter((use) => use.out.compare(at) > 0);
    for (const use of over) {
      const later = ended[0] === undefined ? 1 : use.out.compare(ended[0].out);
      if (later > 0) ended = [use];
      else if (later === 0) ended.push(use);
    }
    yield { holding, nearest: holding.length > 0 ? [] : nearestTo(at, ended, uses, next) };
  }
}

function nearestTo(
  at: Fraction,
  ended: readonly ClipUse[],
  uses: readonly ClipUse[],
  next: number,
): ClipUse[] {
  const first = uses[next];
  const back = ended[0] === undefined ? null : at.sub(ended[0].out);
  const ahead = first === undefined ? null : first.in.sub(at);
  const less = back === null || (ahead !== null && ahead.compare(back) < 0) ? ahead : back;
  if (less === null || less.compare(SNAP) > 0) return [];
  const nearest = back?.equals(less) === true ? [...ended] : [];
  for (let index = next; ahead?.equals(less) === true; index += 1) {
    const use = uses[index];
    if (use === undefined || first?.in.equals(use.in) !== true) break;
    nearest.push(use);
  }
  return nearest;
}

function placesAt(uses: readonly ClipUse[], at: Fraction, edit: Edit): Place[] {
  const [main, ...others] = [...uses].sort(byImportance);
  if (main === undefined) return [];
  const place = (use: ClipUse): Place => ({ at: recordOf(use, at, edit.rate), segment: use.segment });
  const first = place(main);
  const rest = others.map(place).sort((a, b) => a.at.compare(b.at));
  // Two sound tracks that hold the same sound are one place.
  const places = [first, ...rest];
  return places.filter((one, index) => places.findIndex((other) => other.at.equals(one.at)) === index);
}

/**
 * Where moments of clips come in an episode. Stretches are half-open. Grows as n log n with moments and segments.
 * @param moments in any order
 * @returns for each, in the same order, its places
 */
export function placeNotes(edit: Edit, moments: readonly ClipMoment[]): NotePlaces[] {
  const picture = indexClipUses(edit.picture, edit.dissolved);
  const sound = edit.sound.length === 0 ? null : indexClipUses(edit.sound);
  const silent = edit.picture.length === 0;
  const groups = new Map<readonly ClipUse[], number[]>();
  const places: NotePlaces[] = moments.map(({ clip, sense }, index) => {
    const uses = (sense === 'sound' || silent ? (sound ?? picture) : picture)(clip);
    const group = groups.get(uses);
    if (group === undefined) groups.set(uses, [index]);
    else group.push(index);
    return { status: 'lost', places: [], byPicture: sense === 'sound' && sound === null };
  });
  for (const [uses, members] of groups) {
    if (uses.length === 0) continue;
    const sorted = members
      .flatMap((index) => (moments[index] === undefined ? [] : { index, at: moments[index].at }))
      .sort((a, b) => a.at.compare(b.at));
    let turn = 0;
    for (const { holding, nearest } of sweep(
      uses,
      sorted.map(({ at }) => at),
    )) {
      const { index, at } = sorted[turn] as (typeof sorted)[number];
      turn += 1;
      const found = holding.length > 0 ? holding : nearest;
      if (found.length === 0) continue;
      places[index] = {
        status: holding.length > 0 ? 'placed' : 'snapped',
        places: placesAt(found, at, edit),
        byPicture: places[index]?.byPicture === true,
      };
    }
  }
  return places;
}
