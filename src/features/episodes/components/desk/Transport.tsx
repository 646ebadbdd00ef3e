import { useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { INPUT_LOOK } from '../../../../components/FieldFrame.tsx';
import { parseClock } from '../../../../domain/time/parse-clock.ts';
import { secondsToFrame } from '../../../../domain/time/frames.ts';
import { NO_MARKS, setMark } from './composer-draft.ts';
import { formatMoment, framesIn } from './moment.ts';
import { type StepSize } from '../../../../client/note-keys.ts';
import { useClock, useDesk } from './use-desk.ts';

const STEPS: readonly (readonly [by: 1 | -1, size: StepSize, label: string, said: string])[] = [
  [-1, 'ten', '−10 s', 'Ten seconds back'],
  [-1, 'second', '−1 s', 'One second back'],
  [-1, 'frame', '−1 f', 'One frame back'],
  [1, 'frame', '+1 f', 'One frame on'],
  [1, 'second', '+1 s', 'One second on'],
  [1, 'ten', '+10 s', 'Ten seconds on'],
];

/** The moment on screen, and every way to another one that needs no dragging. */
export function Transport() {
  const { clock, marks, setMarks, data } = useDesk();
  const now = useClock(clock, (one) => one.now());
  const length = useClock(clock, (one) => one.length());
  const player = useClock(clock, (one) => one.player());
  const at = (frame: number | null) => (frame === null ? '–' : formatMoment(frame, clock.rate));
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2 border border-line bg-sheet px-3 py-2">
      <p className="min-w-28 font-mono text-lg leading-tight font-semibold text-brass-text">
        <span className="sr-only">Moment on screen: </span>
        {at(now)}
        <span className="block text-xs font-normal text-ink-soft">
          {length === null ? 'length not known' : `of ${at(length)}`}
        </span>
      </p>
      <div className="flex flex-wrap gap-1">
        {player !== null && player.toggle !== null && (
          <Button size="small" variant="primary" onClick={player.toggle}>
            Play or stop
          </Button>
        )}
        {STEPS.map(([by, size, label, said]) => (
          <Button
            key={label}
            size="small"
            className="px-2 font-mono"
            aria-label={said}
            onClick={() => {
              clock.seek(clock.now() + by * framesIn(size, clock.rate));
            }}
          >
            {label}
          </Button>
        ))}
      </div>
      <GoTo />
      {data.mayChange && (
        <div className="flex flex-wrap items-center gap-1">
          {(['in', 'out'] as const).map((which) => (
            <Button
              key={which}
              size="small"
              variant={marks[which] === null ? 'plain' : 'brass'}
              onClick={() => {
                setMarks(setMark(marks, which, clock.now()));
              }}
            >
              {which === 'in' ? 'In' : 'Out'} <span className="font-mono">{at(marks[which])}</span>
            </Button>
          ))}
          {(marks.in !== null || marks.out !== null) && (
            <Button
              size="small"
              variant="quiet"
              onClick={() => {
                setMarks(NO_MARKS);
              }}
            >
              Forget them
            </Button>
          )}
        </div>
      )}
    </div>
  );
}

/** Goes to a time that is typed. */
function GoTo() {
  const { clock } = useDesk();
  const [text, setText] = useState('');
  const [wrong, setWrong] = useState(false);
  return (
    <form
      noValidate
      className="flex items-center gap-1"
      onSubmit={(event) => {
        event.preventDefault();
        const seconds = parseClock(text);
        setWrong(!seconds.ok);
        if (!seconds.ok) return;
        clock.seek(secondsToFrame(seconds.value, clock.rate));
        setText('');
      }}
    >
      <span className="w-20">
        <input
          aria-label="Go to a time, such as 3:41"
          aria-invalid={wrong}
          placeholder="3:41"
          value={text}
          className={`${INPUT_LOOK} min-h-8 font-mono text-sm`}
          onChange={(event) => {
            setText(event.target.value);
            setWrong(false);
          }}
        />
      </span>
      <Button size="small" type="submit">
        Go
      </Button>
    </form>
  );
}
