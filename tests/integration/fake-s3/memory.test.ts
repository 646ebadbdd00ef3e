import {
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  PutObjectCommand,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { Readable } from 'node:stream';
import { expect, test } from 'vitest';
import { throwawayFolder } from '../../support/throwaway.ts';
import { startChild } from './child-server.ts';
import { BUCKET, bytesOf, s3Client } from './stand-in.ts';

const MIB = 1024 ** 2;
// 2 GiB takes a minute of a small machine; FAKE_S3_BIG=1 asks for it.
const SIZE = (process.env['FAKE_S3_BIG'] ? 2048 : 512) * MIB;
const LIMIT_KIB = 150 * 1024;
const Bucket = BUCKET;

/** A body of so many MiB that is never in memory as a whole. */
const bodyOf = (size: number): Readable => {
  const block = bytesOf(MIB / 4);
  const blocks = function* () {
    for (let sent = 0; sent < size; sent += block.length) yield block;
  };
  return Readable.from(blocks(), { objectMode: false });
};

test('a large object written whole, written in parts and read does not grow the process past 150 MiB', async () => {
  const folder = throwawayFolder('fake-s3');
  const server = await startChild(folder.path);
  const s3 = s3Client(server.port);
  await s3.send(new PutObjectCommand({ Bucket, Key: 'whole', Body: bodyOf(SIZE), ContentLength: SIZE }));
  const got = await s3.send(new GetObjectCommand({ Bucket, Key: 'whole' }));
  let read = 0;
  for await (const piece of got.Body as Readable) read += (piece as Buffer).length;
  expect(read).toBe(SIZE);

  const upload = { Bucket, Key: 'in parts' };
  const { UploadId } = await s3.send(new CreateMultipartUploadCommand(upload));
  const Parts = [];
  for (const PartNumber of [1, 2, 3, 4]) {
    const part = { ...upload, UploadId, PartNumber, Body: bodyOf(SIZE / 4), ContentLength: SIZE / 4 };
    const { ETag } = await s3.send(new UploadPartCommand(part));
    Parts.push({ PartNumber, ETag });
  }
  const begun = Date.now();
  await s3.send(new CompleteMultipartUploadCommand({ ...upload, UploadId, MultipartUpload: { Parts } }));
  // The parts become the object where they are: no time for copying them.
  expect(Date.now() - begun).toBeLessThan(1000);

  expect(server.peakKiB()).toBeLessThan(LIMIT_KIB);
  if (process.env['FAKE_S3_BIG']) process.stdout.write(`Peak: ${String(server.peakKiB())} KiB\n`);
  s3.destroy();
  await server.end('SIGTERM');
  folder.remove();
}, 300_000);
