// npm run migrate: brings the database of DATABASE_URL, or this copy's own, to this code's schema.
import { ROOT, setUp } from './setup.mjs';
import { runScript } from './trouble.mjs';

await runScript(async () => {
  await setUp({ debian: process.env['DATABASE_URL'] ? [] : ['postgresql-15'] });
  const { register } = await import('tsx/esm/api');
  register();
  const { withDatabase } = await import('./with-database.ts');
  const { migrateDatabase } = await import('../src/db/migrate.ts');
  await withDatabase(ROOT, ({ DATABASE_URL }) => migrateDatabase(DATABASE_URL));
  console.log('The database is up to date.');
  return 0;
});
