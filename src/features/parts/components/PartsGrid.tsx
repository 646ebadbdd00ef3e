import { useEffect, useMemo, useRef, useState } from 'react';
import { Button } from '../../../components/Button.tsx';
import { Notice } from '../../../components/Notice.tsx';
import { type Part, PART_FIELDS, PART_LABELS } from '../part.ts';
import { sayCounts } from '../part-texts.ts';
import { type PartsOf } from '../queries.ts';
import { ConflictList } from './ConflictList.tsx';
import { GridKeys } from './GridKeys.tsx';
import { type Place } from './grid-keys.ts';
import { PartsGridRow } from './PartsGridRow.tsx';
import { countNumbers, errorsOf, isStored, settle } from './parts-table-saving.ts';
import { type CellErrors, startTable, type TableRow, touchedRows } from './parts-table-state.ts';
import { type RowMark } from './RowMarkSign.tsx';
import { useAutosave } from './use-autosave.ts';
import { usePartsGrid } from './use-parts-grid.ts';

/** A table element that is a grid: rows of cells that take the focus, as the ARIA pattern has it. */
const GRID = { role: 'grid', 'aria-label': 'Parts', 'aria-multiselectable': true } as const;

type PartsGridProps = { readonly of: PartsOf; readonly initial: readonly Part[] };

/** The parts list as a table that is typed in: every row is saved as soon as it is in order. */
export function PartsGrid({ of, initial }: PartsGridProps) {
  const [table, setTable] = useState(() => startTable(initial));
  const { sending, stalled } = useAutosave(of, initial, table, setTable);
  const grid = usePartsGrid(table, setTable);
  const { rows, blankId, at, block, typing } = grid;
  const body = useRef<HTMLTableElement>(null);
  const focused = useRef(false);

  useEffect(() => {
    // Typing puts the focus into its input; otherwise it follows the place, but is never taken from elsewhere.
    if (typing !== null || !focused.current) return;
    body.current?.querySelector<HTMLElement>(`[data-at="${String(at.row)},${String(at.column)}"]`)?.focus();
  }, [at.row, at.column, typing, rows.length]);

  const touched = useMemo(() => touchedRows(table), [table]);
  const numbers = useMemo(() => countNumbers(table.rows), [table]);
  const looks = rows.map((row, index) => lookOf(row, index === at.row && row.stored === null));
  const open = looks.filter(({ mark }) => mark === 'unsaved').length;
  const busy = sending.size > 0 || looks.some(({ mark }) => mark === 'waiting');
  const conflicts = table.rows.filter(({ conflict }) => conflict !== null);

  function lookOf(row: TableRow, begun: boolean): { errors: CellErrors; mark: RowMark | null } {
    if (row.id === blankId) return { errors: {}, mark: null };
    const all = errorsOf(row, numbers);
    // A row that is just being written is not scolded for what has not been written yet.
    const errors = begun
      ? Object.fromEntries(
          Object.entries(all).filter(
            ([field]) => (field !== 'name' && field !== 'number') || row.texts[field] !== '',
          ),
        )
      : all;
    if (row.conflict !== null) return { errors, mark: 'conflict' };
    if (sending.has(row.id)) return { errors, mark: 'saving' };
    if (isStored(row)) return { errors, mark: touched.has(row.id) ? 'saved' : null };
    return { errors, mark: Object.keys(all).length > 0 || stalled !== null ? 'unsaved' : 'waiting' };
  }

  const selected = grid.selectedIds().length;
  const kinds = rows.filter(({ id }) => id !== blankId).map(({ texts }) => texts.kind);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-3">
      {stalled !== null && (
        <Notice tone="error" live title="Not saved at the moment.">
          {stalled}
        </Notice>
      )}
      <div className="sticky top-0 z-10 flex flex-wrap items-center gap-2 bg-ground py-2">
        <Button size="small" disabled={table.done.length === 0} onClick={grid.stepBack}>
          Undo
        </Button>
        <Button size="small" disabled={table.undone.length === 0} onClick={grid.stepOn}>
          Do again
        </Button>
        <Button
          size="small"
          disabled={selected === 0}
          onClick={() => {
            grid.remove(grid.selectedIds());
          }}
        >
          {selected > 1 ? `Delete ${String(selected)} parts` : 'Delete the part'}
        </Button>
        <p className="px-2 text-sm">{sayCounts(kinds)}</p>
        <p role="status" className="ms-auto text-sm text-ink-soft">
          {grid.said} {sayState(busy, open, stalled !== null)}
        </p>
      </div>
      <div className="parts-frame">
        {/* Its role, in GRID, makes it interactive. */}
        {/* eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions */}
        <table
          {...GRID}
          ref={body}
          className="ruled-table parts-table parts-grid"
          aria-rowcount={rows.length + 1}
          aria-colcount={PART_FIELDS.length}
          onKeyDown={grid.onKeyDown}
          onCopy={grid.onCopy}
          onCut={grid.onCut}
          onPaste={grid.onPaste}
          onFocus={(event) => {
            focused.current = true;
            // Assistive tech puts the focus into cells by itself.
            const to = placeOf(event.target);
            if (to !== null && typing === null && (to.row !== at.row || to.column !== at.column)) grid.go(to);
          }}
          onBlur={(event) => {
            // The input of a cell that is taken goes away and leaves the focus nowhere: that is still here.
            if (event.relatedTarget !== null)
              focused.current = event.currentTarget.contains(event.relatedTarget);
          }}
          onMouseDown={(event) => {
            const to = placeOf(event.target);
            if (to === null || (typing !== null && to.row === at.row && to.column === at.column)) return;
            grid.go(to, event.shiftKey);
          }}
          onDoubleClick={(event) => {
            if (typing === null && placeOf(event.target) !== null) grid.begin();
          }}
          onClick={(event) => {
            // A finger that taps a cell wants to write in it: there are no keys to begin with.
            const byTouch =
              event.nativeEvent instanceof PointerEvent && event.nativeEvent.pointerType === 'touch';
            if (byTouch && typing === null && placeOf(event.target) !== null) grid.begin();
          }}
        >
          <thead>
            <tr aria-rowindex={1}>
              {PART_FIELDS.map((field) => (
                <th key={field} scope="col" data-numeric={field === 'quantity' ? '' : undefined}>
                  {PART_LABELS[field]}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <PartsGridRow
                key={row.id}
                id={row.id}
                index={index}
                texts={row.texts}
                errors={looks[index]?.errors ?? {}}
                mark={looks[index]?.mark ?? null}
                blank={row.id === blankId}
                active={index === at.row ? at.column : -1}
                left={index >= block.top && index <= block.bottom ? block.left : -1}
                right={index >= block.top && index <= block.bottom ? block.right : -1}
                typing={row.id === typing?.id ? typing : null}
                onLeave={index === at.row || row.id === typing?.id ? grid.takeTyped : nothing}
              />
            ))}
          </tbody>
        </table>
      </div>
      {/* In sight wherever in a long list one is. */}
      <div className="sticky bottom-0 z-10">
        <ConflictList
          rows={conflicts}
          onSettle={(id, choice) => {
            setTable((state) => settle(state, id, choice));
          }}
        />
      </div>
      <GridKeys />
    </div>
  );
}

const nothing = () => undefined;

/** The cell that something on screen belongs to. */
function placeOf(target: EventTarget): Place | null {
  const cell = target instanceof Element ? target.closest('[data-at]') : null;
  const [row, column] = cell?.getAttribute('data-at')?.split(',').map(Number) ?? [];
  return row === undefined || column === undefined ? null : { row, column };
}

function sayState(busy: boolean, open: number, stalled: boolean): string {
  if (stalled) return 'Not saved.';
  if (busy) return 'Saving …';
  if (open === 0) return 'Everything is saved.';
  return open === 1 ? 'One part is not saved yet.' : `${String(open)} parts are not saved yet.`;
}
