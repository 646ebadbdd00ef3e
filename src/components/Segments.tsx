import { type Choice } from './Choices.tsx';

type SegmentsProps = {
  readonly label: string;
  readonly hideLabel?: boolean | undefined;
  readonly name: string;
  readonly options: readonly Choice[];
  readonly value?: string | undefined;
  readonly onChange?: ((value: string) => void) | undefined;
};

/** Two to four choices side by side in one ruled strip, the chosen one inked. */
export function Segments({ label, hideLabel = false, name, options, value, onChange }: SegmentsProps) {
  return (
    <fieldset className="inline-block">
      <legend className={hideLabel ? 'sr-only' : 'text-xs text-ink-soft'}>{label}</legend>
      <div className="inline-flex border border-ink bg-sheet">
        {options.map((option) => (
          <label
            key={option.value}
            className="flex min-h-7 cursor-pointer items-center border-ink px-3 text-sm font-medium not-first:border-s hover:bg-dye-wash has-checked:bg-ink has-checked:font-bold has-checked:text-sheet has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-brass forced-colors:has-checked:bg-[Highlight] forced-colors:has-checked:text-[HighlightText] forced-colors:has-checked:forced-color-adjust-none"
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              defaultChecked={option.value === value}
              className="sr-only"
              onChange={() => onChange?.(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
