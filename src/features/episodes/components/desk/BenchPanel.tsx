import { memo, useState } from 'react';
import { Balloon } from '../../../../components/Balloon.tsx';
import { Button } from '../../../../components/Button.tsx';
import { Combobox } from '../../../../components/Combobox.tsx';
import { NO_MARKS, stretchOf } from './composer-draft.ts';
import { shown } from './desk-state.ts';
import { placeAt, sayPlace } from './moment.ts';
import { SavedMark } from './SavedMark.tsx';
import { useDesk, useDeskState } from './use-desk.ts';

export const BENCH_PART = 'bench-part';

/** Parts put on the bench by hand, beside those that notes name. */
export const BenchPanel = memo(function BenchPanel() {
  const { data, clock, marks, setMarks, add, remove, sending, stalled } = useDesk();
  const state = useDeskState();
  const [partId, setPartId] = useState('');
  const [round, setRound] = useState(0);
  const rows = shown(state, 'appearance');
  const stretch = stretchOf(marks, clock.rate);
  const byId = new Map(data.parts.map((part) => [part.id, part]));
  return (
    <section id="parts" aria-labelledby="bench-title" className="border border-line bg-sheet">
      <h2 id="bench-title" className="border-b border-line px-4 py-2 text-lg">
        On the bench by hand
      </h2>
      <div className="grid gap-3 px-4 py-3">
        <p className="text-sm text-ink-soft">
          A part that a note names is on the bench by itself: as long as the note holds, or until the next one
          and at most 20 seconds.
        </p>
        {rows.length > 0 && (
          <ul className="grid gap-2">
            {rows.map((row) => {
              const part = byId.get(row.form.partId);
              return (
                <li key={row.id} className="flex flex-wrap items-center gap-2">
                  <Balloon number={part?.number ?? null} dashed={part?.inPlans === false} />
                  <span className="min-w-0 flex-1">{part?.name}</span>
                  <button
                    type="button"
                    className="min-h-7 font-mono font-semibold text-dye hover:underline"
                    onClick={() => {
                      clock.seek(placeAt(row.form.position, clock.rate).frame);
                    }}
                  >
                    {sayPlace(row.form.position)}
                  </button>
                  {data.mayChange && (
                    <Button
                      size="small"
                      variant="quiet"
                      aria-label={`Take ${part?.number ?? 'the part'} off the bench`}
                      onClick={() => {
                        remove(row);
                      }}
                    >
                      Take off
                    </Button>
                  )}
                  <SavedMark row={row} sending={sending} stalled={stalled} />
                </li>
              );
            })}
          </ul>
        )}
        {data.mayChange && (
          <form
            className="grid gap-2"
            onSubmit={(event) => {
              event.preventDefault();
              if (stretch === null || partId === '') return;
              add('appearance', { partId, position: stretch });
              setMarks(NO_MARKS);
              setPartId('');
              setRound((count) => count + 1);
            }}
          >
            <Combobox
              key={round}
              label="Part"
              name={BENCH_PART}
              id={BENCH_PART}
              required
              options={data.parts.map(({ id, number, name }) => ({ value: id, label: number, detail: name }))}
              onChange={setPartId}
            />
            <div>
              <Button
                type="submit"
                size="small"
                disabled={stretch === null || partId === ''}
                reason={stretch === null ? 'Set in and out first.' : 'Choose a part.'}
              >
                Put it on{stretch !== null && `, ${sayPlace(stretch)}`}
              </Button>
            </div>
          </form>
        )}
      </div>
    </section>
  );
});
