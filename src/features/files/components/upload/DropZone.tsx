import { useId, useState } from 'react';
import { joinClasses } from '../../../../components/join-classes.ts';

/** Where files are dropped, with a button for those who do not drop. */
export function DropZone({ onFiles }: { readonly onFiles: (files: readonly File[]) => void }) {
  const inputId = useId();
  const [over, setOver] = useState(false);
  return (
    // eslint-disable-next-line jsx-a11y/no-static-element-interactions -- Dropping is a shortcut of the pointer; the button inside is the way for everyone.
    <div
      className={joinClasses(
        'flex flex-wrap items-center gap-x-6 gap-y-3 border border-dashed px-4 py-6',
        over ? 'border-brass bg-brass-wash' : 'border-line-strong bg-sheet',
      )}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => {
        setOver(false);
      }}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        onFiles([...event.dataTransfer.files]);
      }}
    >
      <label
        htmlFor={inputId}
        className="inline-flex min-h-10 cursor-pointer items-center border border-dye bg-dye px-4 py-1.5 font-bold text-on-dye focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-brass hover:bg-dye-deep"
      >
        Choose files…
        <input
          id={inputId}
          type="file"
          multiple
          className="sr-only"
          onChange={(event) => {
            onFiles([...(event.target.files ?? [])]);
            event.target.value = '';
          }}
        />
      </label>
      <p className="min-w-0 flex-1 basis-64 text-ink-soft">
        {over
          ? 'Let go to send them.'
          : 'Or drop clips, photos and sound here. They go straight to storage in parts; a lost connection costs one part at most.'}
      </p>
    </div>
  );
}
