import { type NoteKey, noteKeyOf, type Pressed, type StepSize } from '../../../../client/note-keys.ts';

export type Command =
  | NoteKey
  | { readonly do: 'in' | 'out' | 'clear-marks' | 'chapter' | 'bench' }
  | { readonly do: 'to-note'; readonly by: 1 | -1 }
  | { readonly do: 'edit' | 'move-here' | 'delete' | 'undo' | 'redo' | 'keys' }
  | { readonly do: 'nudge'; readonly by: 1 | -1; readonly size: StepSize };

/** What only the desk has; the rest is that of every player with notes. */
const SINGLE: Readonly<Record<string, Command>> = {
  '<': { do: 'nudge', by: -1, size: 'frame' },
  '>': { do: 'nudge', by: 1, size: 'frame' },
  '-': { do: 'nudge', by: -1, size: 'second' },
  '+': { do: 'nudge', by: 1, size: 'second' },
  i: { do: 'in' },
  o: { do: 'out' },
  x: { do: 'clear-marks' },
  c: { do: 'chapter' },
  p: { do: 'bench' },
  b: { do: 'to-note', by: -1 },
  f: { do: 'to-note', by: 1 },
  e: { do: 'edit' },
  m: { do: 'move-here' },
  Delete: { do: 'delete' },
  '?': { do: 'keys' },
};

/**
 * What a key does when nobody is typing.
 * @param singles false when keys without Ctrl are switched off
 */
export function commandOf(pressed: Pressed, singles = true): Command | null {
  const { key, ctrlKey, metaKey, shiftKey, altKey } = pressed;
  if (altKey) return null;
  if (ctrlKey || metaKey) {
    const letter = key.toLowerCase();
    if (letter === 'z') return { do: shiftKey ? 'redo' : 'undo' };
    return letter === 'y' && !shiftKey ? { do: 'redo' } : null;
  }
  if (!singles) return null;
  return noteKeyOf(pressed) ?? SINGLE[key] ?? SINGLE[key.toLowerCase()] ?? null;
}

/** What the panel says, a group at a time. */
export const KEY_GROUPS: readonly {
  readonly title: string;
  readonly keys: readonly (readonly [keys: string, does: string])[];
}[] = [
  {
    title: 'The video',
    keys: [
      ['Space', 'play or stop'],
      ['← →', 'one second'],
      ['Shift ← →', 'ten seconds'],
      [', .', 'one frame'],
      ['B F', 'to the note before, to the following one'],
    ],
  },
  {
    title: 'Writing',
    keys: [
      ['N', 'a note at this moment'],
      ['1 … 9, 0', 'a note of that kind'],
      ['I O', 'in and out: the note holds from one to the other'],
      ['X', 'forget in and out'],
      ['C', 'a chapter from here'],
      ['P', 'put a part on the bench'],
      ['Ctrl Enter', 'save, while typing'],
      ['Esc', 'leave the field; the other keys work again'],
    ],
  },
  {
    title: 'The marked note',
    keys: [
      ['E', 'change it'],
      ['M', 'move it to the moment on screen'],
      ['< >', 'move it by a frame'],
      ['− +', 'move it by a second'],
      ['Delete', 'delete it'],
    ],
  },
  {
    title: 'Everything',
    keys: [
      ['Ctrl Z', 'undo'],
      ['Ctrl Shift Z', 'do it again'],
      ['?', 'these keys'],
    ],
  },
];
