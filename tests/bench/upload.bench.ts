import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { copyFile, mkdir, mkdtemp, open, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { findFreePort } from '../../scripts/ports.ts';
import { partCountFor, partLength, PART_BYTES } from '../../src/features/files/file.ts';
import { readServiceSettings } from '../../src/server/env.ts';
import { openStorage, type Storage } from '../../src/server/storage/storage.ts';
import { type Bench, formatTable, median } from './support/bench.ts';
import { endProcess } from './support/load.ts';

// Announces on stderr that it will want a newer Node one day.
process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';

const GIB = 2 ** 30;
const ROUNDS = 3;
const PARTS_AT_ONCE = 4;
/** Of the speed of a plain copy that also waits for the disk. */
const AIM = 0.1;
const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const KEYS = { S3_ACCESS_KEY_ID: 'BENCH', S3_SECRET_ACCESS_KEY: 'vice-and-anvil' };

async function makeSource(path: string): Promise<void> {
  const file = await open(path, 'w');
  const stretch = Buffer.alloc(PART_BYTES, createHash('sha512').update('shavings').digest());
  for (let at = 0; at < GIB; at += stretch.length) {
    stretch.writeUInt32BE(at / stretch.length, 0);
    await file.write(stretch, 0, stretch.length, at);
  }
  await file.sync();
  await file.close();
}

async function copyOnce(source: string, to: string): Promise<number> {
  const start = performance.now();
  await copyFile(source, to);
  const file = await open(to, 'r');
  await file.sync();
  await file.close();
  const seconds = (performance.now() - start) / 1000;
  await rm(to);
  return seconds;
}

async function uploadOnce(storage: Storage, source: string, key: string): Promise<number> {
  const start = performance.now();
  const uploadId = await storage.uploads.begin(key, 'video/mp4');
  const file = await open(source, 'r');
  let next = 1;
  async function sendSome(): Promise<void> {
    while (next <= partCountFor(GIB)) {
      const number = next++;
      const body = Buffer.alloc(partLength(GIB, number));
      await file.read(body, 0, body.length, (number - 1) * PART_BYTES);
      const url = await storage.uploads.signPart(key, uploadId, number, body.length);
      const answer = await fetch(url, { method: 'PUT', body });
      if (!answer.ok) throw new Error(`Part ${String(number)} was answered with ${String(answer.status)}.`);
      await answer.arrayBuffer();
    }
  }
  await Promise.all(Array.from({ length: PARTS_AT_ONCE }, sendSome));
  await storage.uploads.complete(key, uploadId, (await storage.uploads.listParts(key, uploadId)) ?? []);
  const seconds = (performance.now() - start) / 1000;
  await file.close();
  if ((await storage.sizeOf(key)) !== GIB) throw new Error('What arrived is not what was sent.');
  await storage.remove(key);
  return seconds;
}

async function startStorage(folder: string) {
  const port = await findFreePort();
  const endpoint = `http://127.0.0.1:${String(port)}`;
  await mkdir(folder);
  const child = spawn(process.execPath, ['--import', 'tsx', 'fake-s3/main.ts'], {
    cwd: ROOT,
    stdio: 'inherit',
    env: {
      ...process.env,
      FAKE_S3_DIR: folder,
      FAKE_S3_PORT: String(port),
      FAKE_S3_BUCKET: 'centrepop',
      FAKE_S3_REGION: 'us-east-1',
      FAKE_S3_ACCESS_KEY_ID: KEYS.S3_ACCESS_KEY_ID,
      FAKE_S3_SECRET_ACCESS_KEY: KEYS.S3_SECRET_ACCESS_KEY,
      FAKE_S3_ALLOW_ORIGIN: 'http://127.0.0.1',
    },
  });
  const settings = readServiceSettings({
    DATABASE_URL: 'postgres://nobody@127.0.0.1/none',
    SMTP_URL: 'smtp://127.0.0.1:1',
    MAIL_FROM: 'Bench <bench@centrepop.test>',
    AUTH_SECRET: 'a-secret-of-the-bench-and-nothing-else',
    S3_ENDPOINT: endpoint,
    ...KEYS,
  });
  const storage = openStorage(settings, pino({ level: 'silent' }));
  for (let tries = 0; ; tries += 1) {
    try {
      await storage.sizeOf('nothing');
      break;
    } catch (error) {
      if (tries > 100) throw error;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
  return { child, storage };
}

export const bench: Bench = {
  name: 'upload',
  what: '1 GiB to the stand-in storage in signed parts of 16 MiB, four at once, beside a plain copy to the same disk',
  async run(print) {
    const folder = await mkdtemp(join(tmpdir(), 'centrepop-bench-'));
    const source = join(folder, 'source');
    await makeSource(source);
    const { child, storage } = await startStorage(join(folder, 'objects'));
    try {
      const [copies, uploads]: [number[], number[]] = [[], []];
      for (let round = 0; round < ROUNDS; round += 1) {
        copies.push(await copyOnce(source, join(folder, 'copy')));
        uploads.push(await uploadOnce(storage, source, `incoming/bench-${String(round)}`));
      }
      const ratio = median(copies) / median(uploads);
      const row = (name: string, seconds: readonly number[]) => [
        name,
        ...seconds.map((one) => one.toFixed(2)),
        (1024 / median(seconds)).toFixed(0),
      ];
      const rounds = Array.from({ length: ROUNDS }, (_none, index) => `s, round ${String(index + 1)}`);
      for (const line of formatTable([
        ['', ...rounds, 'MiB/s'],
        row('plain copy', copies),
        row('signed parts', uploads),
      ]))
        print(line);
      print(
        `signed parts reach ${(100 * ratio).toFixed(0)} % of a plain copy; at least ${String(AIM * 100)} % is asked`,
      );
      return ratio >= AIM;
    } finally {
      storage.close();
      await endProcess(child);
      await rm(folder, { recursive: true, force: true });
    }
  },
};
