import {
  CreateBucketCommand,
  DeleteBucketCommand,
  DeleteObjectsCommand,
  GetBucketLocationCommand,
  GetObjectCommand,
  HeadBucketCommand,
  ListBucketsCommand,
  ListObjectsV2Command,
  PutObjectCommand,
} from '@aws-sdk/client-s3';
import { createHash } from 'node:crypto';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { sendSigned } from './raw-request.ts';
import { BUCKET, REGION, refusal, startStandIn, type StandIn } from './stand-in.ts';

let standIn: StandIn;

beforeEach(async () => {
  standIn = await startStandIn();
});

afterEach(() => standIn.stop());

const put = (Key: string) => standIn.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body: Key }));
const keys = async () =>
  ((await standIn.s3.send(new ListObjectsV2Command({ Bucket: BUCKET }))).Contents ?? []).map(
    ({ Key }) => Key,
  );

test('a bucket is made, found, listed and removed', async () => {
  const { s3 } = standIn;
  await s3.send(new CreateBucketCommand({ Bucket: 'second-bench' }));
  expect((await s3.send(new HeadBucketCommand({ Bucket: 'second-bench' }))).BucketRegion).toBe(REGION);
  const { Buckets } = await s3.send(new ListBucketsCommand({}));
  expect(Buckets?.map(({ Name }) => Name)).toEqual(['second-bench', BUCKET]);
  await s3.send(new DeleteBucketCommand({ Bucket: 'second-bench' }));
  await expect(s3.send(new HeadBucketCommand({ Bucket: 'second-bench' }))).rejects.toMatchObject(
    refusal('NotFound', 404),
  );
});

test('a bucket tells its region', async () => {
  const answer = await standIn.s3.send(new GetBucketLocationCommand({ Bucket: BUCKET }));
  expect(answer.LocationConstraint).toBe(REGION);
});

test('a bucket with an object is not removed, and one that exists is not made again', async () => {
  await put('kept');
  const { s3 } = standIn;
  await expect(s3.send(new DeleteBucketCommand({ Bucket: BUCKET }))).rejects.toMatchObject(
    refusal('BucketNotEmpty', 409),
  );
  await expect(s3.send(new CreateBucketCommand({ Bucket: BUCKET }))).rejects.toMatchObject(
    refusal('BucketAlreadyOwnedByYou', 409),
  );
});

test('a name that S3 would not take is refused', async () => {
  for (const name of ['Upper', 'a', 'two..dots', '-dash']) {
    const answer = await sendSigned(standIn.port, {
      method: 'PUT',
      path: `/${name}`,
      headers: { 'content-length': '0' },
    });
    expect(answer).toMatchObject({ status: 400, code: 'InvalidBucketName' });
  }
});

test('reading and writing in a bucket that does not exist is refused', async () => {
  const { s3 } = standIn;
  const where = { Bucket: 'nowhere', Key: 'x' };
  await expect(s3.send(new GetObjectCommand(where))).rejects.toMatchObject(refusal('NoSuchBucket', 404));
  await expect(s3.send(new PutObjectCommand({ ...where, Body: 'x' }))).rejects.toMatchObject(
    refusal('NoSuchBucket', 404),
  );
});

test('a batch delete removes what is listed, present or not, and reports each', async () => {
  for (const key of ['a', 'b & c', 'd']) await put(key);
  const Delete = { Objects: [{ Key: 'a' }, { Key: 'b & c' }, { Key: 'never there' }] };
  const { Deleted, Errors } = await standIn.s3.send(new DeleteObjectsCommand({ Bucket: BUCKET, Delete }));
  expect(Deleted?.map(({ Key }) => Key)).toEqual(['a', 'b & c', 'never there']);
  expect(Errors).toBeUndefined();
  expect(await keys()).toEqual(['d']);
});

test('a quiet batch delete reports nothing', async () => {
  await put('a');
  const Delete = { Objects: [{ Key: 'a' }], Quiet: true };
  const { Deleted } = await standIn.s3.send(new DeleteObjectsCommand({ Bucket: BUCKET, Delete }));
  expect(Deleted).toBeUndefined();
  expect(await keys()).toEqual([]);
});

test('a batch delete needs a digest of its body, a right one, and a body that is a list of keys', async () => {
  await put('a');
  const deleteWith = (body: string, headers: Record<string, string>) =>
    sendSigned(standIn.port, {
      method: 'POST',
      path: `/${BUCKET}?delete=`,
      body,
      headers: { 'content-length': String(body.length), ...headers },
    });
  const md5 = (body: string) => ({ 'content-md5': createHash('md5').update(body).digest('base64') });
  const good = '<Delete><Object><Key>a</Key></Object></Delete>';
  expect(await deleteWith(good, {})).toMatchObject({ status: 400, code: 'InvalidRequest' });
  expect(await deleteWith(good, md5('other'))).toMatchObject({ status: 400, code: 'BadDigest' });
  for (const bad of [
    '<Delete></Delete>',
    '<Delete><Object>',
    'a',
    '<!DOCTYPE x><Delete><Object><Key>a</Key></Object></Delete>',
    '<Delete><Object><Name>a</Name></Object></Delete>',
  ]) {
    expect(await deleteWith(bad, md5(bad))).toMatchObject({ status: 400, code: 'MalformedXML' });
  }
  const many = `<Delete>${'<Object><Key>a</Key></Object>'.repeat(1001)}</Delete>`;
  expect(await deleteWith(many, md5(many))).toMatchObject({ status: 400, code: 'MalformedXML' });
  expect(await keys()).toEqual(['a']);
});
