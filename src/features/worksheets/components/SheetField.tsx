import { FieldFrame, describeField, fieldId, INPUT_LOOK } from '../../../components/FieldFrame.tsx';
import { Select } from '../../../components/Select.tsx';
import { type Field } from '../../../domain/worksheets/worksheet.ts';
import { INPUT_LENGTH, LINES_LENGTH } from '../given.ts';

type SheetFieldProps = {
  readonly name: string;
  readonly field: Field<unknown>;
  readonly text: string;
  readonly error: string | undefined;
  /** Left out where the form is only sent. */
  readonly onChange?: ((text: string) => void) | undefined;
};

/** One input of a worksheet, with how it was read under it. */
export function SheetField({ name, field, text, error, onChange }: SheetFieldProps) {
  const { label, example, choices, flag, lines, optional = false, otherwise, readBack } = field;
  const id = fieldId(name);
  if (flag === true) {
    return (
      <label className="flex items-center gap-2">
        <input
          type="checkbox"
          name={name}
          value="yes"
          checked={text === 'yes'}
          className="size-5 accent-dye"
          onChange={(event) => {
            onChange?.(event.target.checked ? 'yes' : '');
          }}
        />
        {label}
      </label>
    );
  }
  const usual = otherwise === undefined ? undefined : `Left out: ${otherwise}`;
  if (choices !== undefined) {
    const options = choices.map((choice) => ({ value: choice, label: choice }));
    return (
      <Select
        name={name}
        label={label}
        options={[{ value: '', label: usual ?? (optional ? 'Not known' : 'Choose') }, ...options]}
        value={text}
        error={error}
        required={!optional}
        onChange={(event) => {
          onChange?.(event.target.value);
        }}
      />
    );
  }
  const hint = [`Such as ${example}`, usual].filter((line) => line !== undefined).join('. ');
  const read = text.trim() === '' || error !== undefined ? undefined : readBack?.(text);
  const input = {
    ...describeField(id, hint, error),
    id,
    name,
    autoComplete: 'off',
    autoCapitalize: 'none',
    spellCheck: false,
    value: text,
    className: `${INPUT_LOOK} font-mono`,
    onChange: (event: { readonly target: { readonly value: string } }) => {
      onChange?.(event.target.value);
    },
  };
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} required={!optional}>
      {lines === true ? (
        <textarea {...input} rows={8} maxLength={LINES_LENGTH} />
      ) : (
        <input {...input} type="text" maxLength={INPUT_LENGTH} />
      )}
      {readBack !== undefined && (
        <output htmlFor={id} className="min-h-5 font-mono text-sm text-ink-soft">
          {read}
        </output>
      )}
    </FieldFrame>
  );
}
