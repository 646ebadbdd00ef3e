import { type ChangeEvent, useState } from 'react';
import { Button } from '../../../components/Button.tsx';
import { Field } from '../../../components/Field.tsx';
import { Notice } from '../../../components/Notice.tsx';
import { Progress } from '../../../components/Progress.tsx';
import { paths } from '../../../paths.ts';
import { type FolderState, takeFilms } from './take-films.ts';

interface FolderReaderProps {
  readonly workshop: string;
  readonly build: string;
}

const NOTHING: FolderState = { step: 'waiting', read: 0, all: 0, added: 0, updated: 0, problems: [] };

/** Reads names, times, lengths and a small picture of the films in a folder, and sends nothing else. */
export function FolderReader({ workshop, build }: FolderReaderProps) {
  const [camera, setCamera] = useState('');
  const [rate, setRate] = useState('25');
  const [state, setState] = useState(NOTHING);
  const busy = state.step === 'reading';
  const choose = (event: ChangeEvent<HTMLInputElement>) => {
    const files = [...(event.target.files ?? [])];
    event.target.value = '';
    if (files.length > 0) void takeFilms({ workshop, build, camera: camera.trim(), rate }, files, setState);
  };
  return (
    <div className="grid gap-4">
      <p className="max-w-prose">
        Choose the folder of a card, or single clips. Their names, times and lengths and a small picture of
        each are sent; the films themselves never are.
      </p>
      <div className="grid max-w-2xl gap-4 sm:grid-cols-2">
        <Field
          label="Camera"
          name="folder-camera"
          hint="As you call it. Leave it empty for clips of several."
          value={camera}
          disabled={busy}
          onChange={(event) => {
            setCamera(event.target.value);
          }}
        />
        <Field
          label="Frame rate, where a file does not say"
          name="folder-rate"
          mono
          value={rate}
          disabled={busy}
          onChange={(event) => {
            setRate(event.target.value);
          }}
        />
      </div>
      <div className="flex flex-wrap gap-4">
        <Chooser label="Choose a folder" folder disabled={busy} onChange={choose} />
        <Chooser label="Choose clips" disabled={busy} onChange={choose} />
      </div>
      {busy && (
        <Progress
          label="Reading the clips"
          value={state.all === 0 ? 0 : Math.floor((100 * state.read) / state.all)}
          detail={`${String(state.read)} of ${String(state.all)}`}
        />
      )}
      {state.step === 'failed' && (
        <Notice tone="error" live title="It broke off.">
          {state.problems.at(-1)} {state.added} clips were kept; choose the folder again for the rest.
        </Notice>
      )}
      {state.step === 'done' && (
        <Notice
          tone={state.problems.length > 0 ? 'caution' : 'done'}
          live
          title={
            state.all === 0
              ? 'There is no film in it.'
              : `${String(state.added)} added, ${String(state.updated)} known already.`
          }
          action={<Button href={paths.footage(workshop, build)}>See them by day</Button>}
        >
          {state.problems.length > 0 && (
            <ul className="max-h-60 list-disc overflow-y-auto ps-5">
              {state.problems.map((problem) => (
                <li key={problem}>{problem}</li>
              ))}
            </ul>
          )}
        </Notice>
      )}
    </div>
  );
}

interface ChooserProps {
  readonly label: string;
  readonly folder?: boolean;
  readonly disabled: boolean;
  readonly onChange: (event: ChangeEvent<HTMLInputElement>) => void;
}

/** A file field whose label is the button. */
function Chooser({ label, folder = false, disabled, onChange }: ChooserProps) {
  return (
    <label className="inline-flex min-h-10 cursor-pointer items-center border border-dye bg-sheet px-4 py-1.5 font-bold text-dye focus-within:outline-2 hover:bg-dye-wash">
      {label}
      <input
        type="file"
        multiple
        accept={folder ? undefined : 'video/*,.mp4,.mov,.mkv'}
        disabled={disabled}
        onChange={onChange}
        className="sr-only"
        {...(folder && { webkitdirectory: '' })}
      />
    </label>
  );
}
