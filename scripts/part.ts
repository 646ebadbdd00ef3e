import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { type Readable } from 'node:stream';
import { QUIET_ENVIRONMENT } from './run-command.mjs';
import { type Running, endProcess, watchEnd } from './running.ts';
import { Trouble } from './trouble.mjs';

/** Something that this copy runs and looks after. */
export type Part<T extends Running = Running> = {
  /** What reports call it. */
  readonly name: string;
  /**
   * Starts it and waits until it is ready.
   * @param onSpawn called as soon as there is a process to stop
   */
  readonly start: (onSpawn: (running: Running) => void) => Promise<T>;
};

/** A process of ours in Node. */
export type NodeProcess = Running & {
  /** What it said when it was ready. */
  readonly said: Readonly<Record<string, unknown>>;
  /** Settles when it has ended and its last line is printed. */
  readonly printed: Promise<void>;
};

export type NodePart = {
  readonly name: string;
  readonly args: readonly string[];
  readonly cwd: string;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** Prints a line of its output. */
  readonly print: (line: string) => void;
  /** For programs that cannot say `{ ready: true }` themselves. */
  readonly waitUntilReady?: (ended: Promise<string>) => Promise<void>;
};

const READY_WITHIN_MS = 120_000;
const STOP = [['SIGTERM', 15]] as const;

function printLines(stream: Readable | null, print: (line: string) => void): Promise<unknown> {
  if (!stream) return Promise.resolve();
  return once(createInterface({ input: stream }).on('line', print), 'close');
}

/** A process that runs in Node and tells by `process.send({ ready: true, … })` when it serves. */
export function nodePart({ name, args, cwd, env, print, waitUntilReady }: NodePart): Part<NodeProcess> {
  async function start(onSpawn: (running: Running) => void): Promise<NodeProcess> {
    // Told to end when this process dies, even before it listens for the channel's end.
    const child = spawn('setpriv', ['--pdeathsig', 'TERM', '--', process.execPath, ...args], {
      cwd,
      env: { ...env, ...QUIET_ENVIRONMENT },
      // A group of its own: Ctrl-C in the terminal reaches only the supervisor, which stops in order.
      detached: true,
      stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    });
    const printed = Promise.all([printLines(child.stdout, print), printLines(child.stderr, print)]);
    const ended = watchEnd(child);
    const running = { pid: child.pid, ended, stop: () => endProcess(child, ended, STOP) };
    onSpawn(running);
    const saysReady = new Promise<Record<string, unknown>>((resolve) => {
      child.on('message', (message: Record<string, unknown>) => {
        if (message['ready'] === true) resolve(message);
      });
    });
    let timer: NodeJS.Timeout | undefined;
    const tooLate = new Promise<string>((resolve) => {
      timer = setTimeout(resolve, READY_WITHIN_MS, 'did not become ready within two minutes');
    });
    const failed = Promise.race([ended, tooLate]).then((how): never => {
      throw new Trouble(`${name} ${how} before it was ready; what it said is above.`);
    });
    try {
      const ready = waitUntilReady ? waitUntilReady(ended).then(() => ({})) : saysReady;
      const said = await Promise.race([ready, failed]);
      return { ...running, said, printed: printed.then(() => undefined) };
    } catch (error) {
      await running.stop();
      throw error;
    } finally {
      clearTimeout(timer);
      failed.catch(() => undefined);
    }
  }
  return { name, start };
}
