import { type Part } from './part.ts';
import { type Running } from './running.ts';
import { describe } from './trouble.mjs';

const MOST_CRASHES = 5;
const WITHIN_MS = 60_000;

/** A part that is started again when it ends by itself. */
export type KeptPart<T extends Running> = {
  /** Settles with the first start. */
  readonly started: Promise<T>;
  /** Ends it and starts it anew, for changed sources. */
  readonly restart: () => Promise<void>;
  /** Ends it for good. */
  readonly stop: () => Promise<void>;
};

/**
 * Starts a part and starts it again whenever it ends by itself, five times within a minute at most.
 * @param tell prints a report
 * @param giveUp called with a sentence when it keeps ending
 */
export function keepRunning<T extends Running>(
  part: Part<T>,
  tell: (line: string) => void,
  giveUp: (sentence: string) => void,
): KeptPart<T> {
  const crashes: number[] = [];
  let current: Running | undefined;
  let stopping = false;
  let asked = false;

  function start(): Promise<T> {
    return part.start((running) => {
      current = running;
      if (stopping) void running.stop();
    });
  }

  /** Counts a crash and pauses a little longer after each; false when it is one too many. */
  async function mayStartAgain(how: string): Promise<boolean> {
    crashes.push(Date.now());
    const recent = crashes.filter((at) => at > Date.now() - WITHIN_MS).length;
    if (recent >= MOST_CRASHES) {
      giveUp(`${part.name} ${how} for the ${String(recent)}th time within a minute; what it said is above.`);
      return false;
    }
    tell(`${part.name} ${how}; starting it again.`);
    await new Promise((resolve) => setTimeout(resolve, 100 * 2 ** recent));
    return !stopping;
  }

  async function watch(running: T): Promise<void> {
    let how = await running.ended;
    while (!stopping) {
      if (!asked && !(await mayStartAgain(how))) return;
      asked = false;
      try {
        const next = await start();
        tell(`${part.name} is running again.`);
        how = await next.ended;
      } catch (error) {
        how = `could not be started (${describe(error)})`;
      }
    }
  }

  const started = start();
  const watching = started.then(watch, () => undefined);
  return {
    started,
    restart: async () => {
      asked = true;
      await current?.stop();
    },
    stop: async () => {
      stopping = true;
      await current?.stop();
      await watching;
      await current?.stop();
    },
  };
}
