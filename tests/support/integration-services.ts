import { Client } from 'pg';
import { type TestProject } from 'vitest/node';
import { type Cluster, startCluster } from '../../scripts/cluster.ts';
import { openDataDir } from '../../scripts/data-dir.ts';
import { migrateDatabase } from '../../src/db/migrate.ts';
import { throwawayFolder } from './throwaway.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** For making and dropping databases. Tests use testDatabase() from tests/support/database.ts. */
    superuserUrl: string;
    /** The product's own role, without a database: append a name. */
    databaseServerUrl: string;
    /** A migrated, empty database to clone. */
    templateName: string;
  }
}

const TEMPLATE = 'centrepop_template';

let close: (() => Promise<void>) | undefined;

async function makeTemplate({ superuserUrl, databaseUrl }: Cluster): Promise<void> {
  await migrateDatabase(databaseUrl);
  const client = new Client({ connectionString: superuserUrl });
  await client.connect();
  await client.query(`alter database centrepop rename to ${TEMPLATE}`);
  await client.query(`alter database ${TEMPLATE} with is_template true allow_connections false`);
  await client.end();
}

/** Starts the database server that all integration tests of a run share. */
export async function setup(project: TestProject): Promise<void> {
  const folder = throwawayFolder('integration');
  const release = await openDataDir(folder.path);
  const cluster = await startCluster({ dataDir: folder.path, durable: false });
  close = async () => {
    await cluster.stop();
    await release();
    folder.remove();
  };
  try {
    await makeTemplate(cluster);
  } catch (error) {
    await close();
    throw error;
  }
  project.provide('superuserUrl', cluster.superuserUrl);
  project.provide('databaseServerUrl', cluster.databaseUrl.replace(/\/centrepop$/, ''));
  project.provide('templateName', TEMPLATE);
}

/** Ends what setup started. */
export async function teardown(): Promise<void> {
  await close?.();
}
