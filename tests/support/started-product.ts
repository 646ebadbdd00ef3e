import { type ChildProcess, spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';

/** The checkout. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url));

type Environment = Readonly<Record<string, string | undefined>>;

/** A copy of the product that a test run has started. */
export type StartedProduct = {
  /** What its web and worker processes run with: DATABASE_URL, PUBLIC_URL, OUTBOX_URL, AUTH_SECRET … */
  readonly environment: Record<string, string>;
  readonly process: ChildProcess;
  /** Everything it has printed so far. */
  readonly printed: () => string;
  readonly stop: () => Promise<void>;
};

/**
 * Starts a whole copy as npm start does and waits until it serves.
 * @param settings its settings; DATA_DIR and PORT at least
 * @throws with what it printed when it ends instead
 */
export function startProduct(settings: Environment, root = ROOT): Promise<StartedProduct> {
  const child = spawn(process.execPath, ['scripts/start.mjs', '--throwaway'], {
    cwd: root,
    env: { ...process.env, ...settings },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  let text = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (chunk: string) => (text += chunk));
  }
  const ended = new Promise<void>((resolve) => child.once('close', () => resolve()));
  return new Promise((resolve, reject) => {
    void ended.then(() => {
      reject(new Error(`The product did not start:\n${text}`));
    });
    child.on('message', (message: { ready?: boolean; environment?: Record<string, string> }) => {
      if (message.ready !== true || !message.environment) return;
      resolve({
        environment: message.environment,
        process: child,
        printed: () => text,
        stop: async () => {
          child.kill('SIGTERM');
          await ended;
        },
      });
    });
  });
}
