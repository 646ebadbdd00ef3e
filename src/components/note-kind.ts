export type NoteKind =
  'step' | 'size' | 'setting' | 'rating' | 'change' | 'undecided' | 'correction' | 'caution' | 'ask' | 'tip';

/** dye: as it is; brass: it moved or may move; primer: mind this. */
export type NoteTone = 'dye' | 'brass' | 'primer';

type KindLook = { readonly label: string; readonly tone: NoteTone };

export const NOTE_KINDS: Readonly<Record<NoteKind, KindLook>> = {
  step: { label: 'step', tone: 'dye' },
  size: { label: 'size', tone: 'dye' },
  setting: { label: 'setting', tone: 'dye' },
  rating: { label: 'rating', tone: 'dye' },
  change: { label: 'changed from the plans', tone: 'brass' },
  undecided: { label: 'undecided', tone: 'brass' },
  correction: { label: 'correction', tone: 'primer' },
  caution: { label: 'caution', tone: 'primer' },
  ask: { label: 'ask', tone: 'dye' },
  tip: { label: 'tip', tone: 'dye' },
};
