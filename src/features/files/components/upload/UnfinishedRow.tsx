import { useId, useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { sayBytes } from '../../../../domain/byte-sizes.ts';
import { type FileItem, UNFINISHED_DAYS } from '../../file.ts';
import { fingerprintOf } from './fingerprint.ts';

type UnfinishedRowProps = {
  readonly item: FileItem;
  /** The same file, chosen again. */
  readonly onChosen: (file: File, fingerprint: string) => void;
  readonly onGiveUp: () => void;
};

/** An upload that this page knows only by name: a reload took the file itself away. */
export function UnfinishedRow({ item, onChosen, onGiveUp }: UnfinishedRowProps) {
  const inputId = useId();
  const [wrong, setWrong] = useState<string | null>(null);

  async function compare(file: File) {
    const fingerprint = file.size === item.bytes ? await fingerprintOf(file) : null;
    if (fingerprint === item.fingerprint) {
      setWrong(null);
      // Its name may have changed on this side; the server knows it by the one it was announced under.
      onChosen(new File([file], item.name, { type: file.type }), fingerprint ?? '');
    } else {
      setWrong(`That is another file. Choose the ${item.name} of ${sayBytes(item.bytes)} that was begun.`);
    }
  }

  return (
    <li className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-line px-4 py-3 last:border-b-0">
      <div className="min-w-0">
        <p className="font-medium break-words">{item.name}</p>
        <p className="text-sm text-ink-soft">
          {sayBytes(item.bytes)}, not all of it sent. Choose the file again to go on; what was sent is kept
          for {UNFINISHED_DAYS} days.
        </p>
        {wrong !== null && (
          <p role="alert" className="text-sm text-primer">
            {wrong}
          </p>
        )}
      </div>
      <div className="flex flex-wrap gap-2">
        <label
          htmlFor={inputId}
          className="inline-flex min-h-8 cursor-pointer items-center border border-dye bg-sheet px-3 text-sm font-bold text-dye focus-within:outline-2 focus-within:outline-brass hover:bg-dye-wash"
        >
          Choose it again…
          <input
            id={inputId}
            type="file"
            className="sr-only"
            aria-label={`Choose ${item.name} again`}
            onChange={(event) => {
              const [file] = event.target.files ?? [];
              if (file) void compare(file);
              event.target.value = '';
            }}
          />
        </label>
        <Button
          size="small"
          variant="danger"
          onClick={onGiveUp}
          aria-label={`Throw away what was sent of ${item.name}`}
        >
          Throw away
        </Button>
      </div>
    </li>
  );
}
