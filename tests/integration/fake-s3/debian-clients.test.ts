import {
  CreateBucketCommand,
  GetObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
} from '@aws-sdk/client-s3';
import { execFile } from 'node:child_process';
import { existsSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { throwawayFolder } from '../../support/throwaway.ts';
import { BUCKET, bytesOf, CREDENTIALS, REGION, startStandIn, type StandIn } from './stand-in.ts';

const run = promisify(execFile);

/** Over the size at which each client sends in parts as it is set up here. */
const LARGE = bytesOf(13 * 1024 * 1024);
const SMALL = Buffer.from('shavings, 0.4 mm\n');
const Bucket = BUCKET;
const OTHER_BUCKET = 'second-shed';
/** With all that a path in an address has to escape. */
const ODD_KEY = 'incoming/jig & fence +1 = 50% é.txt';

type Client = {
  readonly program: string;
  /** How it is told the server and the secret. */
  readonly where: (host: string, secret: string) => string[];
  readonly put: (file: string, to: string) => string[];
  readonly get: (from: string, file: string) => string[];
  readonly list: (folder: string) => string[];
  readonly copy: (from: string, to: string) => string[];
  readonly remove: (folder: string) => string[];
};

const s3 = (key: string, bucket = BUCKET) => `s3://${bucket}/${key}`;
const remote = (key: string, bucket = BUCKET) => `shed:${bucket}/${key}`;

let standIn: StandIn;
const folder = throwawayFolder('s3-clients');
const at = (name: string) => join(folder.path, name);

/** What each is called with; the address and keys are in the environment or its own file of settings. */
const CLIENTS: Readonly<Record<string, Client>> = {
  aws: {
    program: '/usr/bin/aws',
    where: (host) => ['--endpoint-url', `http://${host}`],
    put: (file, to) => ['s3', 'cp', '--no-progress', file, s3(to)],
    get: (from, file) => ['s3', 'cp', '--no-progress', s3(from), file],
    list: (from) => ['s3', 'ls', '--recursive', s3(from)],
    copy: (from, to) => ['s3', 'cp', '--no-progress', s3(from), s3(to, OTHER_BUCKET)],
    remove: (from) => ['s3', 'rm', '--recursive', s3(from)],
  },
  rclone: {
    program: '/usr/bin/rclone',
    where: (host, secret) => ['--s3-endpoint', `http://${host}`, '--s3-secret-access-key', secret],
    put: (file, to) => ['copyto', file, remote(to)],
    get: (from, file) => ['copyto', remote(from), file],
    list: (from) => ['lsf', '--recursive', remote(from)],
    copy: (from, to) => ['copyto', remote(from), remote(to, OTHER_BUCKET)],
    remove: (from) => ['delete', remote(from)],
  },
  s3cmd: {
    program: '/usr/bin/s3cmd',
    where: (host, secret) => [
      ...['-c', at('s3cmd.ini'), '--no-progress', `--host=${host}`, `--host-bucket=${host}`],
      `--secret_key=${secret}`,
    ],
    put: (file, to) => ['put', file, s3(to)],
    get: (from, file) => ['get', '--force', s3(from), file],
    list: (from) => ['ls', '--recursive', s3(from)],
    copy: (from, to) => ['cp', s3(from), s3(to, OTHER_BUCKET)],
    remove: (from) => ['del', '--recursive', '--force', s3(from)],
  },
};

async function call({ program, where }: Client, args: string[], secret = CREDENTIALS.secretAccessKey) {
  const host = `127.0.0.1:${String(standIn.port)}`;
  const { stdout } = await run(program, [...where(host, secret), ...args], {
    encoding: 'utf8',
    env: {
      PATH: '/usr/bin:/bin',
      HOME: folder.path,
      LC_ALL: 'C.UTF-8',
      AWS_ACCESS_KEY_ID: CREDENTIALS.accessKeyId,
      AWS_SECRET_ACCESS_KEY: secret,
      AWS_DEFAULT_REGION: REGION,
      AWS_CONFIG_FILE: at('aws.ini'),
      RCLONE_CONFIG: at('rclone.ini'),
    },
  });
  return stdout;
}

beforeAll(async () => {
  standIn = await startStandIn();
  await standIn.s3.send(new CreateBucketCommand({ Bucket: OTHER_BUCKET }));
  const { accessKeyId } = CREDENTIALS;
  await Promise.all([
    writeFile(at('large'), LARGE),
    writeFile(at('small'), SMALL),
    writeFile(
      at('aws.ini'),
      '[default]\ns3 =\n  multipart_threshold = 6MB\n  multipart_chunksize = 5MB\n  addressing_style = path\n',
    ),
    writeFile(
      at('rclone.ini'),
      `[shed]\ntype = s3\nprovider = Other\nregion = ${REGION}\naccess_key_id = ${accessKeyId}\nupload_cutoff = 6Mi\nchunk_size = 5Mi\nno_check_bucket = true\n`,
    ),
    writeFile(
      at('s3cmd.ini'),
      `[default]\naccess_key = ${accessKeyId}\nbucket_location = ${REGION}\nuse_https = False\nmultipart_chunk_size_mb = 5\n`,
    ),
  ]);
});

afterAll(async () => {
  await standIn.stop();
  folder.remove();
});

for (const [name, client] of Object.entries(CLIENTS))
  describe.skipIf(!existsSync(client.program))(`${name}, which skips where it is not installed,`, () => {
    const inFolder = (key: string) => `${name}/${key}`;
    const content = async (key: string) => {
      await call(client, client.get(key, at(`${name}.got`)));
      return readFile(at(`${name}.got`));
    };

    test('sends a file in parts and gets the same bytes back', async () => {
      await call(client, client.put(at('large'), inFolder('large')));
      expect((await content(inFolder('large'))).equals(LARGE)).toBe(true);
    });

    test('reads back under a name that has to be escaped what it has sent, and lists it', async () => {
      await call(client, client.put(at('small'), inFolder(ODD_KEY)));
      expect((await content(inFolder(ODD_KEY))).equals(SMALL)).toBe(true);
      expect(await call(client, client.list(inFolder('')))).toContain('jig & fence +1 = 50% é.txt');
    });

    test('copies into another bucket and empties a folder', async () => {
      await call(client, client.put(at('small'), inFolder('small')));
      await call(client, client.copy(inFolder('small'), `${name}-copy`));
      await call(client, client.remove(inFolder('')));
      const left = await standIn.s3.send(new ListObjectsV2Command({ Bucket, Prefix: inFolder('') }));
      expect(left.KeyCount).toBe(0);
      const { Body } = await standIn.s3.send(
        new GetObjectCommand({ Bucket: OTHER_BUCKET, Key: `${name}-copy` }),
      );
      expect(await Body?.transformToString()).toBe(SMALL.toString());
    });

    test('is refused when it signs with another secret', async () => {
      await standIn.s3.send(new PutObjectCommand({ Bucket, Key: inFolder('there'), Body: SMALL }));
      const asking = call(client, client.get(inFolder('there'), at(`${name}.none`)), 'another secret');
      await expect(asking).rejects.toMatchObject({
        stderr: expect.stringMatching(/SignatureDoesNotMatch|403/) as string,
      });
    });
  });
