import { type Position } from '../../../../domain/positions.ts';
import { type Rate } from '../../../../domain/time/rate.ts';
import { type NoteFields } from '../../../notes/note.ts';

/** A note that is being written. */
export type Draft = Omit<NoteFields, 'position'> & {
  /** The frame at which it was begun; null: the moment on screen. */
  readonly at: number | null;
};

export const EMPTY_DRAFT: Draft = {
  kind: 'step',
  text: '',
  audience: 'viewers',
  askedId: null,
  standing: null,
  topic: null,
  partIds: [],
  at: null,
};

/** In and out, in frames. */
export interface Marks {
  readonly in: number | null;
  readonly out: number | null;
}

export const NO_MARKS: Marks = { in: null, out: null };

/** Sets in or out; one that would stand the wrong way round sends the other away. */
export function setMark(marks: Marks, which: 'in' | 'out', frame: number): Marks {
  if (which === 'in') return { in: frame, out: marks.out !== null && marks.out > frame ? marks.out : null };
  return { in: marks.in !== null && marks.in < frame ? marks.in : null, out: frame };
}

/** The stretch that in and out hold; null while one is missing. */
export function stretchOf({ in: start, out }: Marks, rate: Rate): Position | null {
  return start === null || out === null ? null : { frame: start, endFrame: out, rate };
}

/** Where a note will stand: from in to out, at in, where it was begun, or at the moment on screen. */
export function placeOfDraft(draft: Draft, marks: Marks, now: number, rate: Rate): Position {
  return stretchOf(marks, rate) ?? { frame: marks.in ?? draft.at ?? now, endFrame: null, rate };
}

/** The fields that go with a kind: what no longer belongs to it goes. */
export function withKind<D extends Pick<NoteFields, 'kind' | 'standing' | 'topic'>>(
  draft: D,
  kind: NoteFields['kind'],
): D {
  return {
    ...draft,
    kind,
    standing: kind === 'size' ? (draft.standing ?? 'as-made') : null,
    topic: kind === 'caution' ? draft.topic : null,
  };
}

/** The next draft after one was saved: kind and who sees it stay, as they mostly do. */
export function afterSaving({ kind, audience, askedId, standing }: Draft): Draft {
  return { ...EMPTY_DRAFT, kind, audience, askedId, standing };
}

export function isBegun({ text, partIds }: Draft): boolean {
  return text !== '' || partIds.length > 0;
}
