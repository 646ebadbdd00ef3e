import { spawnSync } from 'node:child_process';
import { chownSync, readFileSync, statSync } from 'node:fs';
import { Trouble } from './trouble.mjs';

/** A command with its arguments. */
export type Command = readonly [program: string, ...args: string[]];

/** Wraps a command so that it runs as the cluster's account and is told to stop when this process dies. */
export type RunAs = (command: Command) => Command;

const WITH_PARENT = ['--pdeathsig', 'INT'];

/**
 * PostgreSQL refuses to run as root. Its account may not be able to enter the folders above the cluster (a home
 * folder of mode 700): then it gets the one right that lets it pass, the weaker first.
 */
const RIGHTS = [[], ['dac_read_search'], ['dac_override']] as const;

function findAccount(name: string): { uid: number; gid: number } | undefined {
  for (const line of readFileSync('/etc/passwd', 'utf8').split('\n')) {
    const [account, , uid, gid] = line.split(':');
    if (account === name) return { uid: Number(uid), gid: Number(gid) };
  }
  return undefined;
}

/**
 * How to run PostgreSQL's programs on a cluster.
 * @param folder the cluster's folder; an empty one of root's is handed to the unprivileged account
 * @throws Trouble when no account can use the folder
 */
export function runAsClusterAccount(folder: string): RunAs {
  if (process.getuid?.() !== 0) {
    if (statSync(folder).uid !== process.getuid?.()) {
      throw new Trouble(
        `${folder} belongs to another account. Start as that account, or use another DATA_DIR.`,
      );
    }
    return (command) => ['setpriv', ...WITH_PARENT, '--', ...command];
  }
  const owner = statSync(folder);
  const account = owner.uid === 0 ? (findAccount('postgres') ?? findAccount('nobody')) : owner;
  if (!account)
    throw new Trouble('There is no account named postgres for the database. Install postgresql-15.');
  if (owner.uid === 0) chownSync(folder, account.uid, account.gid);
  const drop = [`--reuid=${String(account.uid)}`, `--regid=${String(account.gid)}`, '--clear-groups'];
  for (const rights of RIGHTS) {
    const grant = rights.flatMap((right) => [`--inh-caps=+${right}`, `--ambient-caps=+${right}`]);
    const prefix = [...drop, ...grant, ...WITH_PARENT, '--'];
    if (
      spawnSync('setpriv', [...prefix, 'stat', `${folder}/.`], { stdio: 'ignore', cwd: '/' }).status === 0
    ) {
      return (command) => ['setpriv', ...prefix, ...command];
    }
  }
  throw new Trouble(
    `PostgreSQL's account cannot enter ${folder}. Put the data elsewhere: DATA_DIR=/var/lib/centrepop npm start`,
  );
}
