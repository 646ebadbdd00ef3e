import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { once } from 'node:events';
import { writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { join } from 'node:path';
import { PassThrough } from 'node:stream';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { throwawayFolder } from '../../support/throwaway.ts';
import { childEnv, forkServer, startChild } from './child-server.ts';
import { filesIn, waitFor } from './disk-watch.ts';
import { BUCKET, s3Client } from './stand-in.ts';

let folder: ReturnType<typeof throwawayFolder>;

beforeEach(() => {
  folder = throwawayFolder('fake-s3');
});

afterEach(() => {
  folder.remove();
});

/** Starts it where it cannot run; gives its exit code and what it printed. */
async function failedStart(env: NodeJS.ProcessEnv) {
  const { child, output } = forkServer(env);
  const [code] = (await once(child, 'close')) as [number | null];
  return { code, ...output() };
}

test('it says on its channel and in one line that it listens, and ends on SIGTERM', async () => {
  const server = await startChild(folder.path);
  await waitFor(() => server.output().stdout !== '');
  expect(server.output().stdout).toBe(
    `Storage stand-in listening on http://127.0.0.1:${String(server.port)}\n`,
  );
  expect(await server.end('SIGTERM')).toBe(0);
  expect(server.output().stderr).toBe('');
});

test.each(['SIGINT', 'disconnect'] as const)('it ends on %s', async (how) => {
  const server = await startChild(folder.path);
  expect(await server.end(how)).toBe(0);
});

test('a request under way when it is told to end is finished first', async () => {
  const server = await startChild(folder.path);
  const client = s3Client(server.port);
  const Body = new PassThrough();
  const where = { Bucket: BUCKET, Key: 'under-way' };
  const put = client.send(new PutObjectCommand({ ...where, Body, ContentLength: 10 }));
  Body.write('first');
  await waitFor(() => filesIn(join(folder.path, 'temp')) > 0);
  const begun = Date.now();
  const ended = server.end('SIGTERM');
  Body.end(' half');
  // "first half" has ten bytes.
  await expect(put).resolves.toMatchObject({ $metadata: { httpStatusCode: 200 } });
  expect(await ended).toBe(0);
  expect(Date.now() - begun).toBeLessThan(4500);
  client.destroy();

  const again = await startChild(folder.path);
  const reader = s3Client(again.port);
  const got = await reader.send(new GetObjectCommand(where));
  expect(await got.Body?.transformToString()).toBe('first half');
  reader.destroy();
  await again.end('SIGTERM');
});

test('a client that never finishes does not keep it from ending, and its half object is gone', async () => {
  const server = await startChild(folder.path);
  const client = s3Client(server.port);
  const Body = new PassThrough();
  const put = client.send(new PutObjectCommand({ Bucket: BUCKET, Key: 'stuck', Body, ContentLength: 10 }));
  const refused = expect(put).rejects.toThrow();
  Body.write('first');
  await waitFor(() => filesIn(join(folder.path, 'temp')) > 0);
  expect(await server.end('SIGTERM')).toBe(0);
  await refused;
  expect(filesIn(join(folder.path, 'temp'))).toBe(0);
  client.destroy();
});

test('a port in use is told in one sentence', async () => {
  const squatter = createServer().listen(0, '127.0.0.1');
  await once(squatter, 'listening');
  const port = String((squatter.address() as AddressInfo).port);
  const { code, stderr } = await failedStart(childEnv(folder.path, { FAKE_S3_PORT: port }));
  squatter.close();
  expect([code, stderr]).toEqual([1, `fake-s3: Port ${port} on 127.0.0.1 is already in use.\n`]);
});

test('a folder that cannot be written is told in one sentence', async () => {
  const file = join(folder.path, 'a-file');
  writeFileSync(file, '');
  const { code, stderr } = await failedStart(childEnv(join(file, 'below')));
  expect([code, stderr]).toEqual([
    1,
    `fake-s3: The folder ${join(file, 'below')} cannot be used (ENOTDIR).\n`,
  ]);
});

test('a setting that is missing or wrong is told in one sentence', async () => {
  const missing = await failedStart(childEnv(folder.path, { FAKE_S3_BUCKET: '' }));
  expect([missing.code, missing.stderr]).toEqual([1, 'fake-s3: FAKE_S3_BUCKET is not set.\n']);
  const wrong = await failedStart(childEnv(folder.path, { FAKE_S3_PORT: 'http' }));
  expect([wrong.code, wrong.stderr]).toEqual([
    1,
    'fake-s3: FAKE_S3_PORT is not a port number from 0 to 65535.\n',
  ]);
});
