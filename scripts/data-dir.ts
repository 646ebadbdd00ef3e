import { chmodSync, mkdirSync, statfsSync } from 'node:fs';
import { takeLock } from './lock.mjs';
import { Trouble } from './trouble.mjs';

/** PostgreSQL alone writes 40 MB for an empty cluster, and needs room for its log of changes. */
const LEAST_FREE_BYTES = 256 * 2 ** 20;

function explain(path: string, error: unknown): Trouble {
  const { code } = error as NodeJS.ErrnoException;
  if (code === 'ENOSPC')
    return new Trouble(`The disk is full: free some space for ${path}, then start again.`);
  if (code === 'ENOTDIR' || code === 'EEXIST')
    return new Trouble(`DATA_DIR is ${path}, which is not a folder. Set DATA_DIR to a folder.`);
  return new Trouble(
    `DATA_DIR is ${path}, which cannot be written to (${code ?? String(error)}). Set DATA_DIR to a folder of yours.`,
  );
}

/**
 * Opens the folder of a copy and takes its lock, so that no second copy runs on it.
 * @param path absolute; made when it is not there
 * @returns gives the lock back
 * @throws Trouble when it cannot be used, another copy runs on it, or hardly any space is left
 */
export async function openDataDir(path: string): Promise<() => Promise<void>> {
  try {
    mkdirSync(path, { recursive: true });
    // Started by root, the database's own account has to be able to pass through. Secrets are files of mode 600.
    chmodSync(path, process.getuid?.() === 0 ? 0o711 : 0o700);
  } catch (error) {
    throw explain(path, error);
  }
  const lock = await takeLock(path, 'data');
  if (!lock.taken) {
    throw new Trouble(
      `Centrepop is already running on ${path} (process ${String(lock.pid)}). Stop it, or start with other settings: PORT=… DATA_DIR=… npm start`,
    );
  }
  const { bavail, bsize } = statfsSync(path);
  if (bavail * bsize < LEAST_FREE_BYTES) {
    await lock.release();
    const left = Math.floor((bavail * bsize) / 2 ** 20);
    throw new Trouble(
      `The disk is full: ${String(left)} MiB are left for ${path}. Free some space, then start again.`,
    );
  }
  return lock.release;
}
