import Fraction from 'fraction.js';
import { type Database } from '../../../db/client.ts';
import { type anchors } from '../../../db/schema/notes.ts';
import { type Edit, rateOf } from '../../../domain/edit/edit.ts';
import { clipTimeOfFrame } from '../../../domain/footage/film-clips.ts';
import { type CountedClip } from '../../../domain/place/keep-on-clip.ts';
import { nameByFootage } from '../../../domain/place/name-by-footage.ts';
import { type Anchor, type EditedClip } from '../../../domain/place/place-anchors.ts';
import { type Position } from '../../../domain/positions.ts';
import { MILLISECOND_RATE, type Rate, sameRate } from '../../../domain/time/rate.ts';
import { type LoadedClip, loadFilmedClips } from '../../footage/server/load-filmed-clips.ts';

export type AnchorRow = typeof anchors.$inferSelect;

/** The footage of a build as placing needs it, each clip called by its id. */
export interface Footage {
  readonly clips: readonly EditedClip[];
  readonly counted: ReadonlyMap<string, CountedClip>;
  readonly loaded: ReadonlyMap<string, LoadedClip>;
}

export async function loadFootage(db: Database, buildId: string): Promise<Footage> {
  const loaded = await loadFilmedClips(db, buildId);
  return {
    clips: loaded.map((clip) => ({ ...clip, name: clip.id })),
    counted: new Map(
      loaded.map(({ id, label, rate, frameTimes }) => [
        // Where frames come at no constant rate, moments are kept in milliseconds.
        id,
        { label, rate: frameTimes === null ? rate : MILLISECOND_RATE },
      ]),
    ),
    loaded: new Map(loaded.map((clip) => [clip.id, clip])),
  };
}

/** An edit whose clips are called by the ids of the footage. */
export function editByIds(of: {
  readonly edit: Edit;
  readonly clipIds: ReadonlyMap<string, string | null>;
}): Edit {
  return nameByFootage(of.edit, of.clipIds);
}

/** The seconds since a clip's first frame at which one of its frames begins: by its timestamps, where it has them. */
export function secondsOn(clip: LoadedClip | undefined, frame: number, rate: Rate): Fraction {
  const frameTimes = clip && sameRate(rate, clip.rate) ? clip.frameTimes : null;
  return clipTimeOfFrame({ rate, frameTimes }, frame);
}

/** A stored anchor as it is placed. @param rate of the edit, in whose frames an episode time is given */
export function anchorOf(row: AnchorRow, footage: Footage, rate: Rate): Anchor {
  const sense = row.of;
  if (row.shopAt !== null) {
    const until = row.shopUntil === null ? null : new Fraction(row.shopUntil.getTime());
    return { clock: 'shop', at: new Fraction(row.shopAt.getTime()), until, sense };
  }
  const { frame, endFrame, rateNum, rateDen, clipId } = row;
  if (frame === null || rateNum === null || rateDen === null) throw new Error('The anchor has no frames.');
  const counted = { num: rateNum, den: rateDen };
  if (row.clock === 'episode' || clipId === null) {
    return { clock: 'episode', at: new Fraction(frame).mul(rateOf(rate)).div(rateOf(counted)) };
  }
  const on = (clip: string, at: number) => secondsOn(footage.loaded.get(clip), at, counted);
  return {
    clock: 'clip',
    clip: clipId,
    at: on(clipId, frame),
    until: endFrame === null ? null : { clip: row.endClipId, at: on(row.endClipId ?? clipId, endFrame) },
    sense,
  };
}

/** The frames of an anchor, as they are counted. */
export function positionOf({ frame, endFrame, rateNum, rateDen }: AnchorRow): Position {
  return { frame: frame ?? 0, endFrame, rate: { num: rateNum ?? 1, den: rateDen ?? 1 } };
}
