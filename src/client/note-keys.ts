import { NOTE_KINDS, type NoteKind } from '../domain/note-kinds.ts';

export type StepSize = 'frame' | 'second' | 'ten';

/** What a key does wherever notes are made beside a player. */
export type NoteKey =
  | { readonly do: 'play' | 'note' | 'leave' }
  | { readonly do: 'kind'; readonly kind: NoteKind }
  | { readonly do: 'step'; readonly by: 1 | -1; readonly size: StepSize };

/** A key as the browser reports it. */
export interface Pressed {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
}

const SINGLE: Readonly<Record<string, NoteKey>> = {
  ' ': { do: 'play' },
  ',': { do: 'step', by: -1, size: 'frame' },
  '.': { do: 'step', by: 1, size: 'frame' },
  n: { do: 'note' },
  Escape: { do: 'leave' },
};

/** The keys that are digits, in the order in which kinds are offered: 1 is a step, 0 a tip. */
export function digitOf(kind: NoteKind): string {
  return String((NOTE_KINDS.indexOf(kind) + 1) % 10);
}

/** What a single key does when nobody is typing; null with Ctrl, Alt or the like, and for any other. */
export function noteKeyOf({ key, ctrlKey, metaKey, shiftKey, altKey }: Pressed): NoteKey | null {
  if (ctrlKey || metaKey || altKey) return null;
  if (key === 'ArrowLeft' || key === 'ArrowRight')
    return { do: 'step', by: key === 'ArrowLeft' ? -1 : 1, size: shiftKey ? 'ten' : 'second' };
  const kind = NOTE_KINDS.find((one) => digitOf(one) === key);
  if (kind !== undefined) return { do: 'kind', kind };
  return SINGLE[key] ?? SINGLE[key.toLowerCase()] ?? null;
}
