import { accessSync, constants, mkdirSync, rmSync, rmdirSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { runCommand } from './run-command.mjs';
import { Trouble } from './trouble.mjs';

/** What each of Debian's packages brings that we use, and what people call it. */
const PROGRAMS = /** @type {const} */ ({
  'postgresql-15': { name: 'PostgreSQL 15', files: ['/usr/lib/postgresql/15/bin/postgres'] },
  ffmpeg: { name: 'ffmpeg', files: ['ffmpeg', 'ffprobe'] },
  'libheif-examples': { name: 'the HEIC tools', files: ['/usr/bin/heif-convert'] },
  chromium: { name: 'Chromium', files: ['/usr/bin/chromium'] },
});

/** @typedef {keyof typeof PROGRAMS} DebianPackage */

/** @param {string} file */
function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** @param {string} program a path, or a name to look for in PATH */
function isThere(program) {
  if (program.startsWith('/')) return isExecutable(program);
  const folders = (process.env['PATH'] ?? '').split(delimiter);
  return folders.some((folder) => folder !== '' && isExecutable(join(folder, program)));
}

/** @param {readonly DebianPackage[]} wanted */
function findMissing(wanted) {
  return wanted.filter((name) => !PROGRAMS[name].files.every(isThere));
}

const CREATECLUSTER = '/etc/postgresql-common/createcluster.d';

/**
 * Debian's package makes and starts a cluster of its own when it is installed; we need only its programs. The
 * switch lies in the folder for additions and goes away again, so that the administrator's file stays as it is.
 * @template T
 * @param {() => Promise<T>} install
 */
async function withoutMainCluster(install) {
  const made = mkdirSync(CREATECLUSTER, { recursive: true });
  const file = join(CREATECLUSTER, 'zz-no-main-cluster.conf');
  writeFileSync(file, 'create_main_cluster = false\n');
  try {
    return await install();
  } finally {
    rmSync(file, { force: true });
    try {
      if (made !== undefined) rmdirSync(CREATECLUSTER);
    } catch {
      // Something else is in it by now.
    }
  }
}

/** @param {readonly string[]} args */
async function aptGet(args) {
  const { status, output } = await runCommand(
    'apt-get',
    ['-q', '-y', '-o', 'DPkg::Lock::Timeout=300', '-o', 'Dpkg::Options::=--force-confold', ...args],
    { env: { DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' } },
  );
  if (status === 0) return;
  console.error(output.trimEnd().split('\n').slice(-20).join('\n'));
  if (/No space left|enough free space/.test(output)) {
    throw new Trouble('The disk is full: free some space, then start again.');
  }
  throw new Trouble(
    `Debian's packages could not be installed; what apt-get said is above. Run: apt-get ${args.join(' ')}`,
  );
}

/**
 * Makes sure of the programs that come as Debian packages: installs what is missing when it may.
 * @param {readonly DebianPackage[]} wanted
 * @throws Trouble with the one command to run when it may not
 */
export async function ensureDebian(wanted) {
  const missing = findMissing(wanted);
  if (missing.length === 0) return;
  const names = missing.map((name) => PROGRAMS[name].name).join(' and ');
  const install = ['install', '--no-install-recommends', ...missing];
  if (process.getuid?.() !== 0 || !isThere('apt-get')) {
    const be = missing.length > 1 ? 'are' : 'is';
    throw new Trouble(
      `${names} ${be} not installed. Run this, then start again:\n\n  sudo apt-get ${install.join(' ')}\n`,
    );
  }
  console.log(`Installing ${names} …`);
  await withoutMainCluster(async () => {
    await aptGet(['update']);
    await aptGet(install);
  });
  const still = findMissing(missing);
  if (still.length > 0) {
    throw new Trouble(
      `${still.join(', ')} was installed, but its programs are not where Debian 12 puts them.`,
    );
  }
}
