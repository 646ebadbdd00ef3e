import { spawnSync } from 'node:child_process';
import {
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { join } from 'node:path';
import { runAsClusterAccount } from './cluster-account.ts';
import { explainLog } from './cluster-log.ts';
import { findKept, keepOrMakeUp } from './kept.ts';
import { Trouble } from './trouble.mjs';

/** Where Debian puts the server's programs. */
export const PROGRAMS = '/usr/lib/postgresql/15/bin';

const VERSION = '15';

function initialise(dataDir: string, folder: string, durable: boolean): void {
  // Made under another name and renamed when it is whole: an interrupted start leaves no half cluster.
  const unfinished = `${folder}.new`;
  rmSync(unfinished, { recursive: true, force: true });
  mkdirSync(unfinished, { mode: 0o700 });
  const runAs = runAsClusterAccount(unfinished);
  const { uid, gid } = statSync(unfinished);
  const passwordFile = join(dataDir, 'initdb-password');
  writeFileSync(passwordFile, keepOrMakeUp(dataDir).superuserPassword, { mode: 0o600 });
  chownSync(passwordFile, uid, gid);
  const [program, ...args] = runAs([
    join(PROGRAMS, 'initdb'),
    ...['-D', unfinished, '-U', 'postgres', '-E', 'UTF8', '--locale=C.UTF-8'],
    ...['-A', 'scram-sha-256', `--pwfile=${passwordFile}`],
    ...(durable ? [] : ['--no-sync']),
  ]);
  try {
    const { status, stdout, stderr } = spawnSync(program, args, { cwd: '/', encoding: 'utf8' });
    if (status !== 0) {
      const log = `${stdout}${stderr}`;
      const logFile = join(dataDir, 'postgres.log');
      writeFileSync(logFile, log);
      throw explainLog(log, logFile, folder);
    }
  } catch (error) {
    rmSync(unfinished, { recursive: true, force: true });
    throw error;
  } finally {
    rmSync(passwordFile, { force: true });
  }
  renameSync(unfinished, folder);
}

/**
 * Makes the private cluster when there is none, and looks whether one that is there can be ours.
 * @param dataDir an existing folder of this copy
 * @param durable false for throwaway clusters: nothing is forced to the disk
 * @returns the cluster's folder
 * @throws Trouble when it is of another version, damaged, or its password is lost
 */
export function ensureCluster(dataDir: string, durable = true): string {
  const folder = join(dataDir, 'postgres');
  if (!existsSync(folder)) {
    initialise(dataDir, folder, durable);
    return folder;
  }
  if (!findKept(dataDir)) {
    throw new Trouble(
      `${join(dataDir, 'kept.json')} is missing, and it holds the password of the database in ${folder}. Put it back from a backup, or use another DATA_DIR.`,
    );
  }
  let version: string;
  try {
    version = readFileSync(join(folder, 'PG_VERSION'), 'utf8').trim();
  } catch {
    throw new Trouble(
      `The database in ${folder} is damaged: PG_VERSION cannot be read. Put the folder back from a backup, or use another DATA_DIR.`,
    );
  }
  if (version !== VERSION) {
    throw new Trouble(
      `The database in ${folder} was made by PostgreSQL ${version}. Centrepop uses ${VERSION}: use another DATA_DIR, or move the data with pg_dump.`,
    );
  }
  return folder;
}
