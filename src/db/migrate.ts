import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';
import PgBoss from 'pg-boss';

// Any fixed number does; everything that migrates this database takes the same one.
const MIGRATION_LOCK = 734_201;

interface Journal {
  readonly entries: readonly { readonly when: number; readonly tag: string }[];
}

/** Thrown when this code cannot work with the database it was given. */
export class DatabaseVersionError extends Error {
  override readonly name = 'DatabaseVersionError';
}

function migrationsFolder(): string {
  // From src/db when run by tsx, from dist when bundled.
  const relative = import.meta.url.includes('/dist/') ? '../drizzle' : '../../drizzle';
  return fileURLToPath(new URL(relative, import.meta.url));
}

function readJournal(): Journal {
  return JSON.parse(readFileSync(`${migrationsFolder()}/meta/_journal.json`, 'utf8')) as Journal;
}

async function lastApplied(client: pg.ClientBase): Promise<number> {
  const { rows: tables } = await client.query<{ made: boolean }>(
    `select to_regclass('drizzle.__drizzle_migrations') is not null as made`,
  );
  if (!tables[0]?.made) return 0;
  const { rows } = await client.query<{ at: string | null }>(
    'select max(created_at) as at from drizzle.__drizzle_migrations',
  );
  return Number(rows[0]?.at ?? 0);
}

/**
 * Brings a database to this code's schema, the job queue's included. Two callers at once take turns.
 * @param url postgres://…
 * @throws DatabaseVersionError when the database is newer than this code
 */
export async function migrateDatabase(url: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await client.query('set client_min_messages to warning');
    const newest = readJournal().entries.at(-1)?.when ?? 0;
    if ((await lastApplied(client)) > newest) throw newerDatabase();
    await migrate(drizzle(client), { migrationsFolder: migrationsFolder() });
    await migrateJobQueue(url);
  } finally {
    await client.end();
  }
}

async function migrateJobQueue(url: string): Promise<void> {
  const boss = new PgBoss({ connectionString: url, supervise: false, schedule: false, max: 1 });
  await boss.start();
  await boss.stop({ graceful: false, wait: true });
}

/**
 * Checks, without changing anything, that the database fits this code.
 * @throws DatabaseVersionError with what to do
 */
export async function requireMigrated(pool: pg.Pool): Promise<void> {
  const client = await pool.connect();
  try {
    const [applied, newest] = [await lastApplied(client), readJournal().entries.at(-1)?.when ?? 0];
    if (applied > newest) throw newerDatabase();
    if (applied < newest) {
      throw new DatabaseVersionError('The database is older than this version. Run npm run migrate first.');
    }
  } finally {
    client.release();
  }
}

function newerDatabase(): DatabaseVersionError {
  return new DatabaseVersionError(
    'The database was made by a newer version of Centrepop. Start that version, or use another database.',
  );
}
