import { useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { joinClasses } from '../../../../components/join-classes.ts';
import { isBegun, NO_MARKS, placeOfDraft, stretchOf } from './composer-draft.ts';
import { formatMoment } from './moment.ts';
import { NoteFields } from './NoteFields.tsx';
import { useClock, useDesk, useDeskDraft } from './use-desk.ts';

export const COMPOSER = 'new-note';

type ComposerProps = {
  /** On a narrow screen it is a sheet that comes up. */
  readonly open: boolean;
  readonly onClose: () => void;
};

/** A new note, at the moment on screen or from in to out. */
export function Composer({ open, onClose }: ComposerProps) {
  const { data, clock, setDraft, marks, setMarks, stalled } = useDesk();
  const { draft, saveDraft } = useDeskDraft();
  const [tried, setTried] = useState(false);
  const now = useClock(clock, (one) => one.now());
  const place = placeOfDraft(draft, marks, now, clock.rate);
  const errors = tried ? faults() : {};

  function faults(): Record<string, string> {
    return {
      ...(draft.text.trim() === '' && { text: 'Write what the note says.' }),
      ...(draft.audience === 'person' && draft.askedId === null && { askedId: 'Choose who is asked.' }),
    };
  }

  function save(): void {
    const wrong = Object.keys(faults()).length > 0;
    setTried(wrong);
    if (!wrong) saveDraft();
  }

  return (
    <section
      aria-labelledby="composer-title"
      className={joinClasses(
        'border border-t-4 border-line border-t-brass bg-sheet',
        'max-lg:fixed max-lg:inset-x-0 max-lg:bottom-0 max-lg:z-10 max-lg:max-h-[80dvh] max-lg:overflow-y-auto',
        !open && 'max-lg:hidden',
      )}
    >
      <div className="flex flex-wrap items-baseline justify-between gap-2 border-b border-line px-4 py-2">
        <h2 id="composer-title" className="text-lg">
          New note
        </h2>
        <p className="font-mono font-semibold text-brass-text">
          {formatMoment(place.frame, clock.rate)}
          {place.endFrame !== null && ` to ${formatMoment(place.endFrame, clock.rate)}`}
        </p>
      </div>
      <div className="grid gap-3 px-4 py-3">
        <NoteFields
          name={COMPOSER}
          data={data}
          note={draft}
          errors={errors}
          onChange={(fields) => {
            setDraft((before) => ({ ...before, at: before.at ?? now, ...fields }));
          }}
          onSave={save}
        />
        <div className="flex flex-wrap items-center gap-2">
          <Button variant="primary" onClick={save}>
            Save the note
          </Button>
          <kbd className="text-sm text-ink-soft max-lg:hidden">Ctrl Enter</kbd>
          {(draft.at !== null || stretchOf(marks, clock.rate) !== null) && (
            <Button
              variant="quiet"
              size="small"
              onClick={() => {
                setMarks(NO_MARKS);
                setDraft((before) => ({ ...before, at: clock.now() }));
              }}
            >
              Put it at the moment on screen
            </Button>
          )}
          <Button className="lg:hidden" size="small" onClick={onClose}>
            Close
          </Button>
        </div>
        {isBegun(draft) && (
          <p className="text-sm text-ink-soft" role="status">
            {stalled
              ? 'No connection. What you are writing is kept in this tab.'
              : 'Not saved yet; kept in this tab.'}
          </p>
        )}
      </div>
    </section>
  );
}
