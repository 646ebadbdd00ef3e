import {
  DeleteObjectCommand,
  GetObjectCommand,
  ListObjectsCommand,
  ListObjectsV2Command,
  type ListObjectsCommandOutput,
  PutObjectCommand,
  type ListObjectsV2CommandInput,
} from '@aws-sdk/client-s3';
import fc from 'fast-check';
import { readdir } from 'node:fs/promises';
import { dirname } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { compareUtf8 } from '../../../fake-s3/listing.ts';
import { sendSigned } from './raw-request.ts';
import { BUCKET, refusal, startStandIn, type StandIn } from './stand-in.ts';

let standIn: StandIn;

beforeAll(async () => {
  standIn = await startStandIn();
});

afterAll(() => standIn.stop());

const put = (Key: string, Body = 'x') => standIn.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body }));
const list = (input: Partial<ListObjectsV2CommandInput>) =>
  standIn.s3.send(new ListObjectsV2Command({ Bucket: BUCKET, ...input }));
const keys = (answer: ListObjectsCommandOutput) => (answer.Contents ?? []).map(({ Key }) => Key);
const prefixes = (answer: ListObjectsCommandOutput) =>
  (answer.CommonPrefixes ?? []).map(({ Prefix }) => Prefix);

/** Every page of a listing, following the tokens. */
async function pages(input: Partial<ListObjectsV2CommandInput>): Promise<string[][]> {
  const found: string[][] = [];
  let token: string | undefined;
  do {
    const answer = await list({ ...input, ...(token === undefined ? {} : { ContinuationToken: token }) });
    found.push([...keys(answer), ...prefixes(answer)] as string[]);
    token = answer.NextContinuationToken;
    expect(answer.IsTruncated).toBe(token !== undefined);
  } while (token !== undefined);
  return found;
}

test('keys of every kind come back in the order of their UTF-8 bytes', async () => {
  const given = [
    'odd/a b',
    'odd/a+b',
    'odd/a&b=<c>"\'',
    'odd/ﬁ',
    'odd/😀',
    'odd/é',
    'odd/#?%2F',
    'odd/.',
    'odd//',
    'odd/~',
  ];
  for (const key of given) await put(key, `of ${key}`);
  const expected = [...given].sort((a, b) => Buffer.compare(Buffer.from(a), Buffer.from(b)));
  expect(keys(await list({ Prefix: 'odd/' }))).toEqual(expected);
  for (const key of given) {
    const got = await standIn.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: key }));
    expect(await got.Body?.transformToString()).toBe(`of ${key}`);
  }
});

test('comparing two texts gives the order of their UTF-8 bytes', () => {
  const text = fc.string({ unit: 'binary' });
  fc.assert(
    fc.property(text, text, (a, b) => {
      expect(Math.sign(compareUtf8(a, b))).toBe(Buffer.compare(Buffer.from(a), Buffer.from(b)));
    }),
  );
});

test('with encoding-type=url keys are percent-encoded', async () => {
  await put('enc/a b+c&ü');
  expect(keys(await list({ Prefix: 'enc/', EncodingType: 'url' }))).toEqual(['enc/a%20b%2Bc%26%C3%BC']);
});

test('a delimiter folds keys into common prefixes, counted once each', async () => {
  for (const key of ['tree/a', 'tree/b/1', 'tree/b/2', 'tree/c/1', 'tree/d']) await put(key);
  const answer = await list({ Prefix: 'tree/', Delimiter: '/' });
  expect(keys(answer)).toEqual(['tree/a', 'tree/d']);
  expect(prefixes(answer)).toEqual(['tree/b/', 'tree/c/']);
  expect(answer.KeyCount).toBe(4);
});

test('pages follow one another without a gap or a repeat, common prefixes included', async () => {
  for (const key of ['page/a', 'page/b/1', 'page/b/2', 'page/c', 'page/d/1', 'page/e']) await put(key);
  const flat = await pages({ Prefix: 'page/', MaxKeys: 2 });
  expect(flat).toEqual([
    ['page/a', 'page/b/1'],
    ['page/b/2', 'page/c'],
    ['page/d/1', 'page/e'],
  ]);
  const folded = await pages({ Prefix: 'page/', Delimiter: '/', MaxKeys: 1 });
  expect(folded.flat()).toEqual(['page/a', 'page/b/', 'page/c', 'page/d/', 'page/e']);
});

test('the older listing goes on after the key or prefix that it gave last', async () => {
  for (const key of ['old/a', 'old/b/1', 'old/b/2', 'old/c', 'old/d']) await put(key);
  const query = { Bucket: BUCKET, Prefix: 'old/', MaxKeys: 2 };
  const first = await standIn.s3.send(new ListObjectsCommand({ ...query, Delimiter: '/' }));
  expect([keys(first), prefixes(first), first.NextMarker]).toEqual([['old/a'], ['old/b/'], 'old/b/']);
  const Marker = first.NextMarker;
  const second = await standIn.s3.send(new ListObjectsCommand({ ...query, Delimiter: '/', Marker }));
  expect([keys(second), prefixes(second), second.IsTruncated]).toEqual([['old/c', 'old/d'], [], false]);
  const flat = await standIn.s3.send(new ListObjectsCommand({ ...query, Marker: 'old/b/1' }));
  expect([keys(flat), flat.NextMarker, flat.IsTruncated]).toEqual([['old/b/2', 'old/c'], undefined, true]);
});

test('start-after begins behind a key, whether or not it exists', async () => {
  for (const key of ['after/a', 'after/c']) await put(key);
  expect(keys(await list({ Prefix: 'after/', StartAfter: 'after/a' }))).toEqual(['after/c']);
  expect(keys(await list({ Prefix: 'after/', StartAfter: 'after/b' }))).toEqual(['after/c']);
  expect(keys(await list({ Prefix: 'after/', StartAfter: 'after/c' }))).toEqual([]);
});

test('max-keys of zero lists nothing, and one that is no number is refused', async () => {
  expect(await list({ MaxKeys: 0 })).toMatchObject({ KeyCount: 0, IsTruncated: false });
  const answer = await sendSigned(standIn.port, { path: `/${BUCKET}?list-type=2&max-keys=few` });
  expect(answer).toMatchObject({ status: 400, code: 'InvalidArgument' });
  const token = await sendSigned(standIn.port, { path: `/${BUCKET}?continuation-token=AAAA&list-type=2` });
  expect(token).toMatchObject({ status: 400, code: 'InvalidArgument' });
});

test.each([
  '../../escape',
  '..',
  '../../../../etc/passwd',
  'a/../../b',
  '/absolute',
  'back\\slash',
  'nul\u0000',
  'x.json',
])('the key %j names an object and no file outside the folder', async (key) => {
  const outside = await readdir(dirname(standIn.folder));
  const path = `/${BUCKET}/${key.split('/').map(encodeURIComponent).join('/')}`;
  const written = await sendSigned(standIn.port, {
    method: 'PUT',
    path,
    body: key,
    headers: { 'content-length': String(key.length) },
  });
  expect(written.status).toBe(200);
  expect((await sendSigned(standIn.port, { path })).text).toBe(key);
  expect((await readdir(standIn.folder)).sort()).toEqual(['buckets', 'data', 'temp', 'uploads']);
  const here = outside.filter((name) => name.includes('escape') || name === 'b');
  expect(here).toEqual([]);
});

test.each(['..', '.', '%2e%2e%2f%2e%2e'])('the bucket %j does not exist', async (bucket) => {
  const answer = await sendSigned(standIn.port, { path: `/${decodeURIComponent(bucket)}/temp` });
  expect(answer).toMatchObject({ status: 404, code: 'NoSuchBucket' });
});

test('a key may have 1024 bytes and no more', async () => {
  const longest = 'ü'.repeat(512);
  await put(longest);
  expect(keys(await list({ Prefix: longest }))).toEqual([longest]);
  await expect(put(`${longest}x`)).rejects.toMatchObject(refusal('KeyTooLongError', 400));
  await standIn.s3.send(new DeleteObjectCommand({ Bucket: BUCKET, Key: longest }));
});
