import { fieldId } from './FieldFrame.tsx';

export type FormError = {
  /** The field's name; left out when the error is about the form as a whole. */
  readonly field?: string | undefined;
  readonly message: string;
};

type FormSummaryProps = {
  readonly errors: readonly FormError[];
  /** What was kept; the default is true of every form that comes back filled in. */
  readonly kept?: string | undefined;
};

/** What has to be put right, at the head of a form that was sent back. Nothing when nothing is wrong. */
export function FormSummary({ errors, kept = 'What you wrote is still here.' }: FormSummaryProps) {
  if (errors.length === 0) return null;
  return (
    <div
      role="alert"
      tabIndex={-1}
      id="form-summary"
      className="border border-primer bg-primer-wash px-4 py-3"
    >
      <p className="font-bold text-primer">
        {errors.length === 1 ? 'One thing to put right' : `${String(errors.length)} things to put right`}
      </p>
      <ul className="grid gap-1 py-1">
        {errors.map(({ field, message }) => (
          <li key={`${field ?? ''}-${message}`}>
            {field === undefined ? (
              message
            ) : (
              <a href={`#${fieldId(field)}`} className="link">
                {message}
              </a>
            )}
          </li>
        ))}
      </ul>
      <p className="text-sm text-ink-soft">{kept}</p>
    </div>
  );
}
