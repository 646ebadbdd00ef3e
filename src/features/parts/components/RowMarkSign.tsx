/** How a row stands to what is stored. */
export type RowMark = 'saved' | 'saving' | 'waiting' | 'unsaved' | 'conflict';

const MARKS: Readonly<Record<RowMark, { said: string; look: string; path: string }>> = {
  saved: { said: 'Saved', look: 'text-verdigris', path: 'M2.5 8.5l3.5 3.5L13.5 4' },
  saving: { said: 'Saving', look: 'text-ink-soft', path: 'M2.5 8h.01M8 8h.01M13.5 8h.01' },
  waiting: { said: 'Waits to be saved', look: 'text-ink-soft', path: 'M2.5 8h.01M8 8h.01M13.5 8h.01' },
  unsaved: { said: 'Not saved yet', look: 'text-primer', path: 'M8 2.5v7M8 13v.01' },
  conflict: { said: 'Two versions', look: 'text-primer', path: 'M3 5h10M3 11h10' },
};

/** A small sign at a row's end, said in words too. */
export function RowMarkSign({ mark }: { readonly mark: RowMark }) {
  const { said, look, path } = MARKS[mark];
  return (
    <span className={`ms-1 ${look}`} title={said}>
      <svg
        width="16"
        height="16"
        aria-hidden="true"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinecap="square"
      >
        <path d={path} />
      </svg>
      <span className="sr-only">{said}</span>
    </span>
  );
}
