import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { createHash } from 'node:crypto';
import { Readable } from 'node:stream';
import { crc32 as zipCrc32 } from 'node:zlib';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { decodeAwsChunked, streamingForm } from '../../../fake-s3/aws-chunked.ts';
import { startChecksum, type ChecksumAlgorithm } from '../../../fake-s3/checksums.ts';
import {
  hmac,
  scopeOf,
  send,
  sendSigned,
  sha256,
  signedHeaders,
  signingKey,
  timestampOf,
  type Answer,
} from './raw-request.ts';
import { BUCKET, bytesOf, refusal, s3Client, startStandIn, type StandIn } from './stand-in.ts';

const SIGNED = 'STREAMING-AWS4-HMAC-SHA256-PAYLOAD';
const SIGNED_TRAILER = 'STREAMING-AWS4-HMAC-SHA256-PAYLOAD-TRAILER';
const UNSIGNED_TRAILER = 'STREAMING-UNSIGNED-PAYLOAD-TRAILER';
const path = `/${BUCKET}/chunked`;

let standIn: StandIn;

beforeAll(async () => {
  standIn = await startStandIn();
});

afterAll(() => standIn.stop());

const stored = async () => {
  const answer = await sendSigned(standIn.port, { path });
  return answer.status === 200 ? answer.text : answer.code;
};

type Change = {
  /** Changes the body after it was signed. */
  readonly body?: (body: string) => string;
  readonly decodedLength?: number;
  readonly trailer?: string;
};

/** PUTs text chunks with a signature each, and a signed trailer if one is given. */
async function putSigned(chunks: readonly string[], change: Change = {}): Promise<Answer> {
  const date = new Date();
  const timestamp = timestampOf(date);
  const { trailer } = change;
  const headers = {
    'content-encoding': 'aws-chunked',
    'x-amz-decoded-content-length': String(change.decodedLength ?? chunks.join('').length),
    'transfer-encoding': 'chunked',
    ...(trailer ? { 'x-amz-trailer': trailer.split(':')[0] ?? '' } : {}),
  };
  const payloadHash = trailer ? SIGNED_TRAILER : SIGNED;
  const signed = signedHeaders(standIn.port, { method: 'PUT', path, headers }, { date, payloadHash });
  const key = signingKey(timestamp);
  const sign = (kind: string, ...rest: string[]) =>
    hmac(key, [`AWS4-HMAC-SHA256-${kind}`, timestamp, scopeOf(timestamp), ...rest].join('\n')).toString(
      'hex',
    );
  let previous = signed.authorization.slice(-64);
  let body = '';
  for (const chunk of [...chunks, '']) {
    previous = sign('PAYLOAD', previous, sha256(''), sha256(chunk));
    body += `${chunk.length.toString(16)};chunk-signature=${previous}\r\n`;
    if (chunk !== '') body += `${chunk}\r\n`;
  }
  if (trailer) {
    body += `${trailer}\r\nx-amz-trailer-signature:${sign('TRAILER', previous, sha256(`${trailer}\n`))}\r\n`;
  }
  body += '\r\n';
  return send(standIn.port, { method: 'PUT', path, headers: signed, body: change.body?.(body) ?? body });
}

/** PUTs a body that is already chunked, unsigned, with the trailer it announces. */
const putUnsigned = (body: string, length: number, trailer: string) =>
  sendSigned(
    standIn.port,
    {
      method: 'PUT',
      path,
      body,
      headers: {
        'content-encoding': 'aws-chunked',
        'content-length': String(body.length),
        'x-amz-decoded-content-length': String(length),
        'x-amz-trailer': trailer,
      },
    },
    { payloadHash: UNSIGNED_TRAILER },
  );

test('signed chunks are decoded into the object, and the coding is not kept', async () => {
  expect((await putSigned(['first cut, ', 'second cut, ', 'last cut'])).status).toBe(200);
  const answer = await sendSigned(standIn.port, { path });
  expect(answer.text).toBe('first cut, second cut, last cut');
  expect(answer.headers['content-encoding']).toBeUndefined();
});

test('a chunk whose bytes, signature or place is changed is refused, and the object stays as it was', async () => {
  await putSigned(['before']);
  const swapped = (body: string) => body.replace(/one!(.*)two!/s, 'two!$1one!');
  for (const body of [
    (text: string) => text.replace('two!', 'TWO!'),
    (text: string) => text.replace(/=[0-9a-f]{8}/, '=00000000'),
    swapped,
  ]) {
    expect(await putSigned(['one!', 'two!'], { body })).toMatchObject({
      status: 403,
      code: 'SignatureDoesNotMatch',
    });
  }
  expect(await stored()).toBe('before');
});

test('chunks cut short, run on or without signatures are refused as incomplete', async () => {
  await putSigned(['before']);
  for (const body of [
    (text: string) => text.slice(0, -70),
    (text: string) => `${text}more`,
    (text: string) => text.replace(/;chunk-signature=[0-9a-f]+/, ''),
    (text: string) => text.replace(/^4/, 'zz'),
  ]) {
    expect(await putSigned(['one!', 'two!'], { body })).toMatchObject({
      status: 400,
      code: 'IncompleteBody',
    });
  }
  expect(await stored()).toBe('before');
});

test('a decoded length other than the one stated is refused', async () => {
  for (const decodedLength of [3, 5]) {
    expect(await putSigned(['four'], { decodedLength })).toMatchObject({
      status: 400,
      code: 'IncompleteBody',
    });
  }
});

test('a signed trailer is verified, both its signature and its checksum', async () => {
  const sum = (text: string) => `x-amz-checksum-sha256:${createHash('sha256').update(text).digest('base64')}`;
  expect((await putSigned(['planed'], { trailer: sum('planed') })).status).toBe(200);
  expect(await putSigned(['planed'], { trailer: sum('sawn') })).toMatchObject({
    status: 400,
    code: 'BadDigest',
  });
  const body = (text: string) => text.replace(/trailer-signature:.{4}/, 'trailer-signature:0000');
  expect(await putSigned(['planed'], { trailer: sum('planed'), body })).toMatchObject({
    code: 'SignatureDoesNotMatch',
  });
});

test('an unsigned trailer that is wrong, missing, another or malformed is refused', async () => {
  const sum = createHash('sha1').update('planed').digest('base64');
  const wrong = createHash('sha1').update('sawn').digest('base64');
  const put = (trailer: string) =>
    putUnsigned(`6\r\nplaned\r\n0\r\n${trailer}\r\n`, 6, 'x-amz-checksum-sha1');
  expect((await put(`x-amz-checksum-sha1:${sum}\r\n`)).status).toBe(200);
  expect(await put(`x-amz-checksum-sha1:${wrong}\r\n`)).toMatchObject({ status: 400, code: 'BadDigest' });
  expect(await put('')).toMatchObject({ status: 400, code: 'MalformedTrailerError' });
  expect(await put(`x-amz-checksum-crc32:AAAAAA==\r\n`)).toMatchObject({ code: 'MalformedTrailerError' });
  expect(await put('no colon\r\n')).toMatchObject({ code: 'MalformedTrailerError' });
});

test.each(['CRC32', 'CRC32C', 'CRC64NVME', 'SHA1', 'SHA256'] as const)(
  'a stream that the official client sends with a %s trailer is verified and kept',
  async (ChecksumAlgorithm) => {
    const bytes = bytesOf(200_000);
    const client = s3Client(standIn.port, { requestChecksumCalculation: 'WHEN_SUPPORTED' });
    const Body = Readable.from([bytes.subarray(0, 70_000), bytes.subarray(70_000)]);
    const where = { Bucket: BUCKET, Key: 'streamed' };
    await client.send(
      new PutObjectCommand({ ...where, Body, ContentLength: bytes.length, ChecksumAlgorithm }),
    );
    const got = await client.send(new GetObjectCommand({ ...where, ChecksumMode: 'ENABLED' }));
    expect(Buffer.from(await got.Body!.transformToByteArray()).equals(bytes)).toBe(true);
    expect(got[`Checksum${ChecksumAlgorithm}`]).toBeDefined();
    client.destroy();
  },
);

test('a stream whose stated length is wrong is refused', async () => {
  const client = s3Client(standIn.port, { requestChecksumCalculation: 'WHEN_SUPPORTED' });
  const Body = Readable.from([Buffer.from('four')]);
  const put = client.send(new PutObjectCommand({ Bucket: BUCKET, Key: 'short', Body, ContentLength: 5 }));
  await expect(put).rejects.toMatchObject(refusal('IncompleteBody', 400));
  client.destroy();
});

test('the published example of a chunked signature verifies', async () => {
  // AWS, "Signature Calculations for the Authorization Header: Transferring Payload in Multiple Chunks".
  const timestamp = '20130524T000000Z';
  const authorisation = {
    payloadHash: SIGNED,
    timestamp,
    scope: scopeOf(timestamp, 'us-east-1'),
    signature: '4f232c4386841ef735655705268965c44a0e4690baa4adea153f7db9fa80a0a9',
    signingKey: signingKey(timestamp, 'us-east-1', 'wJalrXUtnFEMI/K7MDENG/bPxRfiCYEXAMPLEKEY'),
  };
  const body = [
    '10000;chunk-signature=ad80c730a21e5b8d04586a2213dd63b9a0e99e0e2307b0ade35a65485a288648',
    'a'.repeat(65_536),
    '400;chunk-signature=0055627c9e194cb4542bae2aa5492e3c1575bbb81b612b7d234b86a503ef5497',
    'a'.repeat(1024),
    '0;chunk-signature=b6c6ea8a5354eaf15b3cb7646744f4275b71ea724fed81ceb9323e279d449df9',
    '',
    '',
  ].join('\r\n');
  const source = Readable.from([Buffer.from(body)]) as AsyncIterable<Buffer>;
  let size = 0;
  for await (const bytes of decodeAwsChunked(source, streamingForm(SIGNED)!, authorisation, new Map())) {
    size += bytes.length;
  }
  expect(size).toBe(66_560);
});

// Catalogue of parametrised CRC algorithms: the check value of each for the text 123456789.
test.each([
  ['crc32', 'cbf43926'],
  ['crc32c', 'e3069283'],
  ['crc64nvme', 'ae8b14860a799888'],
] as [ChecksumAlgorithm, string][])(
  'the %s of 123456789 is its published check value',
  (algorithm, check) => {
    const running = startChecksum(algorithm);
    running.update(Buffer.from('12345'));
    running.update(Buffer.from('6789'));
    expect(running.digest().toString('hex')).toBe(check);
  },
);

test('the crc32 of many bytes agrees with that of zlib', () => {
  const bytes = bytesOf(100_003);
  const running = startChecksum('crc32');
  running.update(bytes);
  expect(running.digest().readUInt32BE()).toBe(zipCrc32(bytes));
});
