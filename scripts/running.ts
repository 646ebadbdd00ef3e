import { type ChildProcess } from 'node:child_process';

/** A process that runs as a part of this copy. */
export type Running = {
  readonly pid: number | undefined;
  /** Settles when it has ended, with how it ended in words. */
  readonly ended: Promise<string>;
  /** Ends it, in a bounded time. */
  readonly stop: () => Promise<void>;
};

/** How a process ends, in words. */
export function watchEnd(child: ChildProcess): Promise<string> {
  return new Promise((resolve) => {
    child.on('error', (error) => {
      resolve(`could not be started: ${error.message}`);
    });
    child.on('exit', (status, signal) => {
      resolve(signal === null ? `ended with status ${String(status)}` : `was ended by ${signal}`);
    });
  });
}

function within(ended: Promise<unknown>, seconds: number): Promise<boolean> {
  return new Promise((resolve) => {
    const timer = setTimeout(() => {
      resolve(false);
    }, seconds * 1000);
    void ended.then(() => {
      clearTimeout(timer);
      resolve(true);
    });
  });
}

/**
 * Ends a process that leads a group of its own: asks with each signal for so many seconds, then kills. What is
 * left of its group afterwards is killed too.
 */
export async function endProcess(
  child: ChildProcess,
  ended: Promise<unknown>,
  steps: readonly (readonly [signal: NodeJS.Signals, seconds: number])[],
): Promise<void> {
  const { pid } = child;
  if (pid === undefined) return;
  for (const [signal, seconds] of steps) {
    if (child.exitCode !== null || child.signalCode !== null) break;
    child.kill(signal);
    if (await within(ended, seconds)) break;
  }
  if (child.exitCode === null && child.signalCode === null) {
    child.kill('SIGKILL');
    await within(ended, 2);
  }
  try {
    process.kill(-pid, 'SIGKILL');
  } catch {
    // Nothing is left of the group.
  }
}
