import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

function readPid(file: string): number | undefined {
  try {
    const pid = Number.parseInt(readFileSync(file, 'utf8'), 10);
    return Number.isInteger(pid) && pid > 1 ? pid : undefined;
  } catch {
    return undefined;
  }
}

/** Whether a process is a PostgreSQL server on this very folder: a process id alone may be anyone's by now. */
function isServerOf(pid: number, folder: string): boolean {
  try {
    const command = readFileSync(`/proc/${String(pid)}/cmdline`, 'utf8').split('\0');
    return (command[0] ?? '').endsWith('/postgres') && command.includes(folder);
  } catch {
    return false;
  }
}

/**
 * Ends a server that a killed start has left on the cluster, so that ours can start. The caller holds the lock
 * of the folder, so nobody needs that server any more.
 */
export async function endOrphan(folder: string): Promise<void> {
  const file = join(folder, 'postmaster.pid');
  const pid = readPid(file);
  if (pid === undefined) return;
  if (!isServerOf(pid, folder)) {
    rmSync(file, { force: true });
    return;
  }
  for (const [signal, seconds] of [
    ['SIGINT', 20],
    ['SIGQUIT', 5],
    ['SIGKILL', 2],
  ] as const) {
    try {
      process.kill(pid, signal);
    } catch {
      return;
    }
    for (const end = Date.now() + seconds * 1000; Date.now() < end; await wait(50)) {
      if (!isServerOf(pid, folder)) return;
    }
  }
}
