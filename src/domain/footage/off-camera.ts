import { type Edit, rateOf, type Segment } from '../edit/edit.ts';
import { shopTimeAt } from './camera-clock.ts';
import { type OffCameraSign } from './clip-facts.ts';
import { type ShopStretch } from './find-gaps.ts';
import { type FilmedClip, isTimed, shopStretch, type TimedClip } from './place-on-clips.ts';

/** A stretch in which work is known to have gone on, and by what. */
export interface WorkStretch extends ShopStretch {
  readonly sign: OffCameraSign;
  readonly text: string;
}

/** Work that no camera saw. */
export interface OffCamera extends ShopStretch {
  /** What was written of the work, each once. */
  readonly texts: readonly string[];
}

/** Shorter than this nobody calls off camera: a clip was changed. Our own choice, in milliseconds. */
const LEAST_MS = 60_000;

function union(stretches: readonly ShopStretch[]): ShopStretch[] {
  const joined: { from: number; until: number }[] = [];
  for (const { from, until } of stretches.toSorted((a, b) => a.from - b.from)) {
    const last = joined.at(-1);
    if (last !== undefined && from <= last.until) last.until = Math.max(last.until, until);
    else if (until > from) joined.push({ from, until });
  }
  return joined;
}

/**
 * The work that was done while no clip was running, used or not: what was filmed and left out is not off camera, and
 * a gap without any sign of work is nothing.
 * @param work stretches of work, in any order; they may lie over each other
 * @param clips the footage; a clip that is not known to have run at a time hides nothing
 */
export function offCamera(work: readonly WorkStretch[], clips: readonly FilmedClip[]): OffCamera[] {
  const filmed = union(
    clips.filter(isTimed).map((clip) => {
      const [from, until] = shopStretch(clip);
      return { from: from.valueOf(), until: until.valueOf() };
    }),
  );
  let first = 0;
  return union(work).flatMap((stretch) => {
    const left: ShopStretch[] = [];
    let { from } = stretch;
    while (first < filmed.length && (filmed[first]?.until ?? 0) <= stretch.from) first += 1;
    for (let index = first; from < stretch.until; index += 1) {
      const clip = filmed[index];
      if (clip === undefined || clip.from >= stretch.until) break;
      if (clip.from > from) left.push({ from, until: clip.from });
      from = Math.max(from, clip.until);
    }
    if (from < stretch.until) left.push({ from, until: stretch.until });
    return left
      .filter((one) => one.until - one.from >= LEAST_MS)
      .map((one) => ({ ...one, texts: textsIn(work, one) }));
  });
}

function textsIn(work: readonly WorkStretch[], { from, until }: ShopStretch): string[] {
  const said = work.filter((one) => one.text !== '' && one.from < until && one.until > from);
  return [...new Set(said.map(({ text }) => text))];
}

/** A cut of an episode over which work went on off camera. */
export interface CutOverWork {
  /** Frames of the episode. */
  readonly frame: number;
  /** How long was worked, in seconds. */
  readonly seconds: number;
  readonly texts: readonly string[];
}

/** When a segment begins or ends in the shop; null of one that is not known to have been filmed at a time. */
function shopSpan(
  segment: Segment,
  clips: ReadonlyMap<string, TimedClip & { readonly label: Segment['speed'] }>,
) {
  const clip = clips.get(segment.clip);
  if (clip === undefined || segment.speed.compare(0) <= 0) return null;
  const at = (frame: Segment['source']['in']) => {
    const since = frame.div(rateOf(segment.clipRate)).sub(clip.label);
    return shopTimeAt(clip.clock, clip.start.add(since.mul(clip.pace).mul(1000))).valueOf();
  };
  return { from: at(segment.source.in), until: at(segment.source.out) };
}

/**
 * The cuts of an edit at which off-camera work is missing: where the picture goes from before it to after it. Each
 * stretch is told once, at the cut that leaves out least.
 * @param edit with its clips called by their ids
 */
export function cutsOverWork(
  edit: Edit,
  clips: readonly (FilmedClip & { readonly label: Segment['speed'] })[],
  off: readonly OffCamera[],
): CutOverWork[] {
  const timed = new Map(clips.flatMap((clip) => (isTimed(clip) ? [[clip.id, clip] as const] : [])));
  const spans = edit.picture.map((segment) => ({ segment, span: shopSpan(segment, timed) }));
  const cuts = spans.slice(1).flatMap(({ segment, span }, index) => {
    const before = spans[index]?.span ?? null;
    if (before === null || span === null || span.from <= before.until) return [];
    return [{ frame: Number(segment.record.in.floor().valueOf()), from: before.until, until: span.from }];
  });
  const byWidth = cuts.toSorted((a, b) => a.until - a.from - (b.until - b.from));
  const found = new Map<number, { seconds: number; texts: Set<string> }>();
  for (const { from, until, texts } of off) {
    const cut = byWidth.find((one) => one.from <= from && until <= one.until);
    if (cut === undefined) continue;
    const there = found.get(cut.frame) ?? { seconds: 0, texts: new Set<string>() };
    there.seconds += (until - from) / 1000;
    for (const text of texts) there.texts.add(text);
    found.set(cut.frame, there);
  }
  return [...found]
    .map(([frame, { seconds, texts }]) => ({ frame, seconds, texts: [...texts] }))
    .sort((a, b) => a.frame - b.frame);
}
