import { GetObjectCommand, GetBucketLocationCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { send, sendSigned, signedHeaders } from './raw-request.ts';
import { BUCKET, refusal, s3Client, startStandIn, type StandIn } from './stand-in.ts';

const NOON = new Date('2031-05-04T12:00:00Z');
const minutes = (count: number) => new Date(NOON.getTime() + count * 60_000);
const path = `/${BUCKET}/signed.txt`;

let standIn: StandIn;
let now = NOON;

beforeAll(async () => {
  standIn = await startStandIn({ clock: () => now });
  await sendSigned(
    standIn.port,
    { method: 'PUT', path, body: 'planed', headers: { 'content-length': '6' } },
    { date: NOON },
  );
});

afterAll(() => standIn.stop());

const presign = (
  command: GetObjectCommand | PutObjectCommand,
  expiresIn = 60,
  signableHeaders = new Set(['host']),
) => getSignedUrl(standIn.s3, command, { expiresIn, signingDate: NOON, signableHeaders });
const presignGet = (expiresIn?: number) =>
  presign(new GetObjectCommand({ Bucket: BUCKET, Key: 'signed.txt' }), expiresIn);
const code = async (response: Response) => /<Code>(\w+)</.exec(await response.text())?.[1];

test('a request with a good header signature is answered', async () => {
  const answer = await sendSigned(standIn.port, { path }, { date: NOON });
  expect(answer).toMatchObject({ status: 200, text: 'planed' });
});

test('a request without a signature is refused', async () => {
  expect(await send(standIn.port, { path })).toMatchObject({ status: 403, code: 'AccessDenied' });
});

test('a signature made with another secret is refused, and the answer shows what was signed', async () => {
  const answer = await sendSigned(standIn.port, { path }, { date: NOON, secretAccessKey: 'pine' });
  expect(answer).toMatchObject({ status: 403, code: 'SignatureDoesNotMatch' });
  expect(answer.text).toContain('<CanonicalRequest>GET\n/workshop-media/signed.txt'.replace('\n', '&#xA;'));
});

test('a signature for another method, path, query or host is refused', async () => {
  const headers = signedHeaders(standIn.port, { path }, { date: NOON });
  for (const changed of [
    { path, method: 'DELETE', headers },
    { path: `/${BUCKET}/other.txt`, headers },
    { path: `${path}?response-content-type=text%2Fhtml`, headers },
    { path, headers: { ...headers, host: 'elsewhere.example' } },
  ]) {
    expect(await send(standIn.port, changed)).toMatchObject({ status: 403, code: 'SignatureDoesNotMatch' });
  }
});

test('a signature with one digit changed is refused', async () => {
  const headers = signedHeaders(standIn.port, { path }, { date: NOON });
  const authorization = headers.authorization.replace(/.$/, (digit) => (digit === '0' ? '1' : '0'));
  const answer = await send(standIn.port, { path, headers: { ...headers, authorization } });
  expect(answer.code).toBe('SignatureDoesNotMatch');
});

test('an x-amz header that was not signed is refused', async () => {
  const headers = { ...signedHeaders(standIn.port, { path }, { date: NOON }), 'x-amz-meta-added': 'yes' };
  const answer = await send(standIn.port, { path, headers });
  expect(answer).toMatchObject({ status: 403, code: 'AccessDenied' });
  expect(answer.text).toContain('<HeadersNotSigned>x-amz-meta-added</HeadersNotSigned>');
});

test('an unknown access key, a wrong region and a wrong day are each refused by their own code', async () => {
  const sendWith = (signing: object) => sendSigned(standIn.port, { path }, { date: NOON, ...signing });
  expect(await sendWith({ accessKeyId: 'STRANGER' })).toMatchObject({
    status: 403,
    code: 'InvalidAccessKeyId',
  });
  expect(await sendWith({ region: 'us-west-2' })).toMatchObject({
    status: 400,
    code: 'AuthorizationHeaderMalformed',
  });
  const headers = signedHeaders(standIn.port, { path }, { date: NOON });
  const authorization = headers.authorization.replace('/20310504/', '/20310503/');
  expect(await send(standIn.port, { path, headers: { ...headers, authorization } })).toMatchObject({
    status: 400,
    code: 'AuthorizationHeaderMalformed',
  });
});

test('a header signature counts for fifteen minutes either way', async () => {
  for (const [offset, status] of [
    [-15, 200],
    [15, 200],
    [-15.1, 403],
    [15.1, 403],
  ] as const) {
    expect(await sendSigned(standIn.port, { path }, { date: minutes(offset) })).toMatchObject({ status });
  }
  const late = await sendSigned(standIn.port, { path }, { date: minutes(-16) });
  expect(late.code).toBe('RequestTimeTooSkewed');
});

test('the official client whose clock is an hour slow learns it from the refusal and succeeds', async () => {
  now = new Date(Date.now() + 3_600_000);
  const where = { Bucket: BUCKET };
  const stubborn = s3Client(standIn.port);
  const refused = stubborn.send(new GetBucketLocationCommand(where));
  await expect(refused).rejects.toMatchObject(refusal('RequestTimeTooSkewed', 403));
  const learning = s3Client(standIn.port, { maxAttempts: 2 });
  await expect(learning.send(new GetBucketLocationCommand(where))).resolves.toBeDefined();
  stubborn.destroy();
  learning.destroy();
  now = NOON;
});

test('the official client is refused with a wrong secret', async () => {
  now = new Date();
  const client = s3Client(standIn.port, { credentials: { accessKeyId: 'MARRAMLANE', secretAccessKey: 'x' } });
  const get = client.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'signed.txt' }));
  await expect(get).rejects.toMatchObject(refusal('SignatureDoesNotMatch', 403));
  client.destroy();
  now = NOON;
});

test('a presigned address works until the second it expires, and not after', async () => {
  const url = await presignGet(60);
  now = minutes(1);
  expect((await fetch(url)).status).toBe(200);
  now = new Date(minutes(1).getTime() + 1000);
  const late = await fetch(url);
  expect(late.status).toBe(403);
  expect(await late.text()).toContain('<Message>Request has expired</Message>');
  now = NOON;
});

test('a presigned address from more than fifteen minutes ahead is not valid yet', async () => {
  const url = await presignGet(600);
  now = minutes(-16);
  const early = await fetch(url);
  expect(early.status).toBe(403);
  expect(await early.text()).toContain('Request is not valid yet');
  now = NOON;
});

test('a presigned address may be good for one second to seven days', async () => {
  const url = await presignGet(604_800);
  expect((await fetch(url)).status).toBe(200);
  for (const expires of ['0', '604801', '-5', 'soon']) {
    const changed = await fetch(url.replace('X-Amz-Expires=604800', `X-Amz-Expires=${expires}`));
    expect(changed.status).toBe(400);
    expect(await code(changed)).toBe('AuthorizationQueryParametersError');
  }
});

test('a presigned address with anything changed or added is refused', async () => {
  const url = await presignGet();
  for (const changed of [
    url.replace('signed.txt', 'other.txt'),
    url.replace('X-Amz-Expires=60', 'X-Amz-Expires=61'),
    `${url}&response-content-type=text%2Fhtml`,
  ]) {
    const response = await fetch(changed);
    expect([response.status, await code(response)]).toEqual([403, 'SignatureDoesNotMatch']);
  }
  expect((await fetch(url, { method: 'DELETE' })).status).toBe(403);
});

test('a presigned address without one of its parameters is refused as malformed', async () => {
  const url = await presignGet();
  for (const name of [
    'X-Amz-Credential',
    'X-Amz-Date',
    'X-Amz-SignedHeaders',
    'X-Amz-Expires',
    'X-Amz-Signature',
  ]) {
    const response = await fetch(url.replace(new RegExp(`${name}=[^&]*&?`), ''));
    expect([response.status, await code(response)]).toEqual([400, 'AuthorizationQueryParametersError']);
  }
});

test('two signatures at once are refused', async () => {
  const url = new URL(await presignGet());
  const raw = { path: url.pathname + url.search };
  const answer = await sendSigned(standIn.port, raw, { date: NOON });
  expect(answer).toMatchObject({ status: 400, code: 'InvalidArgument' });
});

test('a presigned PUT that signs the length takes that length and no other', async () => {
  const put = new PutObjectCommand({ Bucket: BUCKET, Key: 'exact.bin', ContentLength: 6 });
  const url = await presign(put, 60, new Set(['host', 'content-length']));
  expect(url).toContain('content-length%3Bhost');
  expect((await fetch(url, { method: 'PUT', body: 'six by' })).status).toBe(200);
  for (const body of ['seven b', 'five!', '']) {
    const response = await fetch(url, { method: 'PUT', body });
    expect([response.status, await code(response)]).toEqual([403, 'SignatureDoesNotMatch']);
  }
});

test('a presigned PUT that signs the type refuses another', async () => {
  const put = new PutObjectCommand({ Bucket: BUCKET, Key: 'typed.txt', ContentType: 'text/plain' });
  const url = await presign(put, 60, new Set(['host', 'content-type']));
  const as = (type: string) => fetch(url, { method: 'PUT', body: 'oak', headers: { 'content-type': type } });
  expect((await as('text/plain')).status).toBe(200);
  expect((await as('text/html')).status).toBe(403);
});

test('a body other than the one whose hash was signed is refused and not kept', async () => {
  const raw = {
    method: 'PUT',
    path: `/${BUCKET}/tampered.txt`,
    body: 'ash!',
    headers: { 'content-length': '4' },
  };
  const headers = signedHeaders(standIn.port, raw, { date: NOON });
  const answer = await send(standIn.port, { ...raw, headers, body: 'elm!' });
  expect(answer).toMatchObject({ status: 400, code: 'XAmzContentSHA256Mismatch' });
  const get = await sendSigned(standIn.port, { path: raw.path }, { date: NOON });
  expect(get.code).toBe('NoSuchKey');
});

test('a header signature without the hash of the body, or with one of no known form, is refused', async () => {
  const headers: Record<string, string> = signedHeaders(standIn.port, { path }, { date: NOON });
  const { 'x-amz-content-sha256': _, ...without } = headers;
  expect(await send(standIn.port, { path, headers: without })).toMatchObject({
    status: 400,
    code: 'InvalidRequest',
  });
  const odd = await sendSigned(standIn.port, { path }, { date: NOON, payloadHash: 'abc' });
  expect(odd).toMatchObject({ status: 400, code: 'InvalidArgument' });
});

test('the Date header stands in for x-amz-date, and without either the request is refused', async () => {
  const headers: Record<string, string> = signedHeaders(
    standIn.port,
    { path },
    { date: NOON, dateHeader: true },
  );
  expect(await send(standIn.port, { path, headers })).toMatchObject({ status: 200, text: 'planed' });
  const { date: _, ...undated } = headers;
  expect((await send(standIn.port, { path, headers: undated })).status).toBeGreaterThanOrEqual(400);
});

test('an escape that cannot be decoded is refused before anything else', async () => {
  expect(await send(standIn.port, { path: `/${BUCKET}/%E0%A4%A` })).toMatchObject({
    status: 400,
    code: 'InvalidURI',
  });
});
