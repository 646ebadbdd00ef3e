import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListMultipartUploadsCommand,
  ListPartsCommand,
  PutObjectCommand,
  UploadPartCommand,
  type CompletedPart,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { createHash } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { filesIn, waitFor } from './disk-watch.ts';
import { sendSigned } from './raw-request.ts';
import { BUCKET, bytesOf, refusal, startStandIn, type StandIn } from './stand-in.ts';

const MIB = 1024 * 1024;
const Bucket = BUCKET;
const Key = 'incoming/bench left.mov';

let standIn: StandIn;

beforeEach(async () => {
  standIn = await startStandIn();
});

afterEach(() => standIn.stop());

const create = async (more: object = {}) =>
  (await standIn.s3.send(new CreateMultipartUploadCommand({ Bucket, Key, ...more }))).UploadId!;
const upload = async (
  UploadId: string,
  PartNumber: number,
  Body: Buffer,
  more: object = {},
): Promise<CompletedPart> => {
  const part = await standIn.s3.send(
    new UploadPartCommand({ Bucket, Key, UploadId, PartNumber, Body, ...more }),
  );
  return { PartNumber, ETag: part.ETag };
};
const complete = (UploadId: string, Parts: CompletedPart[], more: object = {}) =>
  standIn.s3.send(
    new CompleteMultipartUploadCommand({ Bucket, Key, UploadId, MultipartUpload: { Parts }, ...more }),
  );
const listParts = (UploadId: string, more: object = {}) =>
  standIn.s3.send(new ListPartsCommand({ Bucket, Key, UploadId, ...more }));
const get = (Range?: string) =>
  standIn.s3.send(new GetObjectCommand({ Bucket, Key, ...(Range ? { Range } : {}) }));
const dataFiles = () => readdir(join(standIn.folder, 'data'));

test('an upload of three parts becomes one object, readable in ranges across their seams', async () => {
  const whole = bytesOf(12 * MIB);
  const uploadId = await create({ ContentType: 'video/quicktime', Metadata: { camera: 'left' } });
  const pieces = [whole.subarray(0, 5 * MIB), whole.subarray(5 * MIB, 10 * MIB), whole.subarray(10 * MIB)];
  const parts = await Promise.all(pieces.map((piece, index) => upload(uploadId, index + 1, piece)));
  await expect(get()).rejects.toMatchObject(refusal('NoSuchKey', 404));

  const md5s = pieces.map((piece) => createHash('md5').update(piece).digest());
  const etag = `"${createHash('md5').update(Buffer.concat(md5s)).digest('hex')}-3"`;
  expect(await complete(uploadId, parts)).toMatchObject({ ETag: etag, Bucket, Key });

  const head = await standIn.s3.send(new HeadObjectCommand({ Bucket, Key }));
  const kept = { ContentType: 'video/quicktime', Metadata: { camera: 'left' } };
  expect(head).toMatchObject({ ...kept, ContentLength: 12 * MIB, ETag: etag });
  expect(Buffer.from(await (await get()).Body!.transformToByteArray()).equals(whole)).toBe(true);
  const [from, to] = [5 * MIB - 10, 10 * MIB + 10];
  const range = await get(`bytes=${String(from)}-${String(to)}`);
  expect(Buffer.from(await range.Body!.transformToByteArray()).equals(whole.subarray(from, to + 1))).toBe(
    true,
  );
});

test('a reader of an object that is replaced meanwhile gets every part of it, and then they are gone', async () => {
  // The first part is more than the connection buffers, so the second is opened after the replacement.
  const pieces = [bytesOf(16 * MIB), Buffer.from('the end')];
  const uploadId = await create();
  const parts = await Promise.all(pieces.map((piece, index) => upload(uploadId, index + 1, piece)));
  await complete(uploadId, parts);
  const reading = await get();
  await standIn.s3.send(new PutObjectCommand({ Bucket, Key, Body: 'replaced' }));
  const read = Buffer.from(await reading.Body!.transformToByteArray());
  expect(read.equals(Buffer.concat(pieces))).toBe(true);
  await waitFor(() => filesIn(join(standIn.folder, 'data')) === 1);
});

test('parts and uploads are listed while under way, and neither afterwards', async () => {
  const uploadId = await create();
  const second = await upload(uploadId, 2, bytesOf(1000));
  const first = await upload(uploadId, 1, bytesOf(5 * MIB));
  const { Parts } = await listParts(uploadId);
  expect(Parts).toMatchObject([
    { ...first, Size: 5 * MIB },
    { ...second, Size: 1000 },
  ]);
  const list = async () => (await standIn.s3.send(new ListMultipartUploadsCommand({ Bucket }))).Uploads;
  expect(await list()).toMatchObject([{ Key, UploadId: uploadId }]);
  await complete(uploadId, [first, second]);
  expect(await list()).toBeUndefined();
  await expect(listParts(uploadId)).rejects.toMatchObject(refusal('NoSuchUpload', 404));
});

test('parts and uploads are listed in pages', async () => {
  const ids = [await create(), await create(), await create()];
  for (const number of [1, 2, 3]) await upload(ids[0]!, number, bytesOf(10));
  const first = await listParts(ids[0]!, { MaxParts: 2 });
  expect(first).toMatchObject({ IsTruncated: true, NextPartNumberMarker: '2' });
  const rest = await listParts(ids[0]!, { MaxParts: 2, PartNumberMarker: first.NextPartNumberMarker });
  expect(rest.Parts?.map(({ PartNumber }) => PartNumber)).toEqual([3]);
  expect(rest.IsTruncated).toBe(false);

  const seen: (string | undefined)[] = [];
  let marker = {};
  for (;;) {
    const page = await standIn.s3.send(
      new ListMultipartUploadsCommand({ Bucket, MaxUploads: 1, Prefix: 'incoming/', ...marker }),
    );
    seen.push(...(page.Uploads ?? []).map(({ UploadId }) => UploadId));
    if (!page.IsTruncated) break;
    marker = { KeyMarker: page.NextKeyMarker, UploadIdMarker: page.NextUploadIdMarker };
  }
  expect(seen.toSorted()).toEqual(ids.toSorted());
});

test('an aborted upload takes its parts with it', async () => {
  const uploadId = await create();
  const part = await upload(uploadId, 1, bytesOf(1000));
  expect(await dataFiles()).toHaveLength(1);
  await standIn.s3.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId: uploadId }));
  expect(await dataFiles()).toEqual([]);
  await expect(complete(uploadId, [part])).rejects.toMatchObject(refusal('NoSuchUpload', 404));
  await expect(upload(uploadId, 2, bytesOf(10))).rejects.toMatchObject(refusal('NoSuchUpload', 404));
});

test('a part sent again replaces the first, and a part left out of the list is dropped', async () => {
  const uploadId = await create();
  const stale = await upload(uploadId, 1, bytesOf(5 * MIB));
  const part = await upload(uploadId, 1, Buffer.from('the second take'));
  await upload(uploadId, 2, bytesOf(10));
  await expect(complete(uploadId, [stale])).rejects.toMatchObject(refusal('InvalidPart', 400));
  await complete(uploadId, [part]);
  expect(await (await get()).Body?.transformToString()).toBe('the second take');
  expect(await dataFiles()).toHaveLength(1);
});

test('a part under 5 MiB is refused on completion unless it is the last', async () => {
  const uploadId = await create();
  const small = await upload(uploadId, 1, bytesOf(5 * MIB - 1));
  const last = await upload(uploadId, 2, bytesOf(1));
  await expect(complete(uploadId, [small, last])).rejects.toMatchObject(refusal('EntityTooSmall', 400));
  const enough = await upload(uploadId, 1, bytesOf(5 * MIB));
  await expect(complete(uploadId, [enough, last])).resolves.toBeDefined();
});

test('a list out of order, with a repeat, a wrong ETag, a missing part or no part is refused, and the upload goes on', async () => {
  const uploadId = await create();
  const first = await upload(uploadId, 1, bytesOf(5 * MIB));
  const second = await upload(uploadId, 2, bytesOf(10));
  for (const [parts, code] of [
    [[second, first], 'InvalidPartOrder'],
    [[first, first], 'InvalidPartOrder'],
    [[{ ...first, ETag: second.ETag }, second], 'InvalidPart'],
    [[first, { ...second, PartNumber: 3 }], 'InvalidPart'],
    [[], 'MalformedXML'],
  ] as const) {
    await expect(complete(uploadId, [...parts])).rejects.toMatchObject(refusal(code, 400));
  }
  await expect(complete(uploadId, [first, second])).resolves.toBeDefined();
});

test('completing again answers alike, for a client that lost the first answer', async () => {
  const uploadId = await create();
  const part = await upload(uploadId, 1, bytesOf(10));
  const first = await complete(uploadId, [part]);
  const again = await complete(uploadId, [part]);
  expect(again.ETag).toBe(first.ETag);
});

test('completing with If-None-Match: * where there is an object is refused, and the upload goes on', async () => {
  await standIn.s3.send(new PutObjectCommand({ Bucket, Key, Body: 'there already' }));
  const uploadId = await create();
  const part = await upload(uploadId, 1, bytesOf(10));
  await expect(complete(uploadId, [part], { IfNoneMatch: '*' })).rejects.toMatchObject(
    refusal('PreconditionFailed', 412),
  );
  expect(await (await get()).Body?.transformToString()).toBe('there already');
  expect((await listParts(uploadId)).Parts).toHaveLength(1);
});

test('an upload belongs to its key', async () => {
  const uploadId = await create();
  const elsewhere = standIn.s3.send(
    new UploadPartCommand({ Bucket, Key: 'another', UploadId: uploadId, PartNumber: 1, Body: 'x' }),
  );
  await expect(elsewhere).rejects.toMatchObject(refusal('NoSuchUpload', 404));
});

test('part numbers run from 1 to 10 000', async () => {
  const uploadId = await create();
  await upload(uploadId, 10_000, bytesOf(1));
  for (const number of ['0', '10001', '-1', 'x']) {
    const path = `/${Bucket}/incoming/bench%20left.mov?partNumber=${number}&uploadId=${uploadId}`;
    const answer = await sendSigned(standIn.port, {
      method: 'PUT',
      path,
      body: 'x',
      headers: { 'content-length': '1' },
    });
    expect(answer).toMatchObject({ status: 400, code: 'InvalidArgument' });
  }
});

test('a presigned part with its length signed takes exactly that many bytes', async () => {
  const uploadId = await create();
  const command = new UploadPartCommand({ Bucket, Key, UploadId: uploadId, PartNumber: 1, ContentLength: 4 });
  const url = await getSignedUrl(standIn.s3, command, {
    signableHeaders: new Set(['host', 'content-length']),
  });
  expect((await fetch(url, { method: 'PUT', body: 'short' })).status).toBe(403);
  const put = await fetch(url, { method: 'PUT', body: 'four' });
  expect(put.status).toBe(200);
  expect(put.headers.get('etag')).toBe(`"${createHash('md5').update('four').digest('hex')}"`);
});

test('checksums of parts are verified and become one of the whole', async () => {
  const uploadId = await create({ ChecksumAlgorithm: 'SHA256' });
  const bytes = bytesOf(5 * MIB);
  const sum = createHash('sha256').update(bytes).digest();
  const wrong = upload(uploadId, 1, bytes, {
    ChecksumSHA256: createHash('sha256').update('x').digest('base64'),
  });
  await expect(wrong).rejects.toMatchObject(refusal('BadDigest', 400));
  const part = await upload(uploadId, 1, bytes, { ChecksumSHA256: sum.toString('base64') });
  const listed = await listParts(uploadId);
  expect(listed.Parts?.[0]?.ChecksumSHA256).toBe(sum.toString('base64'));
  const done = await complete(uploadId, [{ ...part, ChecksumSHA256: sum.toString('base64') }]);
  expect(done.ChecksumSHA256).toBe(`${createHash('sha256').update(sum).digest('base64')}-1`);
});
