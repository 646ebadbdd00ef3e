import { Client, type DatabaseError, escapeLiteral } from 'pg';
import { Trouble } from './trouble.mjs';

const WRONG_PASSWORD = '28P01';

async function connect(url: string): Promise<Client> {
  const client = new Client({ connectionString: url, connectionTimeoutMillis: 5000 });
  // Without a listener the loss of an idle connection would end this process.
  client.on('error', () => undefined);
  await client.connect();
  return client;
}

/**
 * Whether the server accepts connections by now.
 * @throws Trouble when it does and does not know the kept password
 */
export async function askWhetherReady(superuserUrl: string): Promise<boolean> {
  try {
    const client = await connect(superuserUrl);
    await client.end();
    return true;
  } catch (error) {
    if ((error as Partial<DatabaseError>).code !== WRONG_PASSWORD) return false;
    throw new Trouble(
      'The database does not accept the password kept in DATA_DIR/kept.json. Put that file back from the backup that the database is from.',
    );
  }
}

/** Makes the product's role and database when they are not there. The role owns its database and is no superuser. */
export async function ensureDatabase(superuserUrl: string, password: string): Promise<void> {
  const client = await connect(superuserUrl);
  try {
    const { rows } = await client.query<{ role: boolean; database: boolean }>(
      `select exists (select from pg_roles where rolname = 'centrepop') as role,
              exists (select from pg_database where datname = 'centrepop') as database`,
    );
    if (!rows[0]?.role) await client.query(`create role centrepop login password ${escapeLiteral(password)}`);
    if (!rows[0]?.database) await client.query('create database centrepop owner centrepop');
  } finally {
    await client.end();
  }
}

/** Takes the product's database away with everything in it. */
export async function dropDatabase(superuserUrl: string): Promise<void> {
  const client = await connect(superuserUrl);
  try {
    await client.query('drop database if exists centrepop with (force)');
  } finally {
    await client.end();
  }
}
