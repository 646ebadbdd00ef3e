import { type ReactNode, useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { INPUT_LOOK } from '../../../../components/FieldFrame.tsx';
import { useHydrated } from '../../../../components/use-hydrated.ts';
import { type HandRow, type ListedClip, moveRow, readRows, sayTotal, writeRows } from './hand-rows.ts';

/** Where the page keeps the clips that an edit is built from. */
export const HAND_CLIPS_ID = 'hand-clips';

/** Builds an edit from clips with in and out, in the place of the form's text of rows. */
export function HandEdit({ children }: { readonly children?: ReactNode }) {
  return useHydrated() ? <HandRows /> : <>{children}</>;
}

function listedClips(): readonly ListedClip[] {
  return JSON.parse(document.getElementById(HAND_CLIPS_ID)?.textContent ?? '[]') as ListedClip[];
}

/** The text that the form holds, read while it still stands in the page. */
function typedRows(clips: readonly ListedClip[]): readonly HandRow[] {
  return readRows(
    document.querySelector<HTMLTextAreaElement>('textarea[name="segments"]')?.value ?? '',
    clips,
  );
}

function HandRows() {
  const [clips] = useState(listedClips);
  const [rows, setRows] = useState(() => typedRows(clips));
  const change = (key: number, fields: Partial<HandRow>) => {
    setRows(rows.map((row) => (row.key === key ? { ...row, ...fields } : row)));
  };
  const add = () => {
    const key = Math.max(-1, ...rows.map((row) => row.key)) + 1;
    setRows([...rows, { key, clip: clips[0]?.id ?? '', from: '', to: '' }]);
  };
  return (
    <div className="grid gap-3">
      <input type="hidden" name="segments" value={writeRows(rows)} />
      <ol className="grid gap-2">
        {rows.map((row, index) => (
          <li
            key={row.key}
            className="grid items-end gap-2 border border-line p-3 sm:grid-cols-[1fr_9rem_9rem_auto]"
          >
            <label className="grid gap-1 text-sm">
              Clip {index + 1}
              <select
                className={INPUT_LOOK}
                value={row.clip}
                onChange={(event) => {
                  change(row.key, { clip: event.target.value });
                }}
              >
                {clips.map(({ id, label }) => (
                  <option key={id} value={id}>
                    {label}
                  </option>
                ))}
              </select>
            </label>
            {(['from', 'to'] as const).map((end) => (
              <label key={end} className="grid gap-1 text-sm">
                {end === 'from' ? 'In' : 'Out'}
                <input
                  className={`${INPUT_LOOK} font-mono`}
                  value={row[end]}
                  placeholder="00:00:31:20"
                  onChange={(event) => {
                    change(row.key, { [end]: event.target.value });
                  }}
                />
              </label>
            ))}
            <span className="flex flex-wrap gap-1">
              <Button
                size="small"
                disabled={index === 0}
                aria-label={`Move clip ${String(index + 1)} up`}
                onClick={() => {
                  setRows(moveRow(rows, index, -1));
                }}
              >
                Up
              </Button>
              <Button
                size="small"
                disabled={index === rows.length - 1}
                aria-label={`Move clip ${String(index + 1)} down`}
                onClick={() => {
                  setRows(moveRow(rows, index, 1));
                }}
              >
                Down
              </Button>
              <Button
                size="small"
                variant="danger"
                aria-label={`Take clip ${String(index + 1)} out`}
                onClick={() => {
                  setRows(rows.filter(({ key }) => key !== row.key));
                }}
              >
                Out
              </Button>
            </span>
          </li>
        ))}
      </ol>
      <p className="flex flex-wrap items-center gap-4">
        <Button onClick={add}>Add a segment</Button>
        <span aria-live="polite" className="font-mono text-sm">
          {sayTotal(rows, clips)}
        </span>
      </p>
    </div>
  );
}
