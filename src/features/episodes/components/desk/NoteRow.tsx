import { memo } from 'react';
import { Balloon } from '../../../../components/Balloon.tsx';
import { Button } from '../../../../components/Button.tsx';
import { joinClasses } from '../../../../components/join-classes.ts';
import { KindLabel } from '../../../../components/KindLabel.tsx';
import { formatClock } from '../../../../domain/time/format-clock.ts';
import { frameToSeconds } from '../../../../domain/time/frames.ts';
import { ConflictBox } from './ConflictBox.tsx';
import { type Row } from './desk-rows.ts';
import { placeAt } from './moment.ts';
import { NoteAnswer, NoteProposal } from './NoteAsk.tsx';
import { NoteEditor } from './NoteEditor.tsx';
import { mayChangeNote, sayInEdit, sayUnder } from './note-words.ts';
import { SavedMark } from './SavedMark.tsx';
import { useDesk } from './use-desk.ts';
import { withKind } from './composer-draft.ts';

type NoteRowProps = {
  readonly row: Row<'note'>;
  /** It holds at the moment on screen. */
  readonly current: boolean;
};

/** A note in the list: read, and opened for changing in its place. */
export const NoteRow = memo(function NoteRow({ row, current }: NoteRowProps) {
  const desk = useDesk();
  const { data, clock, marked, mark, editing, setEditing, remove, sending, stalled, setDraft } = desk;
  const { id, form, stored } = row;
  const note = stored?.note ?? null;
  const at = placeAt(form.position, clock.rate);
  const clockOf = (frame: number) => formatClock(frameToSeconds(frame, clock.rate));
  const may = mayChangeNote(form, note, data);
  const open = editing === id && may && !row.gone;
  const name = `the note at ${clockOf(at.frame)}`;
  return (
    <li
      id={`note-${id}`}
      data-current={current ? '' : undefined}
      aria-current={current ? 'true' : undefined}
      className={joinClasses(
        'scroll-mt-40 border-s-4 border-b border-b-line',
        // Rows out of sight are not laid out or painted while something else is typed.
        '[contain-intrinsic-block-size:auto_4.5rem] [content-visibility:auto]',
        marked === id ? 'border-s-brass' : 'border-s-transparent',
        current && 'bg-dye-wash',
      )}
    >
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1 px-3 py-2.5">
        <button
          type="button"
          className="min-h-7 min-w-14 text-start font-mono font-semibold text-dye hover:underline"
          onClick={() => {
            clock.seek(at.frame);
            mark(id);
          }}
        >
          <span className="sr-only">Go to </span>
          {clockOf(at.frame)}
          {at.endFrame !== null && (
            <span className="block text-xs font-normal text-ink-soft">to {clockOf(at.endFrame)}</span>
          )}
        </button>
        <span className="basis-16">
          <KindLabel kind={form.kind} />
        </span>
        <div className="grid min-w-0 flex-1 basis-52 gap-0.5">
          <p className="break-words whitespace-pre-line">
            {form.text === '' ? <span className="text-ink-soft">No words yet</span> : form.text}
          </p>
          <p className="text-sm text-ink-soft">
            {sayUnder(form, note, data)} <SavedMark row={row} sending={sending} stalled={stalled} />
          </p>
          {sayInEdit(stored?.place ?? null) !== '' && (
            <p className="text-sm text-brass-text">{sayInEdit(stored?.place ?? null)}</p>
          )}
          {note !== null && note.answer !== null && (
            <p className="border-s-4 border-verdigris ps-3">
              {note.asked?.name ?? 'They'} answered: {note.answer}
            </p>
          )}
        </div>
        <div className="flex flex-wrap justify-end gap-1">
          {form.partIds.map((partId) => {
            const part = data.parts.find((one) => one.id === partId);
            return (
              <Balloon
                key={partId}
                number={part?.number ?? null}
                name={part?.name}
                dashed={part?.inPlans === false}
                filled={current}
              />
            );
          })}
        </div>
        {data.mayChange && (
          <div className="ms-auto flex gap-1">
            {may ? (
              <>
                <Button
                  size="small"
                  variant="quiet"
                  aria-expanded={open}
                  aria-label={`${open ? 'Close' : 'Change'} ${name}`}
                  onClick={() => {
                    mark(id);
                    setEditing(open ? null : id);
                  }}
                >
                  {open ? 'Close' : 'Change'}
                </Button>
                <Button
                  size="small"
                  variant="quiet"
                  aria-label={`Delete ${name}`}
                  onClick={() => {
                    remove(row);
                  }}
                >
                  Delete
                </Button>
              </>
            ) : (
              <Button
                size="small"
                variant="quiet"
                aria-label={`Propose another text for ${name}`}
                onClick={() => {
                  const { position: _position, ...written } = form;
                  setDraft(() => ({ ...withKind(written, form.kind), at: at.frame }));
                }}
              >
                Propose another
              </Button>
            )}
          </div>
        )}
      </div>
      <div className="grid gap-2 px-3 not-empty:pb-3">
        {row.conflict !== null && <ConflictBox row={row} />}
        {note !== null && (
          <NoteProposal
            note={note}
            onDrop={() => {
              remove(row);
            }}
          />
        )}
        {note !== null && <NoteAnswer key={note.version} note={note} />}
      </div>
      {open && <NoteEditor row={row} />}
    </li>
  );
});
