import { type ChangeEvent, useEffect, useRef, useState } from 'react';
import { Button } from '../../../components/Button.tsx';
import { Notice } from '../../../components/Notice.tsx';
import { Progress } from '../../../components/Progress.tsx';
import { callApi } from '../../../client/call-api.ts';
import { SLATE_STRETCH_SECONDS } from '../../../domain/footage/slate-instants.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { wallIn } from '../../../domain/time/wall-time.ts';
import { findSlates, type FoundSlate, slateToKeep } from './find-slates.ts';

interface SlateFinderProps {
  /** Where slates are kept. */
  readonly action: string;
  readonly name: string;
  /** The clip's own; null where its frames do not come at a constant rate. */
  readonly rate: Rate | null;
  /** How long the clip is; null where that is not known. */
  readonly seconds: number | null;
  /** Where its copy plays from; null for a clip that stays at home. */
  readonly film: string | null;
  readonly timeZone: string;
  /** What the slates that are kept already show, in milliseconds since 1970. */
  readonly known: readonly number[];
}

type State =
  | { readonly step: 'waiting' }
  | { readonly step: 'looking'; readonly looked: number; readonly all: number | null }
  | { readonly step: 'done'; readonly slates: readonly FoundSlate[]; readonly kept: number }
  | { readonly step: 'failed'; readonly problem: string; readonly kept: number };

/** Looks for clock slates in a clip's film by their codes, in the browser, and keeps what it finds. */
export function SlateFinder({ action, name, rate, seconds, film, timeZone, known }: SlateFinderProps) {
  const [state, setState] = useState<State>({ step: 'waiting' });
  const search = useRef<AbortController>(null);
  const knownNow = useRef(new Set(known));
  useEffect(() => () => search.current?.abort(), []);
  const find = async (address: string) => {
    const { signal } = (search.current = new AbortController());
    const set = (next: State) => {
      if (!signal.aborted) setState(next);
    };
    let kept = 0;
    try {
      set({ step: 'looking', looked: 0, all: null });
      const tell = (looked: number, all: number) => {
        set({ step: 'looking', looked, all });
      };
      const slates = await findSlates(address, { seconds, tell, signal });
      for (const slate of slates.filter(({ shopMs }) => !knownNow.current.has(shopMs))) {
        signal.throwIfAborted();
        await callApi(action, slateToKeep(slate, rate));
        knownNow.current.add(slate.shopMs);
        kept += 1;
      }
      set({ step: 'done', slates, kept });
    } catch (error) {
      set({ step: 'failed', problem: error instanceof Error ? error.message : String(error), kept });
    }
  };
  const choose = (event: ChangeEvent<HTMLInputElement>) => {
    const [file] = event.target.files ?? [];
    event.target.value = '';
    if (file === undefined) return;
    const address = URL.createObjectURL(file);
    void find(address).finally(() => {
      URL.revokeObjectURL(address);
    });
  };
  return (
    <div className="grid gap-3">
      {state.step === 'looking' ? (
        <>
          <Progress
            label="Looking for slates"
            {...(state.all !== null && {
              value: state.looked,
              max: state.all,
              detail: `${String(state.looked)} of ${String(state.all)} pictures`,
            })}
          />
          <p>
            <Button
              size="small"
              onClick={() => {
                search.current?.abort();
                setState({ step: 'waiting' });
              }}
            >
              Stop looking
            </Button>
          </p>
        </>
      ) : (
        <div className="flex flex-wrap items-center gap-3">
          {film !== null && <Button onClick={() => void find(film)}>Find the slates in this film</Button>}
          {(film === null || state.step === 'failed') && (
            <>
              <label className="inline-flex min-h-10 cursor-pointer items-center border border-dye bg-sheet px-4 py-1.5 font-bold text-dye focus-within:outline-2 hover:bg-dye-wash">
                Choose {name} to find its slates
                <input type="file" accept="video/*,.mp4,.mov,.mkv" onChange={choose} className="sr-only" />
              </label>
              <span className="text-sm text-ink-soft">It is not sent anywhere.</span>
            </>
          )}
        </div>
      )}
      {state.step === 'failed' && (
        <Notice tone="error" live title="It broke off.">
          {state.problem} {state.kept > 0 && 'One slate was kept. '}
          Choose the clip’s film on this computer, or type below what the slate shows.
        </Notice>
      )}
      {state.step === 'done' && state.slates.length === 0 && (
        <Notice
          tone="caution"
          live
          title={`No slate found in the first and last ${String(SLATE_STRETCH_SECONDS)} seconds.`}
        >
          Step to the frame and type what it shows.
        </Notice>
      )}
      {state.step === 'done' && state.slates.length > 0 && (
        <Notice
          tone="done"
          live
          title={state.kept === 0 ? 'Found, and known already.' : 'Found by its code, and kept.'}
          action={
            state.kept > 0 && (
              <Button
                size="small"
                onClick={() => {
                  location.reload();
                }}
              >
                Show the clip’s new time
              </Button>
            )
          }
        >
          {state.slates.map(({ seconds: at, shopMs }) => (
            <span key={shopMs} className="block font-mono">
              at {formatClock(at)}: {wallIn(timeZone, shopMs).replace('T', ' ')}
            </span>
          ))}
        </Notice>
      )}
    </div>
  );
}
