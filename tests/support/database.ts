import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { afterAll, inject } from 'vitest';

async function runAsSuperuser(statement: string): Promise<void> {
  const client = new Client({ connectionString: inject('superuserUrl') });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

/**
 * A migrated, empty database for the tests of one file, dropped after them, connections and all.
 * Call it once at the top of the file: `const databaseUrl = await testDatabase();`
 * @returns postgres://… for the product's own role, which owns the database
 */
export async function testDatabase(): Promise<string> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  afterAll(() => runAsSuperuser(`drop database if exists ${name} with (force)`));
  await runAsSuperuser(`create database ${name} template ${inject('templateName')} owner centrepop`);
  return `${inject('databaseServerUrl')}/${name}`;
}
