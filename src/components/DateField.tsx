import { Field, type FieldProps } from './Field.tsx';

type DateFieldProps = Omit<FieldProps, 'type' | 'rows' | 'mono' | 'inputMode'> & {
  /** Asks for the time of day too. */
  readonly withTime?: boolean | undefined;
};

/** A date, year first as it is stored; `min` and `max` take the same form. */
export function DateField({ withTime = false, ...rest }: DateFieldProps) {
  return <Field {...rest} type={withTime ? 'datetime-local' : 'date'} mono className="max-w-60" />;
}
