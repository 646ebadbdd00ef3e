import { createHash } from 'node:crypto';
import { connect, createServer } from 'node:net';
import { statSync } from 'node:fs';

/**
 * @typedef {{ taken: true, release: () => Promise<void> } | { taken: false, pid: number | undefined }} Lock
 */

/**
 * The same for a folder whatever path leads to it.
 * @param {string} folder
 * @param {string} purpose
 */
function socketName(folder, purpose) {
  const { dev, ino } = statSync(folder);
  const key = createHash('sha256')
    .update(`${purpose}:${String(dev)}:${String(ino)}`)
    .digest('hex');
  return `\0centrepop-${key.slice(0, 32)}`;
}

/**
 * @param {string} name
 * @returns {Promise<Lock>}
 */
function listen(name) {
  return new Promise((resolve, reject) => {
    /** @type {Set<import('node:net').Socket>} */
    const askers = new Set();
    const server = createServer((socket) => {
      askers.add(socket);
      socket.on('close', () => askers.delete(socket));
      socket.on('error', () => socket.destroy());
      socket.unref();
      socket.write(`${String(process.pid)}\n`);
    });
    server.on('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      if (error.code === 'EADDRINUSE') resolve({ taken: false, pid: undefined });
      else reject(error);
    });
    server.listen(name, () => {
      server.unref();
      resolve({
        taken: true,
        release: () =>
          new Promise((done) => {
            server.close(() => done());
            for (const socket of askers) socket.destroy();
          }),
      });
    });
  });
}

/**
 * Asks the holder who it is.
 * @param {string} name
 * @param {boolean} untilGone whether to stay connected until the holder lets go
 * @returns {Promise<number | undefined>} its process id, or undefined when it has just gone
 */
function askHolder(name, untilGone) {
  return new Promise((resolve) => {
    /** @type {number | undefined} */
    let pid;
    const socket = connect(name);
    socket.on('data', (data) => {
      pid = Number.parseInt(data.toString('utf8'), 10);
      if (!untilGone) socket.destroy();
    });
    socket.on('error', () => socket.destroy());
    socket.on('close', () => resolve(pid));
  });
}

/**
 * Takes the lock of a folder. The lock is a socket without a file, so the kernel gives it back when its
 * holder ends, however it ends: there are no stale locks.
 * @param {string} folder an existing folder
 * @param {string} purpose
 * @returns {Promise<Lock>} `taken: false` with the holder's process id when another process has it
 */
export async function takeLock(folder, purpose) {
  const name = socketName(folder, purpose);
  for (;;) {
    const lock = await listen(name);
    if (lock.taken) return lock;
    const pid = await askHolder(name, false);
    if (pid !== undefined) return { taken: false, pid };
  }
}

/**
 * Takes the lock of a folder, waiting for whoever has it.
 * @param {string} folder
 * @param {string} purpose
 * @param {(pid: number | undefined) => void} onWait called each time that somebody else has it
 * @returns {Promise<() => Promise<void>>} gives the lock back
 */
export async function waitForLock(folder, purpose, onWait) {
  for (;;) {
    const lock = await takeLock(folder, purpose);
    if (lock.taken) return lock.release;
    onWait(lock.pid);
    await askHolder(socketName(folder, purpose), true);
  }
}
