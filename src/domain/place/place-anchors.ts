import Fraction from 'fraction.js';
import { type Edit, lengthOf } from '../edit/edit.ts';
import { type ClipPlaces, type FilmedClip, type OnClip, placeOnClips } from '../footage/place-on-clips.ts';
import { type ClipMoment, type NotePlaces, type Place, placeNotes, type Sense } from './place-notes.ts';

/** Where something was noted: in the shop, on a clip, or in the episode. */
export type Anchor =
  /** Milliseconds since 1970, by the shop's clock. */
  | { readonly clock: 'shop'; readonly at: Fraction; readonly sense: Sense }
  /** Seconds since the clip's first frame. */
  | { readonly clock: 'clip'; readonly clip: string; readonly at: Fraction; readonly sense: Sense }
  /** Frames of the episode, where no clip lies beneath. */
  | { readonly clock: 'episode'; readonly at: Fraction };

/** A clip of the footage, with what an edit knows it by. */
export interface EditedClip extends FilmedClip {
  /** What the edit calls it. */
  readonly name: string;
  /** What its first label stands for, in seconds from 00:00:00:00. */
  readonly label: Fraction;
}

export interface AnchorPlaces {
  /** fixed: an episode time stays where it is; no footage: no clip ran then. */
  readonly status: NotePlaces['status'] | 'fixed' | 'no footage';
  /** The main place first. An episode time has none: it is one. */
  readonly places: readonly Place[];
  /** The clips it lies on; or those nearby that may be offered, when there is no footage. */
  readonly clips: readonly OnClip[];
  /** Whether it was moved to the edge of a clip, because none ran. */
  readonly toEdge: boolean;
  readonly byPicture: boolean;
}

const NOWHERE: AnchorPlaces = {
  status: 'no footage',
  places: [],
  clips: [],
  toEdge: false,
  byPicture: false,
};

const NO_TIME = new Fraction(0);
const NO_CLIPS: ClipPlaces = { status: 'none', clips: [] };

const RANK = { placed: 0, snapped: 1, lost: 2 } as const;

function lengthOfMain({ places }: NotePlaces): number {
  const [main] = places;
  return main === undefined ? 0 : lengthOf(main.segment.record).valueOf();
}

/** The places on several clips that ran at once: the longest use among the best is the main one. */
function bestOf(found: readonly NotePlaces[]): Pick<AnchorPlaces, 'status' | 'places' | 'byPicture'> {
  const rank = Math.min(...found.map(({ status }) => RANK[status]));
  const best = found
    .filter(({ status }) => RANK[status] === rank)
    .sort((a, b) => lengthOfMain(b) - lengthOfMain(a));
  const [main, ...others] = best.flatMap(({ places }) => places);
  const rest = others.sort((a, b) => a.at.compare(b.at));
  return {
    status: best[0]?.status ?? 'lost',
    places: main === undefined ? [] : [main, ...rest],
    byPicture: found.some(({ byPicture }) => byPicture),
  };
}

/**
 * Where anchors of every kind come in an episode: through the clip that ran, by its camera's clock, and the segments
 * that use it.
 * @param footage the clips that an anchor may lie on, with what the edit calls them
 * @returns for each anchor, in the same order, its places
 */
export function placeAnchors(
  edit: Edit,
  footage: readonly EditedClip[],
  anchors: readonly Anchor[],
): AnchorPlaces[] {
  const known = new Map(footage.map((clip) => [clip.id, clip]));
  const fromShop = placeOnClips(
    footage,
    anchors.flatMap((anchor) => (anchor.clock === 'shop' ? [anchor.at] : [])),
  ).values();
  const moments: ClipMoment[] = [];
  const momentOn = ({ id, at }: Pick<OnClip, 'id' | 'at'>, sense: Sense): number[] => {
    const clip = known.get(id);
    return clip === undefined ? [] : [moments.push({ clip: clip.name, at: at.add(clip.label), sense }) - 1];
  };
  const laid = anchors.map((anchor) => {
    if (anchor.clock === 'episode') return { ...NOWHERE, status: 'fixed' as const, own: [] };
    if (anchor.clock === 'clip') {
      const on = { id: anchor.clip, at: anchor.at, apart: NO_TIME };
      const own = momentOn(on, anchor.sense);
      return { ...NOWHERE, clips: own.length > 0 ? [on] : [], own };
    }
    const { status, clips } = fromShop.next().value ?? NO_CLIPS;
    const lies = status === 'running' || status === 'edge';
    const own = lies ? clips.flatMap((on) => momentOn(on, anchor.sense)) : [];
    return { ...NOWHERE, clips, toEdge: status === 'edge', own };
  });
  const placed = placeNotes(edit, moments);
  return laid.map(({ own, ...anchor }) => {
    const found = own.flatMap((index) => placed[index] ?? []);
    return found.length === 0 ? anchor : { ...anchor, ...bestOf(found) };
  });
}
