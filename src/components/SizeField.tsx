import { useState } from 'react';
import { describeField, FieldFrame, fieldId, INPUT_LOOK } from './FieldFrame.tsx';

type SizeFieldProps = {
  readonly label: string;
  readonly name: string;
  readonly id?: string | undefined;
  readonly value?: string | undefined;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly required?: boolean | undefined;
  /** How the size is understood when no unit is written. */
  readonly unit?: string | undefined;
  /** Reads what was typed back in both systems; null while it cannot be read. */
  readonly read?: ((text: string) => string | null) | undefined;
  readonly onChange?: ((text: string) => void) | undefined;
};

/** A size as the shop writes it: 412, 1-1/2 in, 35.009. What was typed is what is sent. */
export function SizeField(props: SizeFieldProps) {
  const {
    label,
    name,
    id = fieldId(name),
    value = '',
    hint,
    error,
    required,
    unit = 'mm',
    read,
    onChange,
  } = props;
  const [text, setText] = useState(value);
  const reading = text.trim() === '' ? undefined : read?.(text);
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} required={required}>
      <div className="flex max-w-60 items-stretch">
        <input
          {...describeField(id, hint, error)}
          id={id}
          name={name}
          type="text"
          inputMode="text"
          autoComplete="off"
          spellCheck={false}
          required={required}
          defaultValue={value}
          className={`${INPUT_LOOK} font-mono`}
          onChange={(event) => {
            setText(event.target.value);
            onChange?.(event.target.value);
          }}
        />
        <span
          aria-hidden="true"
          className="flex items-center border border-s-0 border-line-strong px-3 text-sm text-ink-soft"
        >
          {unit}
        </span>
      </div>
      {read !== undefined && (
        <output htmlFor={id} className="min-h-5 font-mono text-sm text-ink-soft">
          {reading === null ? 'Not a size yet' : reading}
        </output>
      )}
    </FieldFrame>
  );
}
