import { Button } from '../../../../components/Button.tsx';
import { Progress } from '../../../../components/Progress.tsx';
import { saySituation, sayConfirmed, type SentFile, situationOf } from './upload-state.ts';

type UploadRowProps = {
  readonly name: string;
  readonly file: SentFile;
  readonly onPause: () => void;
  readonly onGoOn: () => void;
  readonly onGiveUp: () => void;
};

/** One file that is being sent: how much of it the storage has, and what can be done. */
export function UploadRow({ name, file, onPause, onGoOn, onGiveUp }: UploadRowProps) {
  const situation = situationOf(file);
  const still = situation === 'paused' || situation === 'stopped';
  return (
    <li className="grid gap-2 border-b border-line px-4 py-3 last:border-b-0">
      <Progress label={name} value={file.confirmed} max={file.bytes} detail={sayConfirmed(file)} />
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
        <p role="status" className={situation === 'stopped' ? 'text-primer' : 'text-sm text-ink-soft'}>
          {saySituation(file)}
        </p>
        {situation !== 'finishing' && (
          <div className="flex flex-wrap gap-2">
            {still ? (
              <Button size="small" onClick={onGoOn} aria-label={`Go on sending ${name}`}>
                Go on
              </Button>
            ) : (
              <Button size="small" onClick={onPause} aria-label={`Pause sending ${name}`}>
                Pause
              </Button>
            )}
            <Button
              size="small"
              variant="danger"
              onClick={onGiveUp}
              aria-label={`Stop sending ${name} and throw away what was sent`}
            >
              Stop and throw away
            </Button>
          </div>
        )}
      </div>
    </li>
  );
}
