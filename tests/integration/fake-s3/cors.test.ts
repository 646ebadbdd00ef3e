import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { send } from './raw-request.ts';
import { BUCKET, startStandIn, type StandIn } from './stand-in.ts';

const origin = 'https://centrepop.test';
let standIn: StandIn;
let open: StandIn;

beforeAll(async () => {
  standIn = await startStandIn({ allowedOrigins: [origin, 'https://other.test'] });
  open = await startStandIn({ allowedOrigins: ['*'] });
});

afterAll(async () => {
  await standIn.stop();
  await open.stop();
});

const preflight = (port: number, headers: Record<string, string>) =>
  send(port, { method: 'OPTIONS', path: `/${BUCKET}/clip.mov`, headers });

test('a preflight from an allowed origin is answered without a signature', async () => {
  const asked = {
    'access-control-request-method': 'PUT',
    'access-control-request-headers': 'content-type, content-md5',
  };
  const answer = await preflight(standIn.port, { origin, ...asked });
  expect(answer.status).toBe(200);
  expect(answer.headers).toMatchObject({
    'access-control-allow-origin': origin,
    'access-control-allow-headers': 'content-type, content-md5',
    'access-control-allow-methods': expect.stringContaining('PUT') as string,
    vary: expect.stringContaining('Origin') as string,
  });
});

test('a preflight from another origin, for an unknown method or without one is refused', async () => {
  const method = { 'access-control-request-method': 'PUT' };
  for (const headers of [
    { origin: 'https://stranger.test', ...method },
    { origin: `${origin}.stranger.test`, ...method },
    { origin, 'access-control-request-method': 'PATCH' },
    { origin },
    method,
  ]) {
    expect(await preflight(standIn.port, headers)).toMatchObject({ status: 403, code: 'AccessForbidden' });
  }
});

test('with any origin allowed, every origin gets a star', async () => {
  const answer = await preflight(open.port, { origin: 'null', 'access-control-request-method': 'GET' });
  expect(answer.headers['access-control-allow-origin']).toBe('*');
});

test('a page of an allowed origin may read the ETag of its upload', async () => {
  const url = await getSignedUrl(standIn.s3, new PutObjectCommand({ Bucket: BUCKET, Key: 'clip.mov' }));
  const response = await fetch(url, { method: 'PUT', body: 'frames', headers: { origin } });
  expect(response.status).toBe(200);
  expect(response.headers.get('access-control-allow-origin')).toBe(origin);
  const exposed = response.headers.get('access-control-expose-headers')?.split(', ') ?? [];
  expect(exposed).toEqual(expect.arrayContaining(['ETag', 'Content-Range']));
});

test('a page may read a refusal too, but not a page of another origin', async () => {
  const url = await getSignedUrl(standIn.s3, new GetObjectCommand({ Bucket: BUCKET, Key: 'absent' }));
  const allowed = await fetch(url, { headers: { origin } });
  expect([allowed.status, allowed.headers.get('access-control-allow-origin')]).toEqual([404, origin]);
  const stranger = await fetch(url, { headers: { origin: 'https://stranger.test' } });
  expect(stranger.headers.get('access-control-allow-origin')).toBeNull();
});
