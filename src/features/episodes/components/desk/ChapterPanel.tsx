import { memo } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { INPUT_LOOK } from '../../../../components/FieldFrame.tsx';
import { formatClock } from '../../../../domain/time/format-clock.ts';
import { frameToSeconds } from '../../../../domain/time/frames.ts';
import { CHAPTER_TITLE_LENGTH } from '../../episode.ts';
import { ConflictBox } from './ConflictBox.tsx';
import { type Row } from './desk-rows.ts';
import { shown } from './desk-state.ts';
import { movedTo, placeAt } from './moment.ts';
import { SavedMark } from './SavedMark.tsx';
import { useDesk, useDeskState } from './use-desk.ts';

/** The chapters, each renamed where it stands. */
export const ChapterPanel = memo(function ChapterPanel({ onAdd }: { readonly onAdd: () => void }) {
  const { data } = useDesk();
  const state = useDeskState();
  const rows = shown(state, 'chapter');
  return (
    <section id="chapters" aria-labelledby="chapters-title" className="border border-line bg-sheet">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 border-b border-line px-4 py-2">
        <h2 id="chapters-title" className="text-lg">
          Chapters
        </h2>
        {data.mayChange && (
          <Button size="small" onClick={onAdd}>
            Chapter from here
          </Button>
        )}
      </div>
      {rows.length === 0 ? (
        <p className="px-4 py-3 text-ink-soft">
          None yet. The first begins at 0:00; video hosts show them from three on.
        </p>
      ) : (
        <ol>
          {rows.map((row) => (
            <ChapterLine key={row.id} row={row} />
          ))}
        </ol>
      )}
    </section>
  );
});

function ChapterLine({ row }: { readonly row: Row<'chapter'> }) {
  const { clock, data, edit, leave, remove, sending, stalled } = useDesk();
  const { id, form } = row;
  const { frame } = placeAt(form.position, clock.rate);
  const at = formatClock(frameToSeconds(frame, clock.rate));
  return (
    <li className="grid gap-2 border-b border-line px-3 py-2 last:border-b-0">
      <div className="flex flex-wrap items-center gap-2">
        <button
          type="button"
          className="min-h-7 min-w-12 text-start font-mono font-semibold text-dye hover:underline"
          onClick={() => {
            clock.seek(frame);
          }}
        >
          <span className="sr-only">Go to </span>
          {at}
        </button>
        {data.mayChange ? (
          <>
            <input
              id={`chapter-${id}`}
              aria-label={`Title of the chapter at ${at}`}
              className={`${INPUT_LOOK} min-h-8 flex-1 basis-40`}
              maxLength={CHAPTER_TITLE_LENGTH}
              value={form.title}
              onChange={(event) => {
                edit(id, { title: event.target.value }, 'Rename a chapter', `title ${id}`);
              }}
              onBlur={leave}
              onKeyDown={(event) => {
                if (event.key === 'Enter') event.currentTarget.blur();
              }}
            />
            <Button
              size="small"
              variant="quiet"
              aria-label={`Move the chapter at ${at} to the moment on screen`}
              onClick={() => {
                const { position } = form;
                edit(id, { position: movedTo(position, clock.now(), clock.rate) }, 'Move a chapter');
              }}
            >
              Move here
            </Button>
            <Button
              size="small"
              variant="quiet"
              aria-label={`Delete the chapter at ${at}`}
              onClick={() => {
                remove(row);
              }}
            >
              Delete
            </Button>
          </>
        ) : (
          <span>{form.title}</span>
        )}
        <SavedMark row={row} sending={sending} stalled={stalled} />
      </div>
      {row.conflict !== null && <ConflictBox row={row} />}
    </li>
  );
}
