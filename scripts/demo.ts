import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Client } from 'pg';
import { type Running } from './running.ts';
import { nodePart } from './part.ts';
import { Trouble } from './trouble.mjs';

/** An account of the demo, as the seed names it: an address, a password and who it is. */
export type DemoAccount = Readonly<Record<string, string>>;

const UNFINISHED = 'demo-unfinished';

function readAccount(line: string): DemoAccount | undefined {
  try {
    const value: unknown = JSON.parse(line);
    if (typeof value === 'object' && value !== null && 'email' in value) return value as DemoAccount;
  } catch {
    // A line for people.
  }
  return undefined;
}

async function isEmpty(databaseUrl: string): Promise<boolean> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ empty: boolean }>(
      'select not exists (select from workshops) as empty',
    );
    return rows[0]?.empty === true;
  } finally {
    await client.end();
  }
}

/**
 * Whether the start that made the demo was interrupted. Nobody has worked in that database yet, so it can be
 * made anew.
 */
export function isDemoUnfinished(dataDir: string): boolean {
  return existsSync(join(dataDir, UNFINISHED));
}

/** The accounts of a demo that was made at an earlier start. */
export function findDemoAccounts(dataDir: string): DemoAccount[] {
  try {
    return readFileSync(join(dataDir, 'demo.jsonl'), 'utf8')
      .split('\n')
      .map(readAccount)
      .filter((account) => account !== undefined);
  } catch {
    return [];
  }
}

export type DemoOptions = {
  readonly root: string;
  readonly dataDir: string;
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly tell: (line: string) => void;
  readonly onSpawn: (running: Running) => void;
};

/**
 * Fills an empty database with the demo.
 * @returns its accounts; those of the earlier start when it is there already
 */
export async function ensureDemo({ root, dataDir, env, tell, onSpawn }: DemoOptions): Promise<DemoAccount[]> {
  const databaseUrl = env['DATABASE_URL'] ?? '';
  if (!existsSync(join(root, 'src/seed/main.ts')) || !(await isEmpty(databaseUrl)))
    return findDemoAccounts(dataDir);
  tell('Filling the empty database with the demo …');
  const unfinished = join(dataDir, UNFINISHED);
  writeFileSync(unfinished, '');
  const accounts: DemoAccount[] = [];
  const seed = nodePart({
    name: 'demo',
    args: ['--import', 'tsx', 'src/seed/main.ts'],
    cwd: root,
    env,
    print: (line) => {
      const account = readAccount(line);
      if (account) accounts.push(account);
      else tell(`demo: ${line}`);
    },
    waitUntilReady: () => Promise.resolve(),
  });
  const { ended, printed } = await seed.start(onSpawn);
  const how = await ended;
  await printed;
  if (how !== 'ended with status 0') {
    throw new Trouble(`The demo ${how}; what it said is above. To start without it: DEMO=0 npm start`);
  }
  const lines = accounts.map((account) => JSON.stringify(account)).join('\n');
  writeFileSync(join(dataDir, 'demo.jsonl'), lines, { mode: 0o600 });
  rmSync(unfinished);
  return accounts;
}
