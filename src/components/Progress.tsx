import { useId } from 'react';

type ProgressProps = {
  /** What is going on: "Sending C0043.mp4". */
  readonly label: string;
  /** How much is done, out of `max`; left out while that is not known. */
  readonly value?: number | undefined;
  readonly max?: number | undefined;
  /** The same in words: "412 of 1,210 MB, about 3 min left". */
  readonly detail?: string | undefined;
};

/** Long work, as far as it has come. It never moves by itself: without a value it is a hatched bar. */
export function Progress({ label, value, max = 100, detail }: ProgressProps) {
  const id = useId();
  return (
    <div className="grid gap-1">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <span id={id} className="font-medium">
          {label}
        </span>
        {detail !== undefined && <span className="font-mono text-sm text-ink-soft">{detail}</span>}
      </div>
      <progress aria-labelledby={id} className="bar" {...(value !== undefined && { value })} max={max} />
    </div>
  );
}
