import { NOTE_KINDS, type NoteKind } from '../../../../domain/note-kinds.ts';
import { NOTE_KINDS as LOOKS } from '../../../../components/note-kind.ts';
import { digitOf } from '../../../../client/note-keys.ts';

type KindFieldProps = {
  readonly name: string;
  readonly kind: NoteKind;
  readonly onChange: (kind: NoteKind) => void;
};

const TONES = {
  dye: 'has-checked:border-dye has-checked:bg-dye-wash has-checked:text-dye',
  brass: 'has-checked:border-brass-text has-checked:bg-brass-wash has-checked:text-brass-text',
  primer: 'has-checked:border-primer has-checked:bg-primer-wash has-checked:text-primer',
};

/** What kind of note it is: all of them in sight, each with its key. */
export function KindField({ name, kind, onChange }: KindFieldProps) {
  return (
    <fieldset>
      <legend className="pb-1 font-medium">Kind</legend>
      <div className="flex flex-wrap gap-1">
        {NOTE_KINDS.map((one) => (
          <label
            key={one}
            className={`flex min-h-8 cursor-pointer items-center gap-1.5 border border-line bg-sheet px-2 text-sm hover:border-dye has-checked:font-bold has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-brass forced-colors:has-checked:bg-[Highlight] ${TONES[LOOKS[one].tone]}`}
          >
            <input
              type="radio"
              name={`${name}-kind`}
              value={one}
              checked={one === kind}
              className="sr-only"
              onChange={() => {
                onChange(one);
              }}
            />
            <span className="font-mono text-ink-faint" aria-hidden="true">
              {digitOf(one)}
            </span>
            {LOOKS[one].label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
