const KEYS = [
  ['Arrow keys, Tab', 'go from cell to cell; with Shift the arrows select'],
  ['Escape, then Tab', 'leaves the table'],
  ['Any letter', 'replaces what is in the cell'],
  ['Enter or F2', 'opens the cell to change it; Enter takes it and goes down, Escape leaves it as it was'],
  ['Ctrl C, X, V', 'copy, cut and paste; several rows from a spreadsheet fill down and across'],
  ['Delete', 'empties the cells'],
  ['Ctrl Delete', 'deletes the parts'],
  ['Ctrl Z, Ctrl Shift Z', 'undo, do again'],
] as const;

/** What the keys do in the parts table. */
export function GridKeys() {
  return (
    <details className="text-sm text-ink-soft">
      <summary className="justify-self-start py-1 underline underline-offset-4">Keys of this table</summary>
      <dl className="grid gap-x-6 gap-y-1 py-2 sm:grid-cols-[12rem_minmax(0,1fr)]">
        {KEYS.map(([key, does]) => (
          <div key={key} className="contents">
            <dt className="font-mono text-ink">{key}</dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </details>
  );
}
