import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { BUCKET, CREDENTIALS, REGION } from './stand-in.ts';

const root = new URL('../../../', import.meta.url).pathname;

export type ChildServer = {
  readonly process: ChildProcess;
  readonly port: number;
  /** Everything printed so far. */
  readonly output: () => { stdout: string; stderr: string };
  /** Ends it by a signal, or by closing its channel, and gives its exit code (null when killed). */
  readonly end: (how: NodeJS.Signals | 'disconnect') => Promise<number | null>;
  /** The most memory it ever held, in KiB. */
  readonly peakKiB: () => number;
};

/** The settings of a server process for a folder. */
export function childEnv(folder: string, more: NodeJS.ProcessEnv = {}): NodeJS.ProcessEnv {
  return {
    ...process.env,
    FAKE_S3_DIR: folder,
    FAKE_S3_PORT: '0',
    FAKE_S3_BUCKET: BUCKET,
    FAKE_S3_REGION: REGION,
    FAKE_S3_ACCESS_KEY_ID: CREDENTIALS.accessKeyId,
    FAKE_S3_SECRET_ACCESS_KEY: CREDENTIALS.secretAccessKey,
    ...more,
  };
}

/** Forks the server without waiting for anything. */
export function forkServer(env: NodeJS.ProcessEnv): { child: ChildProcess; output: ChildServer['output'] } {
  const child = fork('fake-s3/main.ts', [], { cwd: root, env, execArgv: ['--import', 'tsx'], silent: true });
  const printed = { stdout: '', stderr: '' };
  child.stdout?.on('data', (text) => (printed.stdout += String(text)));
  child.stderr?.on('data', (text) => (printed.stderr += String(text)));
  return { child, output: () => printed };
}

/** Starts the server as a process of its own and waits until it says that it is ready. */
export async function startChild(folder: string, more: NodeJS.ProcessEnv = {}): Promise<ChildServer> {
  const { child, output } = forkServer(childEnv(folder, more));
  const ready = await Promise.race([
    once(child, 'message').then(([message]) => message as { ready: boolean; port: number }),
    once(child, 'exit').then(() => {
      throw new Error(`The server ended before it was ready: ${output().stderr}`);
    }),
  ]);
  return {
    process: child,
    port: ready.port,
    output,
    end: async (how) => {
      const exited = once(child, 'exit');
      if (how === 'disconnect') child.disconnect();
      else child.kill(how);
      const [code] = (await exited) as [number | null];
      return code;
    },
    peakKiB: () =>
      Number(/VmHWM:\s+(\d+)/.exec(readFileSync(`/proc/${String(child.pid)}/status`, 'utf8'))?.[1]),
  };
}
