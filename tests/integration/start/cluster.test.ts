import { existsSync, mkdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { once } from 'node:events';
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { type Cluster, startCluster } from '../../../scripts/cluster.ts';
import { openDataDir } from '../../../scripts/data-dir.ts';
import { ROOT } from '../../support/started-product.ts';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('cluster');
const dataDir = join(folder.path, 'data');
let release: () => Promise<void>;
let port: number;

beforeAll(async () => {
  release = await openDataDir(dataDir);
});
afterAll(async () => {
  await release();
  folder.remove();
});

async function ask<T>(url: string, question: string): Promise<T | undefined> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    const { rows } = await client.query<Record<string, T>>(question);
    return Object.values(rows[0] ?? {})[0];
  } finally {
    await client.end();
  }
}

/** A process's command line; empty when it has ended. */
function commandOf(pid: number): string {
  const file = `/proc/${String(pid)}/cmdline`;
  return existsSync(file) ? readFileSync(file, 'utf8') : '';
}

async function withCluster(use: (cluster: Cluster) => Promise<void>): Promise<void> {
  const cluster = await startCluster({ dataDir, durable: false });
  try {
    await use(cluster);
  } finally {
    await cluster.stop();
  }
}

test('the first start makes a cluster that listens on loopback only and is not run by root', async () => {
  await withCluster(async (cluster) => {
    ({ port } = cluster);
    expect(await ask(cluster.databaseUrl, 'show listen_addresses')).toBe('127.0.0.1');
    expect(await ask(cluster.superuserUrl, 'show unix_socket_directories')).toBe('');
    expect(await ask(cluster.databaseUrl, 'select rolsuper from pg_roles where rolname = current_user')).toBe(
      false,
    );
    expect(statSync(`/proc/${String(cluster.pid)}`).uid).not.toBe(0);
    await ask(cluster.databaseUrl, 'create table kept as select 1 as one');
  });
});

test('its secrets are readable by their owner only', () => {
  expect(statSync(join(dataDir, 'kept.json')).mode & 0o777).toBe(0o600);
  expect(statSync(join(dataDir, 'postgres')).mode & 0o777).toBe(0o700);
  expect(existsSync(join(dataDir, 'initdb-password'))).toBe(false);
});

test('a wrong password is refused', async () => {
  await withCluster(async ({ databaseUrl }) => {
    await expect(ask(databaseUrl.replace(/:[^:@]+@/, ':wrong@'), 'select 1')).rejects.toThrow(/password/);
  });
});

test('the second start finds the data on the same port', async () => {
  await withCluster(async (cluster) => {
    expect(cluster.port).toBe(port);
    expect(await ask(cluster.databaseUrl, 'select one from kept')).toBe(1);
  });
});

test('when something else listens on its port it moves to another', async () => {
  const stranger = createServer().listen(port, '127.0.0.1');
  await once(stranger, 'listening');
  await withCluster(async (cluster) => {
    expect(cluster.port).not.toBe(port);
    expect(await ask(cluster.databaseUrl, 'select one from kept')).toBe(1);
  });
  stranger.close();
});

test('a server whose starter was killed ends by itself or is ended by the next start', async () => {
  const script = `
    import { startCluster } from '${join(ROOT, 'scripts/cluster.ts')}';
    const cluster = await startCluster({ dataDir: ${JSON.stringify(dataDir)}, durable: false });
    process.send({ pid: cluster.pid });
    setInterval(() => undefined, 1000);`;
  const starter = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '--eval', script], {
    cwd: ROOT,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const [{ pid }] = (await once(starter, 'message')) as [{ pid: number }];
  starter.kill('SIGKILL');
  await withCluster(async (cluster) => {
    expect(cluster.pid).not.toBe(pid);
    expect(commandOf(pid)).toBe('');
    expect(await ask(cluster.databaseUrl, 'select one from kept')).toBe(1);
  });
});

test('the process id of a stranger in postmaster.pid is left alone', async () => {
  const stranger = spawn('sleep', ['60']);
  writeFileSync(
    join(dataDir, 'postgres/postmaster.pid'),
    `${String(stranger.pid)}\n${join(dataDir, 'postgres')}\n`,
  );
  await withCluster(async ({ databaseUrl }) => {
    expect(await ask(databaseUrl, 'select one from kept')).toBe(1);
  });
  expect(stranger.exitCode ?? stranger.signalCode).toBeNull();
  stranger.kill();
});

test('a second copy on the same folder is refused in one sentence', async () => {
  await expect(openDataDir(dataDir)).rejects.toThrow(
    `Centrepop is already running on ${dataDir} (process ${String(process.pid)}). Stop it, or start with other settings: PORT=… DATA_DIR=… npm start`,
  );
});

describe('what is broken is said in one sentence', () => {
  const cluster = join(dataDir, 'postgres');

  /** Moves a file away or puts other content in its place for the time of one attempt to start. */
  async function startWith(file: string, content: string | undefined): Promise<unknown> {
    const aside = join(folder.path, 'aside');
    renameSync(file, aside);
    if (content !== undefined) writeFileSync(file, content);
    try {
      return await startCluster({ dataDir, durable: false }).then(
        (started) => started.stop(),
        (error: unknown) => error,
      );
    } finally {
      renameSync(aside, file);
    }
  }

  test.each([
    ['another version', 'postgres/PG_VERSION', '14\n', /was made by PostgreSQL 14\. Centrepop uses 15/],
    ['no version', 'postgres/PG_VERSION', undefined, /is damaged: PG_VERSION cannot be read/],
    ['a broken control file', 'postgres/global/pg_control', 'x', /did not start on .*postgres\.log says why/],
    ['lost secrets', 'kept.json', undefined, /kept\.json is missing, and it holds the password/],
    ['damaged secrets', 'kept.json', '{"ports', /kept\.json is damaged/],
  ])('%s', async (_what, file, content, sentence) => {
    const error = await startWith(join(dataDir, file), content);
    expect(error).toMatchObject({ name: 'Trouble', message: expect.stringMatching(sentence) as unknown });
    expect(String(error).split('\n')).toHaveLength(1);
  });

  test('after all that it still starts', async () => {
    await withCluster(async ({ databaseUrl }) => {
      expect(await ask(databaseUrl, 'select one from kept')).toBe(1);
    });
    expect(readFileSync(join(cluster, 'PG_VERSION'), 'utf8')).toBe('15\n');
  });
});

test('a folder that is a file is refused in one sentence', async () => {
  const file = join(folder.path, 'file');
  writeFileSync(file, '');
  await expect(openDataDir(file)).rejects.toThrow(
    `DATA_DIR is ${file}, which is not a folder. Set DATA_DIR to a folder.`,
  );
});

test.runIf(process.getuid?.() === 0)(
  'started by root it runs below a folder that only root may enter',
  async () => {
    const closed = join(folder.path, 'closed');
    mkdirSync(closed, { mode: 0o700 });
    const unlock = await openDataDir(join(closed, 'data'));
    const cluster = await startCluster({ dataDir: join(closed, 'data'), durable: false });
    expect(await ask(cluster.databaseUrl, 'select 1')).toBe(1);
    await cluster.stop();
    await unlock();
  },
);
