import { joinClasses } from './join-classes.ts';
import { NOTE_KINDS, type NoteKind } from './note-kind.ts';

const TONES = {
  dye: 'border-dye-wash bg-dye-wash text-dye',
  brass: 'border-brass-wash bg-brass-wash text-brass-text',
  primer: 'border-primer-wash bg-primer-wash text-primer',
};

/** A correction takes something back and an open question holds no answer: neither is filled in. */
const OUTLINED: Partial<Record<NoteKind, string>> = {
  correction: 'border-primer text-primer',
  undecided: 'border-dashed border-brass-text text-brass-text',
  ask: 'border-dye text-dye',
};

/** The kind of a note, in a word. */
export function KindLabel({ kind }: { readonly kind: NoteKind }) {
  const { label, tone } = NOTE_KINDS[kind];
  return (
    <span
      className={joinClasses(
        'inline-block border px-1.5 text-sm leading-snug font-bold whitespace-nowrap',
        OUTLINED[kind] ?? TONES[tone],
      )}
    >
      {label}
    </span>
  );
}
