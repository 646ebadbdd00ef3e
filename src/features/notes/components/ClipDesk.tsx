import { type ChangeEvent, type KeyboardEvent, useEffect, useRef, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { Button } from '../../../components/Button.tsx';
import { KindLabel } from '../../../components/KindLabel.tsx';
import { NOTE_KINDS as LOOKS } from '../../../components/note-kind.ts';
import { Notice } from '../../../components/Notice.tsx';
import { NOTE_KINDS, type NoteKind } from '../../../domain/note-kinds.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { type FootageNote } from '../footage-note.ts';
import { saveClipNote, undoClipNote } from './save-clip-note.ts';
import { sayClipTime } from './say-clip-time.ts';
import { useClipPlayer } from './use-clip-player.ts';

export interface ClipDeskProps {
  readonly workshop: string;
  readonly build: string;
  readonly clip: string;
  readonly name: string;
  /** In which notes are counted on it. */
  readonly rate: Rate;
  /** Where its copy plays from; null for a clip that stays at home. */
  readonly film: string | null;
  readonly notes: readonly FootageNote[];
  readonly mayChange: boolean;
}

/** A clip beside its notes: they are made while it plays, by keyboard. */
export function ClipDesk({
  workshop,
  build,
  clip,
  name,
  rate,
  film,
  notes: stored,
  mayChange,
}: ClipDeskProps) {
  const [notes, setNotes] = useState(stored);
  const [local, setLocal] = useState<string | null>(null);
  const [kind, setKind] = useState<NoteKind>('step');
  const [text, setText] = useState('');
  const [changed, setChanged] = useState<FootageNote | null>(null);
  const [deleted, setDeleted] = useState<FootageNote | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const field = useRef<HTMLTextAreaElement>(null);
  const address = local ?? film;
  const { video, frame, seek } = useClipPlayer(address, rate, (command) => {
    if (command.do === 'kind') setKind(command.kind);
    if (command.do === 'note' || command.do === 'kind') field.current?.focus();
    if (command.do === 'leave') (document.activeElement as HTMLElement | null)?.blur();
  });
  useEffect(
    () => () => {
      if (local !== null) URL.revokeObjectURL(local);
    },
    [local],
  );
  const of = { workshop, build, clip };
  const seconds = (frame * rate.den) / rate.num;
  const attempt = async (work: () => Promise<void>) => {
    setProblem(null);
    try {
      await work();
    } catch (error) {
      setProblem(error instanceof Error ? error.message : String(error));
    }
  };
  const save = () =>
    attempt(async () => {
      if (text.trim() === '') return;
      const was = changed;
      const id = was?.id ?? uuidv7();
      const { version } = await saveClipNote(of, { id, kind, text, frame, version: was?.version ?? null });
      const base = was ?? {
        audience: 'team' as const,
        writtenBy: null,
        at: null,
        clip,
        clipName: name,
        seconds,
      };
      const note = { ...base, id, version, kind, text: text.trim() };
      setNotes((all) =>
        [...all.filter((one) => one.id !== id), note].sort((a, b) => (a.seconds ?? 0) - (b.seconds ?? 0)),
      );
      setText('');
      setChanged(null);
      field.current?.blur();
    });
  const remove = (note: FootageNote) =>
    attempt(async () => {
      const { version } = await undoClipNote(of, note, 'delete');
      setNotes((all) => all.filter((one) => one.id !== note.id));
      setDeleted({ ...note, version });
    });
  const bringBack = (note: FootageNote) =>
    attempt(async () => {
      const { version } = await undoClipNote(of, note, 'restore');
      setNotes((all) => [...all, { ...note, version }].sort((a, b) => (a.seconds ?? 0) - (b.seconds ?? 0)));
      setDeleted(null);
    });
  return (
    <div className="grid gap-4">
      {address === null ? (
        <AtHome
          name={name}
          onChoose={(file) => {
            setLocal(URL.createObjectURL(file));
          }}
        />
      ) : (
        // Rushes have no captions; what is said in them is written down as notes.
        // eslint-disable-next-line jsx-a11y/media-has-caption
        <video
          ref={video}
          src={address}
          controls
          playsInline
          preload="metadata"
          className="bg-black w-full"
        />
      )}
      {mayChange && (
        <div className="grid gap-2 border border-line bg-sheet p-4">
          <p className="flex flex-wrap items-baseline justify-between gap-2">
            <span className="font-mono text-lg font-semibold text-brass-text">
              {sayClipTime(changed?.seconds ?? seconds)}
            </span>
            <span className="text-sm text-ink-soft">
              N: a note here · Space: play · , . one frame · Ctrl Enter: save
            </span>
          </p>
          <label className="grid gap-1 font-medium">
            Kind
            <select
              value={kind}
              className="min-h-10 border border-line-strong bg-sheet px-2 font-normal"
              onChange={(event) => {
                setKind(event.target.value as NoteKind);
              }}
            >
              {NOTE_KINDS.map((one) => (
                <option key={one} value={one}>
                  {LOOKS[one].label}
                </option>
              ))}
            </select>
          </label>
          <label className="grid gap-1 font-medium">
            What the note says
            <textarea
              ref={field}
              rows={3}
              value={text}
              className="border border-line-strong bg-sheet px-3 py-2 font-normal"
              onChange={(event) => {
                setText(event.target.value);
              }}
              onKeyDown={(event: KeyboardEvent) => {
                if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) void save();
              }}
            />
          </label>
          <div className="flex flex-wrap gap-2">
            <Button variant="primary" onClick={() => void save()}>
              {changed === null ? 'Add the note' : 'Save the note'}
            </Button>
            {changed !== null && (
              <Button
                variant="quiet"
                onClick={() => {
                  setChanged(null);
                  setText('');
                }}
              >
                Leave it as it was
              </Button>
            )}
          </div>
        </div>
      )}
      {problem !== null && (
        <Notice tone="error" live>
          {problem}
        </Notice>
      )}
      {deleted !== null && (
        <Notice
          live
          title="The note is deleted."
          action={
            <Button size="small" onClick={() => void bringBack(deleted)}>
              Undo
            </Button>
          }
        />
      )}
      <section aria-label="Notes on this clip" className="grid gap-2">
        <h2 className="text-lg">Notes on this clip</h2>
        {notes.length === 0 && <p className="text-ink-soft">None yet.</p>}
        <ol className="border-t border-line">
          {notes.map((note) => (
            <li key={note.id} className="grid gap-1 border-b border-line py-2">
              <p className="flex flex-wrap items-center gap-3">
                <button
                  type="button"
                  className="font-mono font-semibold link"
                  onClick={() => {
                    seek(note.seconds ?? 0);
                  }}
                >
                  {sayClipTime(note.seconds ?? 0)}
                </button>
                <KindLabel kind={note.kind} />
              </p>
              <p className="whitespace-pre-line">{note.text}</p>
              {mayChange && (
                <p className="flex flex-wrap gap-2">
                  <Button
                    size="small"
                    onClick={() => {
                      setChanged(note);
                      setKind(note.kind);
                      setText(note.text);
                      field.current?.focus();
                    }}
                  >
                    Change
                  </Button>
                  <Button size="small" variant="quiet" onClick={() => void remove(note)}>
                    Delete
                  </Button>
                </p>
              )}
            </li>
          ))}
        </ol>
      </section>
    </div>
  );
}

function AtHome({ name, onChoose }: { readonly name: string; readonly onChoose: (file: File) => void }) {
  return (
    <div className="grid justify-items-start gap-3 border border-dashed border-line-strong px-6 py-8">
      <p className="max-w-prose">
        This clip stays at home. Choose {name} again to play it here: it is not sent anywhere.
      </p>
      <input
        type="file"
        accept="video/*,.mp4,.mov,.mkv"
        aria-label={`Choose ${name} to play it`}
        className="max-w-full"
        onChange={(event: ChangeEvent<HTMLInputElement>) => {
          const [file] = event.target.files ?? [];
          if (file) onChoose(file);
        }}
      />
    </div>
  );
}
