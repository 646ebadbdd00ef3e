import {
  CompleteMultipartUploadCommand,
  CopyObjectCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  PutObjectCommand,
  UploadPartCommand,
  UploadPartCopyCommand,
} from '@aws-sdk/client-s3';
import { createHash } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { BUCKET, bytesOf, refusal, startStandIn, type StandIn } from './stand-in.ts';

const Bucket = BUCKET;
const source = 'incoming/jig & fence +1.mov';
const CopySource = `${BUCKET}/${encodeURIComponent(source)}`;
const bytes = bytesOf(6 * 1024 * 1024);

let standIn: StandIn;

beforeAll(async () => {
  standIn = await startStandIn();
  const described = { ContentType: 'video/quicktime', Metadata: { camera: 'left' } };
  await standIn.s3.send(new PutObjectCommand({ Bucket, Key: source, Body: bytes, ...described }));
});

afterAll(() => standIn.stop());

const copy = (Key: string, more: object = {}) =>
  standIn.s3.send(new CopyObjectCommand({ Bucket, Key, CopySource, ...more }));
const get = (Key: string) => standIn.s3.send(new GetObjectCommand({ Bucket, Key }));
const content = async (Key: string) => Buffer.from(await (await get(Key)).Body!.transformToByteArray());

test('a copy has the bytes, type and metadata of its source and outlives it', async () => {
  const temporary = `${BUCKET}/${encodeURIComponent('temporary')}`;
  await copy('temporary');
  await standIn.s3.send(new CopyObjectCommand({ Bucket, Key: 'kept', CopySource: temporary }));
  await standIn.s3.send(new DeleteObjectCommand({ Bucket, Key: 'temporary' }));
  expect((await content('kept')).equals(bytes)).toBe(true);
  expect(await get('kept')).toMatchObject({ ContentType: 'video/quicktime', Metadata: { camera: 'left' } });
});

test('a copy can be given new metadata, even onto itself', async () => {
  const replaced = { MetadataDirective: 'REPLACE', ContentType: 'video/mp4' };
  await copy('renamed', replaced);
  const onto = { ...replaced, CopySource: `${BUCKET}/renamed`, CacheControl: 'private' };
  await copy('renamed', onto);
  const got = await get('renamed');
  expect(got).toMatchObject({ ContentType: 'video/mp4', CacheControl: 'private', Metadata: {} });
  expect((await content('renamed')).equals(bytes)).toBe(true);
  const unchanged = copy('renamed', { CopySource: `${BUCKET}/renamed` });
  await expect(unchanged).rejects.toMatchObject(refusal('InvalidRequest', 400));
});

test('a copy is made only when the conditions on its source and its target hold', async () => {
  const { ETag } = await get(source);
  await expect(copy('c1', { CopySourceIfMatch: '"other"' })).rejects.toMatchObject(
    refusal('PreconditionFailed', 412),
  );
  await expect(copy('c1', { CopySourceIfNoneMatch: ETag })).rejects.toMatchObject(
    refusal('PreconditionFailed', 412),
  );
  await expect(get('c1')).rejects.toMatchObject(refusal('NoSuchKey', 404));
  await copy('c1', { CopySourceIfMatch: ETag, IfNoneMatch: '*' });
  await expect(copy('c1', { IfNoneMatch: '*' })).rejects.toMatchObject(refusal('PreconditionFailed', 412));
});

test('a copy of what is not there, or of no object at all, is refused', async () => {
  await expect(copy('c2', { CopySource: `${BUCKET}/absent` })).rejects.toMatchObject(
    refusal('NoSuchKey', 404),
  );
  await expect(copy('c2', { CopySource: 'nowhere/absent' })).rejects.toMatchObject(
    refusal('NoSuchBucket', 404),
  );
  await expect(copy('c2', { CopySource: 'nothing' })).rejects.toMatchObject(refusal('InvalidArgument', 400));
});

test('parts can be copied from ranges of an object, and a copy of the result has a plain MD5 as ETag', async () => {
  const target = { Bucket, Key: 'spliced' };
  const { UploadId } = await standIn.s3.send(new CreateMultipartUploadCommand(target));
  const range = `bytes=1000-${String(1000 + 5 * 1024 * 1024 - 1)}`;
  const first = { ...target, UploadId, PartNumber: 1, CopySource, CopySourceRange: range };
  const { CopyPartResult } = await standIn.s3.send(new UploadPartCopyCommand(first));
  const second = await standIn.s3.send(
    new UploadPartCommand({ ...target, UploadId, PartNumber: 2, Body: 'tail' }),
  );
  const Parts = [
    { PartNumber: 1, ETag: CopyPartResult?.ETag },
    { PartNumber: 2, ETag: second.ETag },
  ];
  await standIn.s3.send(
    new CompleteMultipartUploadCommand({ ...target, UploadId, MultipartUpload: { Parts } }),
  );
  const expected = Buffer.concat([bytes.subarray(1000, 1000 + 5 * 1024 * 1024), Buffer.from('tail')]);
  expect((await content('spliced')).equals(expected)).toBe(true);

  const copied = await copy('spliced copy', { CopySource: `${BUCKET}/spliced` });
  expect(copied.CopyObjectResult?.ETag).toBe(`"${createHash('md5').update(expected).digest('hex')}"`);
  expect((await content('spliced copy')).equals(expected)).toBe(true);
});

test('a part range outside its source is refused', async () => {
  const target = { Bucket, Key: 'outside' };
  const { UploadId } = await standIn.s3.send(new CreateMultipartUploadCommand(target));
  for (const CopySourceRange of [`bytes=0-${String(bytes.length)}`, 'bytes=5-2', 'bytes=5-']) {
    const part = new UploadPartCopyCommand({
      ...target,
      UploadId,
      PartNumber: 1,
      CopySource,
      CopySourceRange,
    });
    await expect(standIn.s3.send(part)).rejects.toMatchObject(refusal('InvalidArgument', 400));
  }
});
