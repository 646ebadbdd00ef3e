import { ApiError } from '../../../../client/call-api.ts';

/** What is waited before each further try, in seconds: a minute and a half together. */
const WAITS = [1, 2, 4, 8, 15, 30, 30];

/** Thrown when the tries are used up: nothing is lost, and a person has to say that it should go on. */
export class PatienceEnded extends Error {
  constructor() {
    super('The connection did not hold. What was sent is kept; go on when it is better.');
    this.name = 'PatienceEnded';
  }
}

/** What the storage answered to a part that it did not take. */
export class PartRefused extends Error {
  constructor(readonly status: number) {
    super(`The storage answered ${String(status)}.`);
  }
}

/**
 * Does something that needs the network: while there is none it waits as long as it takes; where there is one and
 * it fails, it tries again for a while.
 * @param onWaiting told true when it begins to wait for the network, false when it goes on
 * @throws PatienceEnded, or what trying again cannot mend
 */
export async function patiently<Result>(
  work: () => Promise<Result>,
  signal: AbortSignal | undefined,
  onWaiting: (waiting: boolean) => void,
): Promise<Result> {
  for (let failures = 0; ; failures += 1) {
    if (!navigator.onLine) {
      onWaiting(true);
      await onceOnline(signal);
      onWaiting(false);
      failures = 0;
    }
    try {
      return await work();
    } catch (error) {
      if (signal?.aborted === true || !mayPass(error)) throw error;
      const wait = WAITS[failures];
      // A request that broke because the network went away is no failure of the far end.
      if (!navigator.onLine) continue;
      if (wait === undefined) throw new PatienceEnded();
      await pause(wait * 1000, signal);
    }
  }
}

function mayPass(error: unknown): boolean {
  if (error instanceof ApiError) return error.status === 0 || error.status === 429 || error.status >= 500;
  if (error instanceof PartRefused) return error.status === 429 || error.status >= 500;
  // What fetch throws when nothing answered.
  return error instanceof TypeError;
}

function onceOnline(signal: AbortSignal | undefined): Promise<void> {
  return new Promise((resolve, reject) => {
    const stop = () => {
      reject(new DOMException('Stopped.', 'AbortError'));
    };
    signal?.addEventListener('abort', stop, { once: true });
    window.addEventListener(
      'online',
      () => {
        signal?.removeEventListener('abort', stop);
        resolve();
      },
      { once: true },
    );
  });
}

function pause(milliseconds: number, signal: AbortSignal | undefined): Promise<void> {
  return new Promise((resolve, reject) => {
    const timer = setTimeout(resolve, milliseconds);
    signal?.addEventListener(
      'abort',
      () => {
        clearTimeout(timer);
        reject(new DOMException('Stopped.', 'AbortError'));
      },
      { once: true },
    );
  });
}
