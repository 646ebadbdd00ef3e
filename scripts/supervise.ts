import { join, resolve } from 'node:path';
import { migrateDatabase } from '../src/db/migrate.ts';
import { type Settings, readSettings } from '../src/server/env.ts';
import { type Cluster } from './cluster.ts';
import { openDataDir } from './data-dir.ts';
import { type DemoAccount, ensureDemo } from './demo.ts';
import { type StandIns, serviceEnvironment } from './environment.ts';
import { keepOrMakeUp } from './kept.ts';
import { checkWebPort } from './ports.ts';
import { type Place, clusterPart, fakeS3Part, fakeSmtpPart, forgetUnfinishedDemo } from './private-parts.ts';
import { type Mode, type ServiceOptions, webPart, workerPart } from './service-parts.ts';
import { stopWhenAsked } from './signals.ts';
import { summarise } from './summary.ts';
import { Supervisor } from './supervisor.ts';
import { watchSources } from './watch-sources.ts';

export type SuperviseOptions = {
  /** The checkout. */
  readonly root: string;
  readonly mode: Mode;
  /** False for the tests' throwaway copies. */
  readonly durable?: boolean;
  readonly given?: Readonly<Record<string, string | undefined>>;
};

type Environment = Record<string, string | undefined>;

function printAs(name: string): (line: string) => void {
  return (line) => {
    console.log(`${name.padEnd(8)}${line}`);
  };
}

async function startStandIns(supervisor: Supervisor, place: Place, durable: boolean): Promise<StandIns> {
  const { settings, dataDir } = place;
  const kept = keepOrMakeUp(dataDir);
  let cluster: Cluster | undefined;
  if (settings.DATABASE_URL === undefined) {
    const [part] = await supervisor.start(clusterPart(dataDir, durable));
    cluster = await part.started;
    await forgetUnfinishedDemo(dataDir, cluster);
  }
  const s3 = settings.S3_ENDPOINT === undefined ? await fakeS3Part(place, kept) : undefined;
  const smtp = settings.SMTP_URL === undefined ? await fakeSmtpPart(place) : undefined;
  const parts = [s3?.part, smtp?.part].filter((part) => part !== undefined);
  await Promise.all([
    supervisor.start(...parts),
    migrateDatabase(settings.DATABASE_URL ?? cluster?.databaseUrl ?? ''),
  ]);
  return {
    databaseUrl: cluster?.databaseUrl,
    s3Port: s3?.port,
    smtpPort: smtp?.port,
    outboxPort: smtp?.pagePort,
  };
}

/** Says to whoever started this by a channel (the end-to-end tests) what it can be reached by. */
function sayReady(environment: Environment): void {
  process.send?.({ ready: true, environment });
}

async function startAll(
  supervisor: Supervisor,
  options: SuperviseOptions,
  given: Environment,
  settings: Settings,
) {
  const { root, mode } = options;
  const dataDir = resolve(root, settings.DATA_DIR);
  // Before the port: to whoever starts it twice this says more than that the port is in use.
  await openDataDir(dataDir);
  await checkWebPort(settings.HOST, settings.PORT);
  const place = { root, dataDir, given, settings, print: printAs };
  const standIns = await startStandIns(supervisor, place, options.durable ?? true);
  const env = serviceEnvironment({ ...given, DATA_DIR: dataDir }, settings, keepOrMakeUp(dataDir), standIns);
  let accounts: DemoAccount[] = [];
  if (settings.DEMO) {
    const onSpawn = supervisor.alsoStop.bind(supervisor);
    accounts = await ensureDemo({ root, dataDir, env, tell: supervisor.tell, onSpawn });
  }
  const services: ServiceOptions = { root, mode, env, settings, print: printAs };
  const [, worker] = await supervisor.start(webPart(services), workerPart(services));
  if (mode === 'sources') watchSources(join(root, 'src'), () => void worker.restart());
  supervisor.tell(summarise({ url: settings.PUBLIC_URL, outboxUrl: env['OUTBOX_URL'], accounts }));
  sayReady(env);
}

async function startOne(
  supervisor: Supervisor,
  options: SuperviseOptions,
  given: Environment,
  settings: Settings,
) {
  const { root, mode } = options;
  const env = { ...given, DATA_DIR: resolve(root, settings.DATA_DIR) };
  const services: ServiceOptions = { root, mode, env, settings, print: () => console.log };
  const isWeb = settings.ROLE === 'web';
  if (isWeb) await checkWebPort(settings.HOST, settings.PORT);
  await supervisor.start(isWeb ? webPart(services) : workerPart(services));
  supervisor.tell(isWeb ? `The web server is running: ${settings.PUBLIC_URL}` : 'The worker is running.');
  sayReady(env);
}

/**
 * Runs the product until it is told to stop: everything on this machine, or with ROLE one process of it.
 * @returns the exit status
 * @throws SettingsError before anything has been started
 */
export async function supervise(options: SuperviseOptions): Promise<number> {
  const given = { ...(options.given ?? process.env) };
  const settings = readSettings(given);
  const supervisor = new Supervisor((line) => {
    console.log(line);
  });
  stopWhenAsked(supervisor);
  try {
    await (settings.ROLE === 'all' ? startAll : startOne)(supervisor, options, given, settings);
  } catch (error) {
    await supervisor.fail(error);
  }
  return supervisor.finished;
}
