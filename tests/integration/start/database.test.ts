import { Client } from 'pg';
import { expect, test } from 'vitest';
import { testDatabase } from '../../support/database.ts';

const databaseUrl = await testDatabase();

test('a test database is migrated and is not owned by a superuser', async () => {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  const { rows } = await client.query<{ migrated: boolean; superuser: boolean }>(
    `select to_regclass('drizzle.__drizzle_migrations') is not null as migrated,
            (select rolsuper from pg_roles where rolname = current_user) as superuser`,
  );
  await client.end();
  expect(rows).toEqual([{ migrated: true, superuser: false }]);
});
