import {
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  ListObjectsV2Command,
  ListPartsCommand,
  PutObjectCommand,
  UploadPartCommand,
  type S3Client,
} from '@aws-sdk/client-s3';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { PassThrough } from 'node:stream';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { startFakeS3 } from '../../../fake-s3/server.ts';
import { throwawayFolder } from '../../support/throwaway.ts';
import { startChild } from './child-server.ts';
import { filledFilesIn, filesIn, waitFor } from './disk-watch.ts';
import { BUCKET, bytesOf, CREDENTIALS, REGION, s3Client, startStandIn } from './stand-in.ts';

const Bucket = BUCKET;
let folder: ReturnType<typeof throwawayFolder>;

beforeEach(() => {
  folder = throwawayFolder('fake-s3');
});

afterEach(() => {
  folder.remove();
});

/** Works with a server process on the folder, kills it outright, and waits for it to be gone. */
async function untilKilled(work: (s3: S3Client) => Promise<unknown>): Promise<void> {
  const server = await startChild(folder.path);
  const s3 = s3Client(server.port);
  await work(s3);
  await server.end('SIGKILL');
  s3.destroy();
}

/** Works with a fresh server on the folder. */
async function afterwards(work: (s3: S3Client) => Promise<void>): Promise<void> {
  const server = await startFakeS3({
    folder: folder.path,
    port: 0,
    bucket: Bucket,
    region: REGION,
    ...CREDENTIALS,
  });
  const s3 = s3Client(server.port);
  await work(s3);
  s3.destroy();
  await server.close();
}

const content = async (s3: S3Client, Key: string) =>
  (await s3.send(new GetObjectCommand({ Bucket, Key }))).Body?.transformToString();
const keys = async (s3: S3Client) =>
  ((await s3.send(new ListObjectsV2Command({ Bucket }))).Contents ?? []).map(({ Key }) => Key);

/** Begins a PUT that announces 8 MiB and sends 2 of them, and waits until bytes of it are on disk. */
async function beginPut(s3: S3Client, Key: string): Promise<void> {
  const before = filledFilesIn(join(folder.path, 'temp'));
  const Body = new PassThrough();
  const put = s3.send(new PutObjectCommand({ Bucket, Key, Body, ContentLength: 8 * 1024 ** 2 }));
  put.catch(() => undefined);
  Body.write(bytesOf(2 * 1024 ** 2));
  await waitFor(() => filledFilesIn(join(folder.path, 'temp')) > before);
}

test('after a kill in the middle of a PUT the new object is not there and the earlier version is whole', async () => {
  await untilKilled(async (s3) => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'edit.mp4', Body: 'the earlier version' }));
    await beginPut(s3, 'edit.mp4');
    await beginPut(s3, 'never-before.mp4');
  });
  expect(filesIn(join(folder.path, 'temp'))).toBe(2);
  await afterwards(async (s3) => {
    expect(await keys(s3)).toEqual(['edit.mp4']);
    expect(await content(s3, 'edit.mp4')).toBe('the earlier version');
    expect(filesIn(join(folder.path, 'temp'))).toBe(0);
  });
});

test('after a kill in the middle of a part the parts before it are there, and the upload can be finished', async () => {
  const upload = { Bucket, Key: 'edit.mp4' };
  let UploadId: string | undefined;
  const first = bytesOf(5 * 1024 ** 2);
  await untilKilled(async (s3) => {
    ({ UploadId } = await s3.send(new CreateMultipartUploadCommand(upload)));
    await s3.send(new UploadPartCommand({ ...upload, UploadId, PartNumber: 1, Body: first }));
    const Body = new PassThrough();
    const part = new UploadPartCommand({
      ...upload,
      UploadId,
      PartNumber: 2,
      Body,
      ContentLength: 4_000_000,
    });
    s3.send(part).catch(() => undefined);
    Body.write(bytesOf(1_000_000));
    await waitFor(() => filledFilesIn(join(folder.path, 'temp')) > 0);
  });
  await afterwards(async (s3) => {
    const { Parts } = await s3.send(new ListPartsCommand({ ...upload, UploadId }));
    expect(Parts?.map(({ PartNumber, Size }) => [PartNumber, Size])).toEqual([[1, first.length]]);
    const last = await s3.send(new UploadPartCommand({ ...upload, UploadId, PartNumber: 2, Body: 'end' }));
    const listed = [
      { PartNumber: 1, ETag: Parts?.[0]?.ETag },
      { PartNumber: 2, ETag: last.ETag },
    ];
    await s3.send(
      new CompleteMultipartUploadCommand({ ...upload, UploadId, MultipartUpload: { Parts: listed } }),
    );
    expect(await content(s3, 'edit.mp4')).toBe(`${first.toString('utf8')}end`);
  });
});

test('data that no record points at, as between two renames, is cleared at the next start', async () => {
  await untilKilled((s3) => s3.send(new PutObjectCommand({ Bucket, Key: 'kept', Body: 'kept' })));
  writeFileSync(join(folder.path, 'data', 'orphan'), 'bytes without a record');
  mkdirSync(join(folder.path, 'uploads', 'half-begun', 'parts'), { recursive: true });
  await afterwards(async (s3) => {
    expect(await content(s3, 'kept')).toBe('kept');
    expect(filesIn(join(folder.path, 'data'))).toBe(1);
    expect(filesIn(join(folder.path, 'uploads'))).toBe(0);
  });
});

test('a client that goes away in the middle of a PUT leaves nothing', async () => {
  const standIn = await startStandIn();
  const temp = join(standIn.folder, 'temp');
  const leaving = new AbortController();
  const Body = new PassThrough();
  const put = new PutObjectCommand({ Bucket, Key: 'abandoned', Body, ContentLength: 1000 });
  const sent = expect(standIn.s3.send(put, { abortSignal: leaving.signal })).rejects.toThrow();
  Body.write('a few bytes');
  await waitFor(() => filesIn(temp) > 0);
  leaving.abort();
  await sent;
  await waitFor(() => filesIn(temp) === 0);
  expect(await keys(standIn.s3)).toEqual([]);
  await standIn.stop();
});
