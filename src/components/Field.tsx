import { type InputHTMLAttributes, type TextareaHTMLAttributes } from 'react';
import { describeField, FieldFrame, fieldId, INPUT_LOOK } from './FieldFrame.tsx';
import { joinClasses } from './join-classes.ts';

type Forwarded = Omit<InputHTMLAttributes<HTMLInputElement>, 'id' | 'name' | 'required'> &
  Pick<TextareaHTMLAttributes<HTMLTextAreaElement>, 'wrap'>;

export type FieldProps = Forwarded & {
  readonly label: string;
  readonly name: string;
  readonly id?: string | undefined;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly required?: boolean | undefined;
  /** Makes it a textarea of that many lines. */
  readonly rows?: number | undefined;
  /** For part numbers, times and sizes. */
  readonly mono?: boolean | undefined;
};

/** A labelled input or textarea with its hint and error tied to it. Uncontrolled unless given `onChange`. */
export function Field(props: FieldProps) {
  const {
    label,
    name,
    id = fieldId(name),
    hint,
    error,
    required = false,
    rows,
    mono = false,
    ...rest
  } = props;
  const { className, value, defaultValue, onChange, wrap, ...input } = rest;
  const shared = {
    ...input,
    ...describeField(id, hint, error),
    // A server-rendered form passes `value`; without a handler React must not control it.
    ...(onChange === undefined ? { defaultValue: value ?? defaultValue } : { value, defaultValue, onChange }),
    id,
    name,
    required,
    className: joinClasses(INPUT_LOOK, mono && 'font-mono', className),
  };
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} required={required}>
      {rows === undefined ? (
        <input {...shared} type={input.type ?? 'text'} />
      ) : (
        <textarea {...(shared as TextareaHTMLAttributes<HTMLTextAreaElement>)} rows={rows} wrap={wrap} />
      )}
    </FieldFrame>
  );
}
