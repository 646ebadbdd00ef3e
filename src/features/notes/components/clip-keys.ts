import { NOTE_KINDS, type NoteKind } from '../../../domain/note-kinds.ts';

/** What a key does beside a clip, when nobody is typing: the same as at an episode's desk. */
export type ClipCommand =
  | { readonly do: 'play' | 'note' | 'leave' }
  | { readonly do: 'kind'; readonly kind: NoteKind }
  | { readonly do: 'step'; readonly seconds: number }
  | { readonly do: 'frame'; readonly by: 1 | -1 };

const KEYS: Readonly<Record<string, ClipCommand>> = {
  ' ': { do: 'play' },
  ',': { do: 'frame', by: -1 },
  '.': { do: 'frame', by: 1 },
  n: { do: 'note' },
  Escape: { do: 'leave' },
};

/** The command of a key, or null. Digits are kinds in the order they are offered: 1 is a step, 0 a tip. */
export function clipCommand(pressed: {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
  readonly shiftKey: boolean;
}): ClipCommand | null {
  const { key, ctrlKey, metaKey, altKey, shiftKey } = pressed;
  if (ctrlKey || metaKey || altKey) return null;
  if (key === 'ArrowLeft' || key === 'ArrowRight') {
    const size = shiftKey ? 10 : 1;
    return { do: 'step', seconds: key === 'ArrowLeft' ? -size : size };
  }
  const kind = /^\d$/.test(key) ? NOTE_KINDS[(Number(key) + 9) % 10] : undefined;
  if (kind !== undefined) return { do: 'kind', kind };
  return KEYS[key] ?? KEYS[key.toLowerCase()] ?? null;
}
