import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  PutObjectCommand,
  type GetObjectCommandInput,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { createHash } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sendSigned } from './raw-request.ts';
import { BUCKET, bytesOf, refusal, s3Client, startStandIn, type StandIn } from './stand-in.ts';

let standIn: StandIn;

beforeAll(async () => {
  standIn = await startStandIn();
});

afterAll(() => standIn.stop());

const put = (Key: string, Body: string | Buffer, more: object = {}) =>
  standIn.s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body, ...more }));
const get = (Key: string, more: Partial<GetObjectCommandInput> = {}) =>
  standIn.s3.send(new GetObjectCommand({ Bucket: BUCKET, Key, ...more }));
const head = (Key: string) => standIn.s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key }));
const remove = (Key: string, more: object = {}) =>
  standIn.s3.send(new DeleteObjectCommand({ Bucket: BUCKET, Key, ...more }));
const text = async (Key: string) => (await get(Key)).Body?.transformToString();

test('an object comes back as it was put, with the MD5 of its bytes as ETag', async () => {
  const bytes = bytesOf(300_001);
  const etag = `"${createHash('md5').update(bytes).digest('hex')}"`;
  expect((await put('clip.mov', bytes)).ETag).toBe(etag);
  const got = await get('clip.mov');
  expect(Buffer.from(await got.Body!.transformToByteArray()).equals(bytes)).toBe(true);
  expect(got).toMatchObject({ ETag: etag, ContentLength: 300_001, AcceptRanges: 'bytes' });
  expect(Date.now() - got.LastModified!.getTime()).toBeLessThan(60_000);
});

test('headers and metadata of the PUT come back on GET and HEAD', async () => {
  const headers = {
    ContentType: 'video/quicktime',
    CacheControl: 'private, max-age=60',
    ContentDisposition: 'attachment; filename="jig.mov"',
    ContentLanguage: 'nl',
    ContentEncoding: 'gzip',
    Metadata: { camera: 'bench left', 'take-2': 'yes' },
  };
  await put('described.mov', 'frames', headers);
  expect(await get('described.mov')).toMatchObject(headers);
  expect(await head('described.mov')).toMatchObject({ ...headers, ContentLength: 6 });
});

test('an empty object is whole, and an object without a type is bytes', async () => {
  await put('empty', Buffer.alloc(0), { ContentLength: 0 });
  const got = await get('empty');
  expect(got).toMatchObject({ ContentLength: 0, ETag: '"d41d8cd98f00b204e9800998ecf8427e"' });
  expect(await got.Body?.transformToString()).toBe('');
  await sendSigned(standIn.port, {
    method: 'PUT',
    path: `/${BUCKET}/untyped`,
    body: 'x',
    headers: { 'content-length': '1' },
  });
  expect((await get('untyped')).ContentType).toBe('binary/octet-stream');
});

test('a second PUT replaces the first, and the first one leaves no file behind', async () => {
  const before = (await readdir(join(standIn.folder, 'data'))).length;
  await put('twice', 'first');
  await put('twice', 'second');
  expect(await text('twice')).toBe('second');
  expect(await readdir(join(standIn.folder, 'data'))).toHaveLength(before + 1);
  expect(await readdir(join(standIn.folder, 'temp'))).toEqual([]);
});

test('a reader of an object that is replaced meanwhile gets the old one to its end', async () => {
  const old = bytesOf(8_000_000);
  await put('read-while-replaced', old);
  const got = await get('read-while-replaced');
  await put('read-while-replaced', 'new');
  expect(Buffer.from(await got.Body!.transformToByteArray()).equals(old)).toBe(true);
  expect(await text('read-while-replaced')).toBe('new');
});

test('a deleted object is gone, and deleting it again is no error', async () => {
  await put('scrap', 'offcut');
  expect((await remove('scrap')).$metadata.httpStatusCode).toBe(204);
  await expect(get('scrap')).rejects.toMatchObject(refusal('NoSuchKey', 404));
  await expect(head('scrap')).rejects.toMatchObject(refusal('NotFound', 404));
  expect((await remove('scrap')).$metadata.httpStatusCode).toBe(204);
});

test('a presigned GET can override type, disposition and caching', async () => {
  await put('overridden', 'pdf', { ContentType: 'text/plain', CacheControl: 'no-store' });
  const command = new GetObjectCommand({
    Bucket: BUCKET,
    Key: 'overridden',
    ResponseContentType: 'application/pdf',
    ResponseContentDisposition: `attachment; filename="plan.pdf"; filename*=UTF-8''pl%C3%A5n.pdf`,
    ResponseCacheControl: 'private',
  });
  const response = await fetch(await getSignedUrl(standIn.s3, command));
  expect(await response.text()).toBe('pdf');
  expect(response.headers.get('content-type')).toBe('application/pdf');
  expect(response.headers.get('content-disposition')).toContain("UTF-8''pl%C3%A5n.pdf");
  expect(response.headers.get('cache-control')).toBe('private');
  const injected = `/${BUCKET}/overridden?response-content-type=text%2Fplain%0D%0Ax%3Ay`;
  expect(await sendSigned(standIn.port, { path: injected })).toMatchObject({
    status: 400,
    code: 'InvalidArgument',
  });
});

describe('ranges', () => {
  const ranged = async (Range: string) => {
    const got = await get('ranged', { Range });
    return [got.$metadata.httpStatusCode, got.ContentRange, await got.Body?.transformToString()];
  };

  beforeAll(() => put('ranged', '0123456789'));

  test.each([
    ['bytes=0-0', 'bytes 0-0/10', '0'],
    ['bytes=2-5', 'bytes 2-5/10', '2345'],
    ['bytes=7-', 'bytes 7-9/10', '789'],
    ['bytes=8-99', 'bytes 8-9/10', '89'],
    ['bytes=-3', 'bytes 7-9/10', '789'],
    ['bytes=-99', 'bytes 0-9/10', '0123456789'],
  ])('%s answers 206 with %s', async (range, contentRange, body) => {
    expect(await ranged(range)).toEqual([206, contentRange, body]);
  });

  test.each(['bytes=5-2', 'lines=1-2', 'bytes=0-1,4-5', 'bytes=-'])('%s is ignored', async (range) => {
    expect(await ranged(range)).toEqual([200, undefined, '0123456789']);
  });

  test.each(['bytes=10-', 'bytes=50-60', 'bytes=-0'])('%s answers 416 with the size', async (range) => {
    const headers = { range };
    const answer = await sendSigned(standIn.port, { path: `/${BUCKET}/ranged`, headers });
    expect(answer).toMatchObject({ status: 416, code: 'InvalidRange' });
    expect(answer.headers['content-range']).toBe('bytes */10');
  });

  test('HEAD with a range tells the length of the range', async () => {
    const raw = { method: 'HEAD', path: `/${BUCKET}/ranged`, headers: { range: 'bytes=2-5' } };
    const answer = await sendSigned(standIn.port, raw);
    expect([answer.status, answer.headers['content-length'], answer.text]).toEqual([206, '4', '']);
  });

  test('If-Range gives the range of the same object and the whole of another', async () => {
    const etag = (await head('ranged')).ETag!;
    const with_ = (ifRange: string) =>
      sendSigned(standIn.port, {
        path: `/${BUCKET}/ranged`,
        headers: { range: 'bytes=0-1', 'if-range': ifRange },
      });
    expect((await with_(etag)).text).toBe('01');
    expect((await with_('"another"')).text).toBe('0123456789');
  });
});

describe('conditions', () => {
  test('a GET with If-None-Match of the same ETag answers 304 without a body', async () => {
    const { ETag } = await put('cond', 'one');
    const same = { path: `/${BUCKET}/cond`, headers: { 'if-none-match': ETag! } };
    const answer = await sendSigned(standIn.port, same);
    expect([answer.status, answer.text, answer.headers['etag']]).toEqual([304, '', ETag]);
    expect((await get('cond', { IfNoneMatch: '"another"' })).$metadata.httpStatusCode).toBe(200);
  });

  test('a GET with If-Match of another ETag answers 412', async () => {
    const { ETag } = await put('cond', 'two');
    expect((await get('cond', { IfMatch: ETag })).$metadata.httpStatusCode).toBe(200);
    await expect(get('cond', { IfMatch: '"another"' })).rejects.toMatchObject(
      refusal('PreconditionFailed', 412),
    );
  });

  test('dates decide when there is no ETag to compare', async () => {
    await put('cond', 'three');
    const hour = 3_600_000;
    const [before, after] = [new Date(Date.now() - hour), new Date(Date.now() + hour)];
    await expect(get('cond', { IfModifiedSince: after })).rejects.toMatchObject({
      $metadata: { httpStatusCode: 304 },
    });
    expect((await get('cond', { IfModifiedSince: before })).$metadata.httpStatusCode).toBe(200);
    await expect(get('cond', { IfUnmodifiedSince: before })).rejects.toMatchObject(
      refusal('PreconditionFailed', 412),
    );
    expect((await get('cond', { IfUnmodifiedSince: after })).$metadata.httpStatusCode).toBe(200);
  });

  test('a PUT with If-None-Match: * writes only where there is nothing', async () => {
    await put('once', 'first', { IfNoneMatch: '*' });
    await expect(put('once', 'second', { IfNoneMatch: '*' })).rejects.toMatchObject(
      refusal('PreconditionFailed', 412),
    );
    expect(await text('once')).toBe('first');
  });

  test('of many PUTs with If-None-Match: * at once exactly one wins', async () => {
    const attempts = Array.from({ length: 8 }, (_, index) =>
      put('race', `writer ${String(index)}`, { IfNoneMatch: '*' }),
    );
    const outcomes = await Promise.allSettled(attempts);
    const winners = outcomes.flatMap(({ status }, index) => (status === 'fulfilled' ? [index] : []));
    expect(winners).toHaveLength(1);
    expect(await text('race')).toBe(`writer ${String(winners[0])}`);
  });

  test('a PUT with If-Match replaces only the object it names', async () => {
    const { ETag } = await put('versioned', 'first');
    await expect(put('versioned', 'x', { IfMatch: '"another"' })).rejects.toMatchObject(
      refusal('PreconditionFailed', 412),
    );
    await put('versioned', 'second', { IfMatch: ETag });
    expect(await text('versioned')).toBe('second');
    await expect(put('absent', 'x', { IfMatch: ETag })).rejects.toMatchObject(refusal('NoSuchKey', 404));
  });

  test('a DELETE with If-Match of another ETag leaves the object', async () => {
    await put('kept', 'still here');
    await expect(remove('kept', { IfMatch: '"another"' })).rejects.toMatchObject(
      refusal('PreconditionFailed', 412),
    );
    expect(await text('kept')).toBe('still here');
  });
});

describe('what is said of the body', () => {
  const rawPut = (headers: Record<string, string>, body = 'oak', payloadHash?: string) =>
    sendSigned(
      standIn.port,
      { method: 'PUT', path: `/${BUCKET}/checked`, headers, body },
      payloadHash ? { payloadHash } : {},
    );
  const length = { 'content-length': '3' };

  test('a body without a length is refused', async () => {
    const answer = await rawPut({ 'transfer-encoding': 'chunked' });
    expect(answer).toMatchObject({ status: 411, code: 'MissingContentLength' });
  });

  test('a Content-MD5 that is wrong or no MD5 is refused', async () => {
    const md5 = createHash('md5').update('oak').digest('base64');
    expect((await rawPut({ ...length, 'content-md5': md5 })).status).toBe(200);
    expect(await rawPut({ ...length, 'content-md5': md5 }, 'elm')).toMatchObject({
      status: 400,
      code: 'BadDigest',
    });
    expect(await rawPut({ ...length, 'content-md5': 'b2Fr' })).toMatchObject({
      status: 400,
      code: 'InvalidDigest',
    });
  });

  test.each(['CRC32', 'CRC32C', 'CRC64NVME', 'SHA1', 'SHA256'] as const)(
    'a %s computed by the official client is accepted, kept and told on request',
    async (ChecksumAlgorithm) => {
      const result = await put('summed', bytesOf(70_000), { ChecksumAlgorithm });
      const field = `Checksum${ChecksumAlgorithm}` as const;
      expect(result[field]).toMatch(/^[A-Za-z0-9+/]+=*$/);
      const got = await get('summed', { ChecksumMode: 'ENABLED' });
      // The client validates the checksum it is given while reading.
      await got.Body?.transformToByteArray();
      expect(got[field]).toBe(result[field]);
    },
  );

  test('a checksum that is wrong is refused and the object not kept', async () => {
    const wrong = put('never', 'oak', {
      ChecksumSHA256: createHash('sha256').update('elm').digest('base64'),
    });
    await expect(wrong).rejects.toMatchObject(refusal('BadDigest', 400));
    await expect(get('never')).rejects.toMatchObject(refusal('NoSuchKey', 404));
    expect(await readdir(join(standIn.folder, 'temp'))).toEqual([]);
  });

  test('a checksum of the wrong length, or two of them, are refused', async () => {
    expect(await rawPut({ ...length, 'x-amz-checksum-crc32': 'b2Fr' })).toMatchObject({
      status: 400,
      code: 'InvalidRequest',
    });
    const two = { 'x-amz-checksum-crc32': 'AAAAAA==', 'x-amz-checksum-crc32c': 'AAAAAA==' };
    expect(await rawPut({ ...length, ...two })).toMatchObject({ status: 400, code: 'InvalidRequest' });
  });

  test('a presigned PUT whose checksum stands in the address is held to it', async () => {
    const client = s3Client(standIn.port);
    const command = new PutObjectCommand({
      Bucket: BUCKET,
      Key: 'hoisted',
      ChecksumSHA256: createHash('sha256').update('oak').digest('base64'),
    });
    const url = await getSignedUrl(client, command);
    client.destroy();
    expect((await fetch(url, { method: 'PUT', body: 'elm' })).status).toBe(400);
    expect((await fetch(url, { method: 'PUT', body: 'oak' })).status).toBe(200);
  });

  test('more than 5 GiB in one PUT is refused before any of it is sent', async () => {
    const headers = { 'content-length': String(5 * 1024 ** 3 + 1), expect: '100-continue' };
    const answer = await rawPut(headers, '', 'UNSIGNED-PAYLOAD');
    expect(answer).toMatchObject({ status: 400, code: 'EntityTooLarge' });
  });

  test('headers for features that are missing here are refused rather than ignored', async () => {
    expect(await rawPut({ ...length, 'x-amz-tagging': 'a=b' })).toMatchObject({
      status: 501,
      code: 'NotImplemented',
    });
    const acl = await sendSigned(standIn.port, { path: `/${BUCKET}/ranged?acl=` });
    expect(acl).toMatchObject({ status: 501, code: 'NotImplemented' });
  });

  test('more than 2 kB of metadata is refused', async () => {
    await expect(put('wordy', 'x', { Metadata: { a: 'b'.repeat(2048) } })).rejects.toMatchObject(
      refusal('MetadataTooLarge', 400),
    );
  });
});
