import { type ChildProcess } from 'node:child_process';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { request } from 'node:http';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { formatTable, median } from './bench.ts';
import { endProcess, measure, type Rates, startOnServerCore, untilAnswering } from './load.ts';
import { writeNginxSite } from './nginx.ts';
import { needPrograms } from './packages.ts';

const AIM = 0.5;
export const ROUNDS = 7;
export const SECONDS = 2;
export const CONNECTIONS = 32;
const PATH = '/w/bench/lathe-stand/episodes/3';
const OURS = 'http://127.0.0.1:4391';
const NGINX = 'http://127.0.0.1:4392';

/** Sent by Node or nginx themselves, or different for every request. */
const NOT_COPIED = /^(connection|keep-alive|date|content-length|content-type|etag|vary|x-request-id)$/;

type Answer = { status: number; headers: Record<string, string>; body: Buffer };

/** One answer as it is on the wire: `fetch` would decode it. */
function get(url: string, headers: Record<string, string> = {}): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const asked = request(url, { headers }, (res) => {
      const chunks: Buffer[] = [];
      res.on('data', (chunk: Buffer) => chunks.push(chunk));
      res.on('end', () => {
        const named = Object.entries(res.headers).map(([name, value]) => [name, String(value)]);
        resolve({
          status: res.statusCode ?? 0,
          headers: Object.fromEntries(named) as Record<string, string>,
          body: Buffer.concat(chunks),
        });
      });
    });
    asked.on('error', reject).end();
  });
}

async function compare(folder: string, page: string, print: (line: string) => void): Promise<boolean> {
  const pageFile = join(folder, 'page.html');
  const clientDir = join(folder, 'client');
  await mkdir(clientDir);
  await writeFile(pageFile, page);
  const script = fileURLToPath(new URL('./front-process.ts', import.meta.url));
  const front = startOnServerCore(process.execPath, [
    ...['--import', 'tsx', script],
    ...[new URL(OURS).port, PATH, pageFile, clientDir, join(folder, 'ours.log')],
  ]);
  let nginx: ReturnType<typeof startOnServerCore> | undefined;
  try {
    await untilAnswering(OURS + PATH);
    const plain = await get(OURS + PATH);
    const gzipped = await get(OURS + PATH, { 'accept-encoding': 'gzip' });
    const configuration = await writeNginxSite({
      folder,
      port: Number(new URL(NGINX).port),
      path: PATH,
      body: plain.body,
      gzipped: gzipped.body,
      headers: Object.entries(plain.headers).filter(([name]) => !NOT_COPIED.test(name)),
    });
    nginx = startOnServerCore('/usr/sbin/nginx', ['-e', join(folder, 'start.log'), '-c', configuration]);
    await untilAnswering(NGINX + PATH);
    return await runRounds({ origin: OURS, process: front }, { origin: NGINX, process: nginx }, print);
  } finally {
    await endProcess(front);
    if (nginx !== undefined) await endProcess(nginx);
  }
}

type Case = { readonly name: string; readonly encoding: string; readonly conditional: boolean };

const CASES: readonly Case[] = [
  { name: 'page', encoding: 'identity', conditional: false },
  { name: 'page, gzip', encoding: 'gzip', conditional: false },
  { name: '304', encoding: 'identity', conditional: true },
  { name: '304, gzip', encoding: 'gzip', conditional: true },
];

type Server = { readonly origin: string; readonly process: ChildProcess };

/** How one server is asked in a case, and what it answers. */
async function prepare({ origin, process }: Server, { encoding, conditional }: Case) {
  const headers: Record<string, string> = { 'accept-encoding': encoding };
  // Each has its own way to make an ETag; each is asked with its own.
  if (conditional) headers['if-none-match'] = (await get(origin + PATH, headers)).headers['etag'] ?? '';
  const { status, body } = await get(origin + PATH, headers);
  if (status !== (conditional ? 304 : 200)) throw new Error(`${origin} answers ${String(status)}.`);
  const load = () =>
    measure({ server: process, url: origin + PATH, headers, seconds: SECONDS, connections: CONNECTIONS });
  return { body, load };
}

async function runRounds(
  ourServer: Server,
  theirServer: Server,
  print: (line: string) => void,
): Promise<boolean> {
  const rows: (string | number)[][] = [
    ['', '', 'requests a second', '', '', '', 'a processor second', '', ''],
    ['', 'bytes', 'ours', 'nginx', 'ratio', `aim ${String(AIM)}`, 'ours', 'nginx', 'ratio'],
  ];
  let reached = true;
  for (const one of CASES) {
    const ours = await prepare(ourServer, one);
    const theirs = await prepare(theirServer, one);
    if (!ours.body.equals(theirs.body)) throw new Error(`The bodies differ: ${one.name}.`);
    const rounds: { ours: Rates; theirs: Rates }[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      // Taking turns at going first, so that a slow moment of the machine favours neither.
      const early = round % 2 === 0 ? await ours.load() : undefined;
      const their = await theirs.load();
      rounds.push({ ours: early ?? (await ours.load()), theirs: their });
    }
    const summary = (rate: keyof Rates) => ({
      cells: [
        Math.round(median(rounds.map((round) => round.ours[rate]))),
        Math.round(median(rounds.map((round) => round.theirs[rate]))),
      ],
      ratio: median(rounds.map((round) => round.ours[rate] / round.theirs[rate])),
    });
    const clock = summary('requestsPerSecond');
    const processor = summary('requestsPerProcessorSecond');
    const verdict = clock.ratio >= AIM ? 'reached' : 'MISSED';
    reached &&= clock.ratio >= AIM;
    rows.push([
      ...[one.name, ours.body.length, ...clock.cells, clock.ratio.toFixed(2), verdict],
      ...[...processor.cells, processor.ratio.toFixed(2)],
    ]);
  }
  for (const line of formatTable(rows)) print(line);
  return reached;
}

/**
 * Serves a page from the front server and the same bytes from nginx, one core each, and prints how they compare.
 * @returns whether ours answers at least half as often
 */
export async function besideNginx(page: string, print: (line: string) => void): Promise<boolean> {
  if (availableParallelism() < 2) throw new Error('This bench needs two cores: one serves, one asks.');
  needPrograms({ '/usr/sbin/nginx': 'nginx-light', '/usr/bin/wrk': 'wrk' });
  const folder = await mkdtemp(join(tmpdir(), 'centrepop-bench-'));
  try {
    return await compare(folder, page, print);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
