import { useEffect, useRef } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { faultsOf, type Row } from './desk-rows.ts';
import { formatMoment, framesIn, movedTo, movePlace, placeAt } from './moment.ts';
import { type StepSize } from '../../../../client/note-keys.ts';
import { NoteFields } from './NoteFields.tsx';
import { SavedMark } from './SavedMark.tsx';
import { useDesk } from './use-desk.ts';

const NUDGES: readonly (readonly [by: 1 | -1, size: StepSize, label: string, said: string])[] = [
  [-1, 'second', '−1 s', 'A second earlier'],
  [-1, 'frame', '−1 f', 'A frame earlier'],
  [1, 'frame', '+1 f', 'A frame later'],
  [1, 'second', '+1 s', 'A second later'],
];

/** A note that is open for changing. Everything is saved by itself, after a pause and on leaving a field. */
export function NoteEditor({ row }: { readonly row: Row<'note'> }) {
  const { data, clock, edit, leave, setEditing, sending, stalled } = useDesk();
  const place = useRef<HTMLDivElement>(null);
  const { id, form } = row;
  const at = placeAt(form.position, clock.rate);

  useEffect(() => {
    const words = place.current?.querySelector('textarea');
    words?.focus();
    words?.setSelectionRange(words.value.length, words.value.length);
  }, []);

  return (
    // eslint-disable-next-line jsx-a11y/no-static-element-interactions -- It only hears that a field in it is left.
    <div
      ref={place}
      className="grid gap-3 border-t border-line bg-ground px-3 py-3"
      onBlur={(event) => {
        if (event.target.matches('textarea, input, select')) leave();
      }}
    >
      <div className="flex flex-wrap items-center gap-1">
        <span className="pe-2 font-mono font-semibold">
          {formatMoment(at.frame, clock.rate)}
          {at.endFrame !== null && ` to ${formatMoment(at.endFrame, clock.rate)}`}
        </span>
        {NUDGES.map(([by, size, label, said]) => (
          <Button
            key={label}
            size="small"
            className="px-2 font-mono"
            aria-label={said}
            onClick={() => {
              const frames = by * framesIn(size, form.position.rate);
              edit(id, { position: movePlace(form.position, frames, null) }, 'Move a note', `place ${id}`);
            }}
          >
            {label}
          </Button>
        ))}
        <Button
          size="small"
          onClick={() => {
            edit(id, { position: movedTo(form.position, clock.now(), clock.rate) }, 'Move a note');
          }}
        >
          To the moment on screen
        </Button>
        {form.position.endFrame === null ? (
          <Button
            size="small"
            disabled={clock.now() <= at.frame}
            onClick={() => {
              const stretch = { frame: at.frame, endFrame: clock.now(), rate: clock.rate };
              edit(id, { position: stretch }, 'Give a note an end');
            }}
          >
            Until the moment on screen
          </Button>
        ) : (
          <Button
            size="small"
            onClick={() => {
              edit(id, { position: { ...form.position, endFrame: null } }, 'Take the end off a note');
            }}
          >
            No end
          </Button>
        )}
      </div>
      <NoteFields
        name={`note-${id}`}
        data={data}
        note={form}
        errors={{ ...row.refused?.fields, ...faultsOf(row) }}
        onChange={(fields) => {
          const typed = 'text' in fields && !('topic' in fields);
          edit(id, fields, 'Change a note', typed ? `text ${id}` : undefined);
        }}
        onSave={() => {
          leave();
          setEditing(null);
        }}
      />
      <div className="flex flex-wrap items-center gap-3">
        <Button
          size="small"
          variant="primary"
          onClick={() => {
            leave();
            setEditing(null);
          }}
        >
          Done
        </Button>
        <span role="status">
          <SavedMark row={row} sending={sending} stalled={stalled} always />
        </span>
      </div>
    </div>
  );
}
