import { type ChangeEventHandler } from 'react';
import { describeField, FieldFrame, fieldId, INPUT_LOOK } from './FieldFrame.tsx';

export type SelectOption = {
  readonly value: string;
  readonly label: string;
  /** Said after the label: a part's name, a bar's length left. */
  readonly detail?: string | undefined;
};

type SelectProps = {
  readonly label: string;
  readonly name: string;
  readonly options: readonly SelectOption[];
  readonly id?: string | undefined;
  readonly value?: string | undefined;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly required?: boolean | undefined;
  readonly disabled?: boolean | undefined;
  readonly onChange?: ChangeEventHandler<HTMLSelectElement> | undefined;
};

/** A native list to choose one from. */
export function Select(props: SelectProps) {
  const {
    label,
    name,
    options,
    id = fieldId(name),
    value,
    hint,
    error,
    required,
    disabled,
    onChange,
  } = props;
  const chosen = onChange === undefined ? { defaultValue: value } : { value, onChange };
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} required={required}>
      <select
        {...chosen}
        {...describeField(id, hint, error)}
        id={id}
        name={name}
        required={required}
        disabled={disabled}
        className={INPUT_LOOK}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.detail === undefined ? option.label : `${option.label} · ${option.detail}`}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
