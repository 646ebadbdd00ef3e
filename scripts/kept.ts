import { randomBytes } from 'node:crypto';
import { chmodSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Trouble } from './trouble.mjs';

/** What a copy makes up once and keeps: its secrets and the ports it has chosen. */
export type Kept = {
  readonly installationId: string;
  readonly authSecret: string;
  readonly databasePassword: string;
  readonly superuserPassword: string;
  readonly s3AccessKeyId: string;
  readonly s3SecretAccessKey: string;
  readonly ports: Readonly<Record<string, number>>;
};

const FILE = 'kept.json';

function secret(bytes: number): string {
  return randomBytes(bytes).toString('base64url');
}

function makeUp(): Kept {
  return {
    installationId: randomBytes(4).toString('hex'),
    authSecret: secret(32),
    databasePassword: secret(24),
    superuserPassword: secret(24),
    s3AccessKeyId: randomBytes(10).toString('hex').toUpperCase(),
    s3SecretAccessKey: secret(30),
    ports: {},
  };
}

function isKept(value: unknown): value is Kept {
  if (typeof value !== 'object' || value === null) return false;
  return Object.entries(makeUp()).every(
    ([name, example]) => typeof (value as Record<string, unknown>)[name] === typeof example,
  );
}

function write(dataDir: string, kept: Kept): void {
  const file = join(dataDir, FILE);
  const fresh = `${file}.new`;
  writeFileSync(fresh, `${JSON.stringify(kept, null, 2)}\n`, { mode: 0o600 });
  chmodSync(fresh, 0o600);
  renameSync(fresh, file);
}

/**
 * What this copy has kept.
 * @param dataDir an existing folder
 * @returns undefined when it has never been started
 * @throws Trouble when the file is there and cannot be read
 */
export function findKept(dataDir: string): Kept | undefined {
  const file = join(dataDir, FILE);
  let text: string;
  try {
    text = readFileSync(file, 'utf8');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return undefined;
    throw new Trouble(`${file} cannot be read: start as the account that made it.`);
  }
  try {
    const value: unknown = JSON.parse(text);
    if (isKept(value)) return value;
  } catch {
    // Told below.
  }
  throw new Trouble(
    `${file} is damaged, and it holds the database's password: put it back from a backup, or use another DATA_DIR.`,
  );
}

/** What this copy has kept, made up now when this is its first start. */
export function keepOrMakeUp(dataDir: string): Kept {
  const found = findKept(dataDir);
  if (found) return found;
  const kept = makeUp();
  write(dataDir, kept);
  return kept;
}

/** Keeps a chosen port. Gives what is kept now. */
export function keepPort(dataDir: string, name: string, port: number): Kept {
  const kept = keepOrMakeUp(dataDir);
  if (kept.ports[name] === port) return kept;
  const next = { ...kept, ports: { ...kept.ports, [name]: port } };
  write(dataDir, next);
  return next;
}
