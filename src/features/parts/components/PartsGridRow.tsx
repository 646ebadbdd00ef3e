import { memo } from 'react';
import { Balloon } from '../../../components/Balloon.tsx';
import { PART_FIELDS, PART_LABELS, type PartField } from '../part.ts';
import { type PartTexts } from '../part-texts.ts';
import { CellEditor } from './CellEditor.tsx';
import { type CellErrors } from './parts-table-state.ts';
import { type RowMark, RowMarkSign } from './RowMarkSign.tsx';

/** Where something is being typed, and what stood there at first. */
export interface Typing {
  readonly id: string;
  readonly column: number;
  readonly text: string;
}

export type GridRowProps = {
  readonly id: string;
  readonly index: number;
  readonly texts: PartTexts;
  readonly errors: CellErrors;
  /** How it stands to what is stored; null for a row that nobody has touched. */
  readonly mark: RowMark | null;
  /** Where nothing has been typed yet. */
  readonly blank: boolean;
  /** The column of the cell that has the focus; -1 when it is in another row. */
  readonly active: number;
  /** The selected columns, from and to; -1 when nothing of the row is. */
  readonly left: number;
  readonly right: number;
  readonly typing: Typing | null;
  readonly onLeave: (text: string) => void;
};

/** One row of the parts table. Drawn again only when something of it changes. */
export const PartsGridRow = memo(function GridRow(props: GridRowProps) {
  const { id, index, texts, errors, mark, blank, active, left, right, typing, onLeave } = props;
  const saidOf = (field: PartField | '') => errors[field];
  return (
    <tr
      id={blank ? undefined : `part-${id}`}
      // The head is the first row.
      aria-rowindex={index + 2}
      data-blank={blank ? '' : undefined}
    >
      {PART_FIELDS.map((field, column) => {
        // What is said of the row as a whole stands at its number.
        const error = saidOf(field) ?? (field === 'number' ? saidOf('') : undefined);
        const errorId = `error-${id}-${field}`;
        const selected = column >= left && column <= right;
        return (
          <td
            key={field}
            role="gridcell"
            aria-colindex={column + 1}
            aria-selected={selected || undefined}
            aria-invalid={error === undefined ? undefined : true}
            aria-describedby={error === undefined ? undefined : errorId}
            tabIndex={active === column ? 0 : -1}
            data-at={`${String(index)},${String(column)}`}
            data-field={field}
            data-active={active === column ? '' : undefined}
            data-numeric={field === 'quantity' ? '' : undefined}
          >
            {typing?.column === column ? (
              <CellEditor
                label={`${PART_LABELS[field]} of ${blank ? 'a new part' : `part ${texts.number}`}`}
                text={typing.text}
                mono={field === 'number' || field === 'size' || field === 'quantity'}
                onLeave={onLeave}
              />
            ) : (
              <CellText field={field} texts={texts} blank={blank} />
            )}
            {field === 'number' && mark !== null && typing?.column !== column && <RowMarkSign mark={mark} />}
            {error !== undefined && (
              <span id={errorId} className="block max-w-40 text-sm font-medium whitespace-normal text-primer">
                {error}
              </span>
            )}
          </td>
        );
      })}
    </tr>
  );
}, sameRow);

function CellText({ field, texts, blank }: { field: PartField; texts: PartTexts; blank: boolean }) {
  if (field !== 'number') return texts[field];
  if (blank) return <span className="text-sm text-ink-soft">new part</span>;
  return (
    <Balloon
      number={texts.number === '' ? null : texts.number}
      dashed={texts.inPlans === 'no'}
      size="medium"
    />
  );
}

/** Errors are made anew at every look at the table: they are compared by what they say. */
function sameRow(before: GridRowProps, after: GridRowProps): boolean {
  return (Object.keys(after) as (keyof GridRowProps)[]).every((key) =>
    key === 'errors' && before.errors !== after.errors
      ? JSON.stringify(before.errors) === JSON.stringify(after.errors)
      : Object.is(before[key], after[key]),
  );
}
