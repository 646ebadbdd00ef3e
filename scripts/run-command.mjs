import { spawn } from 'node:child_process';

/** What keeps tools from calling home or asking questions. */
export const QUIET_ENVIRONMENT = {
  ASTRO_TELEMETRY_DISABLED: '1',
  ASTRO_DISABLE_UPDATE_CHECK: 'true',
  DO_NOT_TRACK: '1',
  NO_UPDATE_NOTIFIER: '1',
  npm_config_update_notifier: 'false',
  AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
};

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

let forwarding = false;

/** npm passes SIGTERM to the script only, so the script passes it on to the command it waits for. */
function forwardSignals() {
  if (forwarding) return;
  forwarding = true;
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => {
      if (running.size === 0 && process.listenerCount(signal) === 1) process.exit(130);
      for (const child of running) child.kill(signal);
    });
  }
}

/**
 * Runs a command to its end. A signal that ends this process ends the command first, and then the process.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, show?: boolean }} [options] `show` prints the output as it
 *   comes; otherwise it is only kept
 * @returns {Promise<{ status: number, output: string }>} status 127 when there is no such command
 */
export async function runCommand(command, args, { cwd, env = {}, show = false } = {}) {
  forwardSignals();
  const child = spawn(command, args, {
    cwd,
    env: { ...process.env, ...QUIET_ENVIRONMENT, ...env },
    stdio: ['ignore', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'],
  });
  running.add(child);
  /** @type {Buffer[]} */
  const chunks = [];
  child.stdout?.on('data', (chunk) => chunks.push(chunk));
  child.stderr?.on('data', (chunk) => chunks.push(chunk));
  /** @type {{ status: number, signal: NodeJS.Signals | null }} */
  const end = await new Promise((resolve) => {
    child.on('error', () => resolve({ status: 127, signal: null }));
    child.on('close', (status, signal) => resolve({ status: status ?? 1, signal }));
  });
  running.delete(child);
  if (end.signal === 'SIGINT' || end.signal === 'SIGTERM' || end.signal === 'SIGHUP') process.exit(130);
  return { status: end.status, output: Buffer.concat(chunks).toString('utf8') };
}
