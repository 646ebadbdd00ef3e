import { CentrePop } from './CentrePop.tsx';

type CautionNoteProps = {
  /** What it is about. */
  readonly label: string;
  readonly words: string;
  readonly source: string;
};

/** A usual caution with its published source, beside what it is about. */
export function CautionNote({ label, words, source }: CautionNoteProps) {
  return (
    <div className="grid max-w-prose grid-cols-[1.5rem_minmax(0,1fr)] gap-x-2 border border-primer bg-sheet px-3 py-2">
      <CentrePop tone="primer" />
      <div>
        <p>
          <strong className="text-primer">The usual caution, {label}:</strong> {words}
        </p>
        <p className="text-sm text-ink-soft">
          Source: {source}. A guide only: local codes and licensed people decide.
        </p>
      </div>
    </div>
  );
}
