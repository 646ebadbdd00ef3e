import { type FormError } from './FormSummary.tsx';

/**
 * The errors of a form that came back, as its summary lists them.
 * @param errors a sentence a field; the empty name is the form as a whole
 * @param message what to say when no field is to blame
 */
export function listFormErrors(
  errors: Readonly<Record<string, string>>,
  message: string | null,
): FormError[] {
  const listed = Object.entries(errors).map(([field, text]) =>
    field === '' ? { message: text } : { field, message: text },
  );
  return listed.length > 0 || message === null ? listed : [{ message }];
}
