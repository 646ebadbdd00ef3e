import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureBuild } from './ensure-build.mjs';
import { ensureDebian } from './ensure-debian.mjs';
import { waitForLock } from './lock.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { Trouble } from './trouble.mjs';

/** The checkout that these scripts belong to. */
export const ROOT = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');

/** Says so when this Node cannot run the product. */
function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major === 20 && minor >= 11) return;
  throw new Trouble(`Centrepop runs on Node 20 (20.11 or newer); this is Node ${process.versions.node}.`);
}

/**
 * Makes the checkout ready: npm packages always, the rest as asked. Does nothing when everything is there.
 * Plain JavaScript on Node's own modules, because it runs before there are packages.
 * @param {{ debian?: Parameters<typeof ensureDebian>[0], build?: 'never' | 'when-changed' | 'always' }} wanted
 */
export async function setUp({ debian = [], build = 'never' }) {
  checkNode();
  await ensureDebian(debian);
  // Two copies started together from one checkout would otherwise install and build over each other.
  const folder = join(ROOT, '.astro');
  try {
    mkdirSync(folder, { recursive: true });
  } catch {
    throw new Trouble(`${ROOT} cannot be written to. Start as the account it belongs to.`);
  }
  const release = await waitForLock(folder, 'setup', (pid) => {
    console.log(`Waiting for process ${String(pid ?? '')}, which is setting up this folder …`);
  });
  try {
    await ensurePackages(ROOT);
    if (build !== 'never') await ensureBuild(ROOT, { force: build === 'always' });
  } finally {
    await release();
  }
}
