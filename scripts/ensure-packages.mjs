import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';
import { Trouble } from './trouble.mjs';

/**
 * @typedef {{ version?: string, integrity?: string, optional?: boolean, link?: boolean }} LockedPackage
 */

/**
 * @param {string} file
 * @returns {Record<string, LockedPackage> | undefined}
 */
function readLock(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages;
  } catch {
    return undefined;
  }
}

/**
 * Whether node_modules holds what the lock file says. npm writes its own list inside node_modules as the last
 * step of an install, so an interrupted install never matches.
 * @param {string} root the checkout
 * @returns {boolean}
 */
export function packagesMatch(root) {
  const wanted = readLock(join(root, 'package-lock.json'));
  const present = readLock(join(root, 'node_modules', '.package-lock.json'));
  if (!wanted || !present) return false;
  for (const [path, entry] of Object.entries(wanted)) {
    if (path === '') continue;
    const installed = present[path];
    // Packages for other machines are in the lock file and rightly not here.
    if (!installed && entry.optional === true) continue;
    if (installed?.version !== entry.version || installed?.integrity !== entry.integrity) return false;
    if (!existsSync(join(root, path))) return false;
  }
  return Object.keys(present).every((path) => path in wanted);
}

/**
 * Installs the npm packages from the lock file when node_modules does not match it.
 * @param {string} root the checkout
 */
export async function ensurePackages(root) {
  if (packagesMatch(root)) return;
  console.log('Installing the npm packages …');
  // NODE_ENV=production would leave out the packages that build and check.
  const { status, output } = await runCommand(
    'npm',
    ['ci', '--include=dev', '--prefer-offline', '--no-audit', '--no-fund'],
    {
      cwd: root,
      env: { npm_config_progress: 'false' },
    },
  );
  if (status === 0) return;
  console.error(output.trimEnd());
  if (/ENOSPC/.test(output)) {
    throw new Trouble('The disk is full: free some space, then start again.');
  }
  throw new Trouble(
    'The npm packages could not be installed; what npm said is above. Check the connection to the npm registry, then start again.',
  );
}
