import { afterAll, expect, test } from 'vitest';
import { symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { takeLock, waitForLock } from '../../../scripts/lock.mjs';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('lock');
afterAll(folder.remove);

async function take(path: string, purpose: string): Promise<() => Promise<void>> {
  const lock = await takeLock(path, purpose);
  if (!lock.taken) throw new Error('The lock is taken.');
  return lock.release;
}

test('a second taker is told who has the lock', async () => {
  const release = await take(folder.path, 'told');
  expect(await takeLock(folder.path, 'told')).toEqual({ taken: false, pid: process.pid });
  await release();
});

test('another path to the same folder leads to the same lock', async () => {
  const link = join(folder.path, 'link');
  symlinkSync(folder.path, link);
  const release = await take(folder.path, 'linked');
  expect(await takeLock(link, 'linked')).toMatchObject({ taken: false });
  await release();
});

test('locks for other purposes do not meet', async () => {
  const releases = [await take(folder.path, 'one'), await take(folder.path, 'other')];
  for (const release of releases) await release();
});

test('of two that want it at once one gets it', async () => {
  const locks = await Promise.all([takeLock(folder.path, 'race'), takeLock(folder.path, 'race')]);
  expect(locks.map(({ taken }) => taken).sort()).toEqual([false, true]);
  for (const lock of locks) if (lock.taken) await lock.release();
});

test('who waits gets it when the holder lets go', async () => {
  const release = await take(folder.path, 'wait');
  const order: string[] = [];
  const waiting = waitForLock(folder.path, 'wait', (pid) => {
    order.push(`waits for ${String(pid === process.pid)}`);
    void release().then(() => order.push('let go'));
  });
  await (
    await waiting
  )();
  expect(order[0]).toBe('waits for true');
});
