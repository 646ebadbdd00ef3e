import { fieldId } from './FieldFrame.tsx';

export type Choice = {
  readonly value: string;
  readonly label: string;
  readonly detail?: string | undefined;
};

type ChoicesProps = {
  /** The question they answer. */
  readonly label: string;
  readonly name: string;
  readonly options: readonly Choice[];
  /** One of them, or with `many` any number. */
  readonly many?: boolean | undefined;
  readonly chosen?: readonly string[] | undefined;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly onChange?: ((value: string, on: boolean) => void) | undefined;
};

/** A few choices, all of them in sight. */
export function Choices(props: ChoicesProps) {
  const { label, name, options, many = false, chosen = [], hint, error, onChange } = props;
  const id = fieldId(name);
  const notes = [hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`]
    .filter(Boolean)
    .join(' ');
  return (
    <fieldset
      id={id}
      tabIndex={-1}
      aria-describedby={notes === '' ? undefined : notes}
      className="grid gap-1"
    >
      <legend className="font-medium">{label}</legend>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {options.map((option) => (
        <label key={option.value} className="flex min-h-8 items-start gap-3 py-1">
          <input
            type={many ? 'checkbox' : 'radio'}
            name={name}
            value={option.value}
            defaultChecked={chosen.includes(option.value)}
            className="mt-0.5 size-5 shrink-0 accent-dye"
            onChange={(event) => onChange?.(option.value, event.target.checked)}
          />
          <span>
            {option.label}
            {option.detail !== undefined && (
              <span className="block text-sm text-ink-soft">{option.detail}</span>
            )}
          </span>
        </label>
      ))}
      {error !== undefined && (
        <p id={`${id}-error`} className="text-sm font-medium text-primer">
          {error}
        </p>
      )}
    </fieldset>
  );
}
