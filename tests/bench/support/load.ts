import { execFile, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** The core that servers run on, and the one that asks them. */
export const SERVER_CORE = '0';
const LOAD_CORE = '1';

/** Starts a program on the servers' core. Its errors are shown. */
export function startOnServerCore(command: string, args: readonly string[]): ChildProcess {
  return spawn('taskset', ['-c', SERVER_CORE, command, ...args], { stdio: ['ignore', 'pipe', 'inherit'] });
}

/** Ends a process that `startOnServerCore` started, and waits for it. */
export async function endProcess(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = once(child, 'exit');
  child.kill('SIGTERM');
  await gone;
}

/** Waits until an address answers. @throws after ten seconds */
export async function untilAnswering(url: string): Promise<void> {
  for (let tries = 0; tries < 100; tries += 1) {
    try {
      await fetch(url, { signal: AbortSignal.timeout(1_000) });
      return;
    } catch {
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
  throw new Error(`Nothing answers at ${url}.`);
}

/** Linux counts processor time in hundredths of a second. */
const TICKS_A_SECOND = 100;

/** Processor seconds that a process and its children have used. */
function processorSeconds(pid: number): number {
  const stat = readFileSync(`/proc/${String(pid)}/stat`, 'utf8');
  // The name, in brackets, may hold spaces; user and system time are the 12th and 13th fields after it.
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  const own = (Number(fields[11]) + Number(fields[12])) / TICKS_A_SECOND;
  const children = readFileSync(`/proc/${String(pid)}/task/${String(pid)}/children`, 'utf8').trim();
  return children
    .split(' ')
    .reduce((sum, child) => (child === '' ? sum : sum + processorSeconds(Number(child))), own);
}

export type Load = {
  /** The server, started by `startOnServerCore`. */
  readonly server: ChildProcess;
  readonly url: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly seconds: number;
  readonly connections: number;
};

export type Rates = {
  readonly requestsPerSecond: number;
  /** What the server would reach if its core had nothing else to do; other load on the machine hardly matters. */
  readonly requestsPerProcessorSecond: number;
};

/**
 * Asks for one address over and over from the other core.
 * @throws when a request fails
 */
export async function measure({ server, url, headers, seconds, connections }: Load): Promise<Rates> {
  const given = Object.entries(headers).flatMap(([name, value]) => ['-H', `${name}: ${value}`]);
  const size = ['-t', '1', '-c', String(connections), '-d', `${String(seconds)}s`];
  const before = processorSeconds(server.pid ?? 0);
  const { stdout } = await run('taskset', ['-c', LOAD_CORE, 'wrk', ...size, ...given, url], {
    timeout: (seconds + 10) * 1_000,
  });
  const used = processorSeconds(server.pid ?? 0) - before;
  if (/Non-2xx|Socket errors/.test(stdout)) throw new Error(`Requests failed:\n${stdout}`);
  const [, rate] = /Requests\/sec:\s+([\d.]+)/.exec(stdout) ?? [];
  const [, count] = /(\d+) requests in/.exec(stdout) ?? [];
  if (rate === undefined || count === undefined) throw new Error(`No rate in:\n${stdout}`);
  return { requestsPerSecond: Number(rate), requestsPerProcessorSecond: Number(count) / used };
}
