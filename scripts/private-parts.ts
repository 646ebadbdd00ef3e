import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { type Settings } from '../src/server/env.ts';
import { type Cluster, startCluster } from './cluster.ts';
import { dropDatabase, ensureDatabase } from './cluster-database.ts';
import { isDemoUnfinished } from './demo.ts';
import { fakeS3Environment } from './environment.ts';
import { type Kept, keepOrMakeUp } from './kept.ts';
import { type NodeProcess, type Part, nodePart } from './part.ts';
import { choosePort } from './ports.ts';

type Environment = Readonly<Record<string, string | undefined>>;

export type Place = {
  readonly root: string;
  readonly dataDir: string;
  readonly given: Environment;
  readonly settings: Settings;
  readonly print: (name: string) => (line: string) => void;
};

/** The private database. Started again, it keeps the port that the others connect to. */
export function clusterPart(dataDir: string, durable: boolean): Part<Cluster> {
  let port: number | undefined;
  return {
    name: 'PostgreSQL',
    start: async (onSpawn) => {
      const again = port === undefined ? {} : { port };
      const cluster = await startCluster({ dataDir, durable, onSpawn, ...again });
      ({ port } = cluster);
      return cluster;
    },
  };
}

/** Begins again with an empty database when the start that filled it with the demo was interrupted. */
export async function forgetUnfinishedDemo(dataDir: string, cluster: Cluster): Promise<void> {
  if (!isDemoUnfinished(dataDir)) return;
  await dropDatabase(cluster.superuserUrl);
  rmSync(join(dataDir, 'objects'), { recursive: true, force: true });
  await ensureDatabase(cluster.superuserUrl, keepOrMakeUp(dataDir).databasePassword);
}

/** The stand-in for object storage, on the port it keeps. */
export async function fakeS3Part(
  place: Place,
  kept: Kept,
): Promise<{ part: Part<NodeProcess>; port: number }> {
  const folder = join(place.dataDir, 'objects');
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const port = await choosePort(place.dataDir, 's3');
  const part = nodePart({
    name: 'storage',
    args: ['--import', 'tsx', 'fake-s3/main.ts'],
    cwd: place.root,
    env: fakeS3Environment(place.given, place.settings, kept, folder, port),
    print: place.print('storage'),
  });
  return { part, port };
}

/** The stand-in for a mail server with its page, on the ports they keep. */
export async function fakeSmtpPart(
  place: Place,
): Promise<{ part: Part<NodeProcess>; port: number; pagePort: number }> {
  const folder = join(place.dataDir, 'outbox');
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const port = await choosePort(place.dataDir, 'smtp');
  const pagePort = await choosePort(place.dataDir, 'outbox');
  const part = nodePart({
    name: 'mail',
    args: ['--import', 'tsx', 'fake-smtp/main.ts'],
    cwd: place.root,
    env: {
      ...place.given,
      FAKE_SMTP_DIR: folder,
      FAKE_SMTP_PORT: String(port),
      FAKE_SMTP_PAGE_PORT: String(pagePort),
    },
    print: place.print('mail'),
  });
  return { part, port, pagePort };
}
