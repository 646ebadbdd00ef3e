import { type ReactNode } from 'react';

/** The id a field has unless it is given one: FormSummary links to it by the field's name. */
export function fieldId(name: string): string {
  return `field-${name}`;
}

/** What ties an input to its hint and its error. */
export function describeField(id: string, hint: string | undefined, error: string | undefined) {
  const described = [hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`].filter(
    Boolean,
  );
  return {
    ...(described.length > 0 && { 'aria-describedby': described.join(' ') }),
    ...(error !== undefined && { 'aria-invalid': true }),
  };
}

/** The look of every input that is typed or chosen in. */
export const INPUT_LOOK =
  'block w-full min-h-10 border border-line-strong bg-sheet px-3 py-1.5 text-ink placeholder:text-ink-faint ' +
  'aria-invalid:border-primer aria-invalid:border-s-4 disabled:border-dashed disabled:text-ink-soft';

type FieldFrameProps = {
  readonly id: string;
  readonly label: string;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly required?: boolean | undefined;
  readonly children: ReactNode;
};

/** Label above, hint under it, the input, then what is wrong with it. */
export function FieldFrame({ id, label, hint, error, required = false, children }: FieldFrameProps) {
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="justify-self-start font-medium">
        {label}
        {!required && <span className="ps-1 text-sm font-normal text-ink-soft"> can be left out</span>}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {children}
      {error !== undefined && (
        <p id={`${id}-error`} className="text-sm font-medium text-primer">
          {error}
        </p>
      )}
    </div>
  );
}
