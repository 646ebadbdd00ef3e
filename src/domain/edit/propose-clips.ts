import { clipNameKey } from './clip-names.ts';
import { type Segment } from './edit.ts';

/** A clip of the footage, as far as a list can tell it from others. */
export interface KnownClip {
  readonly id: string;
  /** The file's name. */
  readonly name: string;
  /** Its first label and the one after its last, in seconds from 00:00:00:00; null where it has none. */
  readonly labels: readonly [number, number] | null;
}

/** What a list's name for a clip may stand for: one clip, or several to choose from, or none. */
export interface ClipProposal {
  readonly name: string;
  readonly clips: readonly string[];
}

/** Whether a use can be of a clip at all: labels that lie outside of it say no. */
function mayHold(known: KnownClip, { source, clipRate }: Segment): boolean {
  if (known.labels === null) return true;
  const seconds = clipRate.den / clipRate.num;
  const [from, to] = known.labels;
  // A frame either way: the length of a file is a rounded one.
  return source.in.valueOf() * seconds >= from - seconds && source.out.valueOf() * seconds <= to + seconds;
}

/**
 * Which clips of the footage the names of an edit stand for. Names are compared without folder, ending and capitals,
 * the clip's own before its file and reel; cameras start again at C0001, so labels decide between equal names.
 * @returns one proposal a name, in the order of the edit
 */
export function proposeClips(segments: readonly Segment[], footage: readonly KnownClip[]): ClipProposal[] {
  const known = new Map<string, KnownClip[]>();
  for (const clip of footage) {
    const key = clipNameKey(clip.name);
    known.set(key, [...(known.get(key) ?? []), clip]);
  }
  const uses = new Map<string, Segment[]>();
  for (const segment of segments) uses.set(segment.clip, [...(uses.get(segment.clip) ?? []), segment]);
  return [...uses].map(([name, own]) => {
    const names = [name, ...own.flatMap(({ alsoCalled }) => alsoCalled)];
    const found =
      names.map((one) => known.get(clipNameKey(one)) ?? []).find((clips) => clips.length > 0) ?? [];
    const fitting = found.filter((clip) => own.every((segment) => mayHold(clip, segment)));
    return { name, clips: (fitting.length > 0 ? fitting : found).map(({ id }) => id) };
  });
}
