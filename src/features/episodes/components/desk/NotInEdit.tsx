import { useMutation, useQueryClient } from '@tanstack/react-query';
import { memo, useState } from 'react';
import { ApiError } from '../../../../client/call-api.ts';
import { Button } from '../../../../components/Button.tsx';
import { Field } from '../../../../components/Field.tsx';
import { KindLabel } from '../../../../components/KindLabel.tsx';
import { Select } from '../../../../components/Select.tsx';
import { secondsToFrame } from '../../../../domain/time/frames.ts';
import { parseClock } from '../../../../domain/time/parse-clock.ts';
import { type Rate } from '../../../../domain/time/rate.ts';
import { type PlacedAnchor } from '../../../notes/note.ts';
import { deskQuery, placeNoteMutation } from '../../queries.ts';
import { type AnyRow, type Row } from './desk-rows.ts';
import { takeNote } from './desk-saving.ts';
import { lost } from './desk-state.ts';
import { mayChangeNote, sayWhyLost } from './note-words.ts';
import { SavedMark } from './SavedMark.tsx';
import { type DeskTools, useDesk, useDeskState } from './use-desk.ts';

interface Placed {
  readonly id: string;
  readonly text: string;
  readonly version: number;
  readonly before: PlacedAnchor | null;
}

/** What the episode's edit does not hold, with the segment that was dropped; each is placed by hand. */
export const NotInEdit = memo(function NotInEdit() {
  const [placed, setPlaced] = useState<Placed | null>(null);
  const rows = lost(useDeskState());
  if (rows.length === 0 && placed === null) return null;
  return (
    <section id="not-in-edit" aria-labelledby="not-in-edit-title" className="border border-line bg-sheet">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-line px-4 py-3">
        <h2 id="not-in-edit-title" className="text-lg">
          Not in this edit
        </h2>
        <p className="text-sm text-ink-soft">Viewers do not see these. They come back with their segment.</p>
      </div>
      {placed !== null && <PutBack placed={placed} onDone={setPlaced} />}
      <ul>
        {rows.map((row) => (
          <LostRow key={row.id} row={row} onPlaced={setPlaced} />
        ))}
      </ul>
    </section>
  );
});

function wordsOf(row: AnyRow, desk: DeskTools): string {
  if (row.what === 'note') return row.form.text;
  if (row.what === 'chapter') return `Chapter: ${row.form.title}`;
  const part = desk.data.parts.find(({ id }) => id === row.form.partId);
  return `On the bench: ${part === undefined ? 'a part' : `${part.number} ${part.name}`}`;
}

type LostRowProps = { readonly row: AnyRow; readonly onPlaced: (placed: Placed) => void };

function LostRow({ row, onPlaced }: LostRowProps) {
  const desk = useDesk();
  const { data, sending, stalled, remove } = desk;
  const [open, setOpen] = useState(false);
  const words = wordsOf(row, desk);
  const may = row.what === 'note' ? mayChangeNote(row.form, row.stored?.note ?? null, data) : data.mayChange;
  return (
    <li id={`note-${row.id}`} className="grid gap-2 border-b border-line px-4 py-2.5 last:border-b-0">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
        {row.what === 'note' && <KindLabel kind={row.form.kind} />}
        <div className="grid min-w-0 flex-1 basis-52 gap-0.5">
          <p className="break-words whitespace-pre-line">{words}</p>
          <p className="text-sm text-ink-soft">
            {sayWhyLost(row.stored?.place ?? null)}{' '}
            <SavedMark row={row} sending={sending} stalled={stalled} />
          </p>
        </div>
        {may && (
          <div className="ms-auto flex gap-1">
            <PlaceHere row={row} name={words} onPlaced={onPlaced} />
            {row.what === 'note' && (
              <Button
                size="small"
                variant="quiet"
                aria-expanded={open}
                aria-label={`${open ? 'Close' : 'Place elsewhere'}: ${words}`}
                onClick={() => {
                  setOpen(!open);
                }}
              >
                {open ? 'Close' : 'Elsewhere …'}
              </Button>
            )}
            <Button
              size="small"
              variant="quiet"
              aria-label={`Delete: ${words}`}
              onClick={() => {
                remove(row);
              }}
            >
              Delete
            </Button>
          </div>
        )}
      </div>
      {open && row.what === 'note' && <Elsewhere row={row} onPlaced={onPlaced} />}
    </li>
  );
}

type PlaceHereProps = LostRowProps & { readonly name: string };

/** At the moment on screen. */
function PlaceHere({ row, name, onPlaced }: PlaceHereProps) {
  const { clock, edit, data } = useDesk();
  const send = usePlacing(onPlaced);
  return (
    <Button
      size="small"
      variant="quiet"
      aria-label={`Place at the moment on screen: ${name}`}
      onClick={() => {
        const [frame, { rate }] = [clock.now(), clock];
        if (row.what === 'note') {
          const position = { frame, endFrame: null, rate };
          send.mutate({ row, anchor: { clock: 'episode', episode: data.episode, position } });
          return;
        }
        const length = Math.round((BENCH_SECONDS * rate.num) / rate.den);
        const endFrame = row.what === 'appearance' ? frame + length : null;
        edit(row.id, { position: { frame, endFrame, rate } }, 'Place by hand');
      }}
    >
      Place here
    </Button>
  );
}

/** How long a part that is placed again is on the bench, until somebody says otherwise. Our own choice. */
const BENCH_SECONDS = 20;

type ElsewhereProps = { readonly row: Row<'note'>; readonly onPlaced: (placed: Placed) => void };

/** On a clip, or in another episode of the build, at a time that is typed. */
function Elsewhere({ row, onPlaced }: ElsewhereProps) {
  const { data } = useDesk();
  const send = usePlacing(onPlaced);
  const [where, setWhere] = useState(row.stored?.place?.on?.id ?? '');
  const [at, setAt] = useState('');
  const [error, setError] = useState<string | undefined>();
  const options = [
    { value: '', label: 'Choose a clip or an episode' },
    ...data.clips.map(({ id, name }) => ({ value: id, label: name })),
    ...data.otherEpisodes.map(({ id, title }) => ({ value: id, label: `Episode: ${title}` })),
  ];
  function place(): void {
    const clip = data.clips.find(({ id }) => id === where);
    const episode = data.otherEpisodes.find(({ id }) => id === where);
    const time = parseClock(at);
    const to = clip ?? episode;
    setError(time.ok ? (to === undefined ? 'Choose where first.' : undefined) : time.error);
    if (!time.ok || to === undefined) return;
    const position = positionAt(time.value, to.rate);
    const anchor: PlacedAnchor =
      clip === undefined
        ? { clock: 'episode', episode: to.id, position }
        : { clock: 'clip', clip: to.id, position };
    send.mutate({ row, anchor });
  }
  return (
    <form
      className="flex flex-wrap items-end gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        place();
      }}
    >
      <Select
        label="Where"
        name={`where-${row.id}`}
        options={options}
        value={where}
        onChange={(event) => {
          setWhere(event.target.value);
        }}
      />
      <Field
        label="Time on it"
        name={`at-${row.id}`}
        mono
        value={at}
        error={error ?? (send.error instanceof ApiError ? send.error.message : undefined)}
        onChange={(event) => {
          setAt(event.target.value);
        }}
      />
      <Button type="submit" size="small" disabled={send.isPending}>
        Place it there
      </Button>
    </form>
  );
}

function positionAt(seconds: number, rate: Rate) {
  return { frame: secondsToFrame(seconds, rate), endFrame: null, rate };
}

type PutBackProps = {
  readonly placed: Placed;
  readonly onDone: (placed: Placed | null) => void;
};

function PutBack({ placed, onDone }: PutBackProps) {
  const { before } = placed;
  const send = usePlacing(() => {
    onDone(null);
  });
  return (
    <p role="status" className="flex flex-wrap items-center gap-3 border-b border-line px-4 py-2">
      <span className="min-w-0 flex-1">Placed: {placed.text}</span>
      {before !== null && (
        <Button
          size="small"
          onClick={() => {
            send.mutate({ row: placed, anchor: before });
          }}
        >
          Put it back
        </Button>
      )}
    </p>
  );
}

type Sent = {
  readonly row: Pick<AnyRow, 'id'> & {
    readonly version?: number;
    readonly stored?: { readonly version: number } | null;
  };
  readonly anchor: PlacedAnchor;
};

/** Says where a note was made, and takes in where that is in this edit. */
function usePlacing(onPlaced: (placed: Placed) => void) {
  const { data, change } = useDesk();
  const client = useQueryClient();
  const { mutationKey, mutationFn } = placeNoteMutation(data);
  return useMutation({
    mutationKey,
    mutationFn: ({ row, anchor }: Sent) =>
      mutationFn({ id: row.id, version: row.version ?? row.stored?.version ?? 1, anchor }),
    onSuccess: async ({ note, before }) => {
      change((state) => takeNote(state, note));
      onPlaced({ id: note.id, text: note.text, version: note.version, before });
      await client.invalidateQueries({ queryKey: deskQuery(data).queryKey });
    },
  });
}
