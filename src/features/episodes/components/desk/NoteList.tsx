import { memo } from 'react';
import { EmptyState } from '../../../../components/EmptyState.tsx';
import { effectiveEnd } from '../../../../domain/notes/note-place.ts';
import { type AnyRow } from './desk-rows.ts';
import { shown } from './desk-state.ts';
import { ConflictBox } from './ConflictBox.tsx';
import { placeAt } from './moment.ts';
import { NoteRow } from './NoteRow.tsx';
import { useClock, useDesk, useDeskState } from './use-desk.ts';

/** The notes in the order of the episode; those that hold at the moment on screen are marked. */
export const NoteList = memo(function NoteList() {
  const { clock, data } = useDesk();
  const state = useDeskState();
  const rows = shown(state, 'note');
  const places = rows.map(({ id, form }) => ({ id, ...placeAt(form.position, clock.rate) }));
  const holding = useClock(clock, (one) => {
    const now = one.now();
    return places
      .filter(({ frame, endFrame }) => {
        if (frame > now) return false;
        return now < effectiveEnd({ frame, endFrame }, places, one.rate);
      })
      .map(({ id }) => id)
      .join();
  });
  const current = new Set(holding.split(','));
  const team = rows.filter(({ form }) => form.audience !== 'viewers').length;
  return (
    <section id="notes" aria-labelledby="notes-title" className="border border-line bg-sheet">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-line px-4 py-3">
        <h2 id="notes-title" className="text-lg">
          Notes
        </h2>
        <p className="text-sm text-ink-soft">
          {rows.length} on this episode{team > 0 && `, ${String(team)} not for viewers`}
        </p>
      </div>
      <GoneConflicts rows={state.rows} />
      {rows.length === 0 ? (
        <div className="p-4">
          <EmptyState title="No note yet" level={3}>
            {data.mayChange
              ? 'Let the video run. Where something should be said, press N, or a digit for its kind, and write.'
              : 'What is said at a moment of the episode stands here.'}
          </EmptyState>
        </div>
      ) : (
        <ol>
          {rows.map((row) => (
            <NoteRow key={row.id} row={row} current={current.has(row.id)} />
          ))}
        </ol>
      )}
    </section>
  );
});

/** Rows that were deleted here while someone else changed them: the choice has to be somewhere in sight. */
function GoneConflicts({ rows }: { readonly rows: readonly AnyRow[] }) {
  return rows
    .filter(({ gone, conflict }) => gone && conflict !== null)
    .map((row) => <ConflictBox key={row.id} row={row} />);
}
