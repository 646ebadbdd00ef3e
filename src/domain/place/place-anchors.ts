import Fraction from 'fraction.js';
import { type Edit, lengthOf, rateOf, type Segment } from '../edit/edit.ts';
import { type ClipPlaces, type FilmedClip, type OnClip, placeOnClips } from '../footage/place-on-clips.ts';
import { type ClipMoment, type NotePlaces, type Place, placeNotes, type Sense } from './place-notes.ts';

/** Where something was noted: in the shop, on a clip, or in the episode; and up to where, for a stretch. */
export type Anchor =
  /** Milliseconds since 1970, by the shop's clock. */
  | {
      readonly clock: 'shop';
      readonly at: Fraction;
      readonly until?: Fraction | null;
      readonly sense: Sense;
    }
  /** Seconds since the clip's first frame. A stretch may end on another clip. */
  | {
      readonly clock: 'clip';
      readonly clip: string;
      readonly at: Fraction;
      /** `clip` is named where the stretch was marked over a cut; null where it runs on in the clip it began on. */
      readonly until?: { readonly clip: string | null; readonly at: Fraction } | null;
      readonly sense: Sense;
    }
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
  /** Where the stretch ends at its main place, in frames of the episode, half-open; null for a moment. */
  readonly end: Fraction | null;
  /** The clips it lies on; or those nearby that may be offered, when there is no footage. */
  readonly clips: readonly OnClip[];
  /** Whether it was moved to the edge of a clip, because none ran. */
  readonly toEdge: boolean;
  readonly byPicture: boolean;
}

const NOWHERE: AnchorPlaces = {
  status: 'no footage',
  places: [],
  end: null,
  clips: [],
  toEdge: false,
  byPicture: false,
};

const NO_TIME = new Fraction(0);
const NO_CLIPS: ClipPlaces = { status: 'none', clips: [] };
/** A stretch is half-open: its end is looked for by an instant just inside, in seconds. */
const JUST_INSIDE = new Fraction(1, 1_000_000);

const RANK = { placed: 0, snapped: 1, lost: 2 } as const;

/** Where a stretch ends: by the index of the instant just inside, and the end itself in seconds from 00:00:00:00. */
interface Until {
  readonly index: number;
  readonly at: Fraction;
  /** The longest it may be in the episode, in seconds: how long it is on the clip. Null for one marked over a cut. */
  readonly atMost: Fraction | null;
}

/** A moment of a clip that an anchor lies on: its place among the moments. */
interface Own {
  readonly index: number;
  readonly until: Until | null;
}

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

/** Where a moment of a clip comes in a segment that runs forward, or the segment's end when it lies behind that. */
function recordAt({ record, source, clipRate, speed }: Segment, at: Fraction, edit: Edit): Fraction {
  if (speed.compare(0) <= 0) return record.out;
  const since = at.sub(source.in.div(rateOf(clipRate)));
  const end = record.in.add(since.div(speed).mul(rateOf(edit.rate)));
  return end.compare(record.out) < 0 ? end : record.out;
}

/**
 * Where a stretch ends that begins at a place: in the same segment; else at the nearest place after it that its end
 * has; else where the segment ends.
 */
function endOf(main: Place, until: Until, ends: NotePlaces | undefined, edit: Edit): Fraction {
  const { segment, at } = main;
  const own = ends?.places.find((place) => place.segment === segment);
  if (ends?.status !== 'placed') return segment.record.out;
  if (own !== undefined) return recordAt(segment, until.at, edit);
  const later = ends.places
    .map((place) => recordAt(place.segment, until.at, edit))
    .filter((end) => end.compare(at) > 0)
    .sort((a, b) => a.compare(b));
  const nearest = later.find(
    (end) => until.atMost === null || end.sub(at).div(rateOf(edit.rate)).compare(until.atMost) <= 0,
  );
  return nearest ?? segment.record.out;
}

/**
 * Where anchors of every kind come in an episode: through the clip that ran, by its camera's clock, and the segments
 * that use it. Grows as n log n.
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
  const momentOn = (id: string, at: Fraction, sense: Sense): Until[] => {
    const clip = known.get(id);
    if (clip === undefined) return [];
    const labelled = at.add(clip.label);
    return [
      { index: moments.push({ clip: clip.name, at: labelled, sense }) - 1, at: labelled, atMost: null },
    ];
  };
  const untilOn = (id: string, at: Fraction, sense: Sense, atMost: Fraction | null): Until | null => {
    const [inside] = momentOn(id, at.sub(JUST_INSIDE), sense);
    return inside === undefined ? null : { ...inside, at: inside.at.add(JUST_INSIDE), atMost };
  };
  const laid = anchors.map((anchor): AnchorPlaces & { readonly own: readonly Own[] } => {
    if (anchor.clock === 'episode') return { ...NOWHERE, status: 'fixed', own: [] };
    const { sense } = anchor;
    if (anchor.clock === 'clip') {
      const { clip, at, until = null } = anchor;
      const own = momentOn(clip, at, sense).map(({ index }): Own => {
        if (until === null) return { index, until: null };
        const atMost = until.clip === null ? until.at.sub(at) : null;
        return { index, until: untilOn(until.clip ?? clip, until.at, sense, atMost) };
      });
      return { ...NOWHERE, clips: own.length > 0 ? [{ id: clip, at, apart: NO_TIME }] : [], own };
    }
    const { status, clips } = fromShop.next().value ?? NO_CLIPS;
    const ran = anchor.until == null ? null : anchor.until.sub(anchor.at).div(1000);
    const lies = status === 'running' || status === 'edge';
    const own = (lies ? clips : []).flatMap(({ id, at }) =>
      momentOn(id, at, sense).map(({ index }): Own => {
        const shown = ran === null ? null : ran.div(known.get(id)?.pace ?? 1);
        return { index, until: shown === null ? null : untilOn(id, at.add(shown), sense, shown) };
      }),
    );
    return { ...NOWHERE, clips, toEdge: status === 'edge', own };
  });
  const placed = placeNotes(edit, moments);
  return laid.map(({ own, ...anchor }) => {
    if (own.length === 0) return anchor;
    const best = bestOf(own.flatMap(({ index }) => placed[index] ?? []));
    const [main] = best.places;
    const until = own.find(({ index }) => main !== undefined && placed[index]?.places.includes(main))?.until;
    const end = main && until ? endOf(main, until, placed[until.index], edit) : null;
    return { ...anchor, ...best, end };
  });
}
