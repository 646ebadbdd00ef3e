import { BothTexts } from '../../../components/BothTexts.tsx';
import { Button } from '../../../components/Button.tsx';
import { findDifferences } from '../../../components/find-differences.ts';
import { PART_LABELS } from '../part.ts';
import { textsOf } from '../part-texts.ts';
import { type TableRow } from './parts-table-state.ts';

type ConflictListProps = {
  readonly rows: readonly TableRow[];
  readonly onSettle: (id: string, choice: 'mine' | 'theirs') => void;
};

/** Rows that someone else saved meanwhile: both texts, and the choice between them. */
export function ConflictList({ rows, onSettle }: ConflictListProps) {
  return (
    <ul className="grid gap-4">
      {rows.map(({ id, texts, gone, conflict }) =>
        conflict === null ? null : (
          <li key={id} role="alert" className="grid gap-3 border border-primer bg-primer-wash p-4">
            <p>
              <strong>Part {conflict.part.number}</strong> was {conflict.gone ? 'deleted' : 'saved'} by
              someone else in the meantime{gone ? ', and you deleted it' : ''}. Both versions are kept; choose
              one.
            </p>
            <BothTexts differences={findDifferences(PART_LABELS, texts, textsOf(conflict.part))} />
            <div className="flex flex-wrap gap-2">
              <Button
                size="small"
                onClick={() => {
                  onSettle(id, 'mine');
                }}
              >
                {gone ? 'Delete it' : 'Take what I entered'}
              </Button>
              <Button
                size="small"
                onClick={() => {
                  onSettle(id, 'theirs');
                }}
              >
                {conflict.gone ? 'Leave it deleted' : 'Take what is stored'}
              </Button>
            </div>
          </li>
        ),
      )}
    </ul>
  );
}
