import { createHash } from 'node:crypto';
import { ByteReader } from './byte-reader.ts';
import { sameSignature, sha256Hex, sign } from './canonical-request.ts';
import { S3Error } from './errors.ts';
import { type Authorisation } from './signature.ts';

/** The three forms of `aws-chunked` bodies: whether chunks are signed, and whether trailers follow them. */
const STREAMING = {
  'STREAMING-AWS4-HMAC-SHA256-PAYLOAD': { signed: true, trailer: false },
  'STREAMING-AWS4-HMAC-SHA256-PAYLOAD-TRAILER': { signed: true, trailer: true },
  'STREAMING-UNSIGNED-PAYLOAD-TRAILER': { signed: false, trailer: true },
} as const;

type Form = (typeof STREAMING)[keyof typeof STREAMING];

const EMPTY_HASH = sha256Hex('');
const MAX_LINE = 8192;

/** The form that an x-amz-content-sha256 value announces, or undefined when the body is a plain one. */
export function streamingForm(payloadHash: string): Form | undefined {
  return Object.hasOwn(STREAMING, payloadHash) ? STREAMING[payloadHash as keyof typeof STREAMING] : undefined;
}

/**
 * Yields the data of an `aws-chunked` body, verifying the signature of each chunk after its last byte: the
 * reader must discard what it got when this throws. Trailer fields are put into `trailers`, lower case.
 * Throws IncompleteBody for a body cut short, SignatureDoesNotMatch, MalformedTrailerError.
 */
export async function* decodeAwsChunked(
  source: AsyncIterable<Buffer>,
  form: Form,
  authorisation: Authorisation,
  trailers: Map<string, string>,
): AsyncGenerator<Buffer> {
  const reader = new ByteReader(source);
  let previous = authorisation.signature;
  for (;;) {
    const { size, signature } = parseChunkHeader(await reader.line(MAX_LINE), form.signed);
    const hash = createHash('sha256');
    for (let left = size; left > 0;) {
      const bytes = await reader.some(left);
      left -= bytes.length;
      if (form.signed) hash.update(bytes);
      yield bytes;
    }
    if (form.signed) {
      const expected = sign(
        authorisation.signingKey,
        [
          'AWS4-HMAC-SHA256-PAYLOAD',
          authorisation.timestamp,
          authorisation.scope,
          previous,
          EMPTY_HASH,
          hash.digest('hex'),
        ].join('\n'),
      );
      checkSignature(expected, signature);
      previous = signature;
    }
    if (size === 0) break;
    if ((await reader.line(2)) !== '') throw incomplete();
  }
  const lines = await readTrailerLines(reader);
  if (form.trailer) takeTrailers(lines, form, authorisation, previous, trailers);
  else if (lines.length > 0)
    throw new S3Error('MalformedTrailerError', 'The request has unexpected trailers.');
  await reader.end();
}

function parseChunkHeader(line: string, signed: boolean): { size: number; signature: string } {
  const match = /^([0-9a-f]{1,12})(?:;chunk-signature=([0-9a-f]{64}))?$/i.exec(line);
  if (!match?.[1] || (signed && !match[2])) throw incomplete();
  return { size: parseInt(match[1], 16), signature: match[2] ?? '' };
}

async function readTrailerLines(reader: ByteReader): Promise<string[]> {
  const lines: string[] = [];
  for (;;) {
    const line = await reader.line(MAX_LINE);
    if (line === '') return lines;
    lines.push(line);
    if (lines.length > 16) throw new S3Error('MalformedTrailerError', 'The request has too many trailers.');
  }
}

function takeTrailers(
  lines: readonly string[],
  form: Form,
  authorisation: Authorisation,
  previous: string,
  trailers: Map<string, string>,
): void {
  const fields = lines.map((line) => {
    const colon = line.indexOf(':');
    if (colon < 1)
      throw new S3Error(
        'MalformedTrailerError',
        'The request contained trailing data that was not well-formed.',
      );
    return [line.slice(0, colon).trim().toLowerCase(), line.slice(colon + 1).trim()] as const;
  });
  const data = fields.filter(([name]) => name !== 'x-amz-trailer-signature');
  if (form.signed) {
    const canonical = data.map(([name, value]) => `${name}:${value}\n`).join('');
    const toSign = [
      'AWS4-HMAC-SHA256-TRAILER',
      authorisation.timestamp,
      authorisation.scope,
      previous,
      sha256Hex(canonical),
    ];
    const given = fields.find(([name]) => name === 'x-amz-trailer-signature')?.[1] ?? '';
    checkSignature(sign(authorisation.signingKey, toSign.join('\n')), given);
  }
  for (const [name, value] of data) trailers.set(name, value);
}

function checkSignature(expected: string, given: string): void {
  if (sameSignature(expected, given)) return;
  throw new S3Error(
    'SignatureDoesNotMatch',
    'The request signature we calculated does not match the signature you provided. Check your key and signing method.',
    { SignatureProvided: given },
  );
}

function incomplete(): S3Error {
  return new S3Error('IncompleteBody', 'The request body terminated unexpectedly');
}
