import { createHash } from 'node:crypto';
import { decodeAwsChunked, streamingForm } from './aws-chunked.ts';
import {
  announcedChecksum,
  CHECKSUM_ALGORITHMS,
  checksumHeader,
  isBase64Of,
  startChecksum,
  type Checksum,
  type ChecksumAlgorithm,
} from './checksums.ts';
import { S3Error } from './errors.ts';
import { type S3Request } from './s3-request.ts';
import { type Authorisation } from './signature.ts';

/** What a body turned out to be, once all that was said of it has been found true. */
export type Received = { readonly size: number; readonly md5Hex: string; readonly checksum?: Checksum };

type Limits = {
  readonly maxBytes: number;
  /** Whether a body without a stated length is refused, as for objects and parts. */
  readonly lengthRequired: boolean;
  /** A checksum to compute even when the request states none. */
  readonly algorithm?: ChecksumAlgorithm | undefined;
};

const MAX_DOCUMENT_BYTES = 4 * 1024 * 1024;

/**
 * Passes a body to `sink` piece by piece and checks it against its stated length, x-amz-content-sha256,
 * Content-MD5, x-amz-checksum-* (header or trailer) and chunk signatures. What `sink` got is void when this throws:
 * an S3Error, or a connection error when the client went away.
 */
export async function receiveBody(
  request: S3Request,
  authorisation: Authorisation,
  limits: Limits,
  sink: (bytes: Buffer) => Promise<void>,
): Promise<Received> {
  const { payloadHash } = authorisation;
  const form = streamingForm(payloadHash);
  if (!form && payloadHash !== 'UNSIGNED-PAYLOAD' && !/^[0-9a-f]{64}$/.test(payloadHash)) {
    throw new S3Error(
      'InvalidArgument',
      'x-amz-content-sha256 must be UNSIGNED-PAYLOAD, STREAMING-UNSIGNED-PAYLOAD-TRAILER, STREAMING-AWS4-HMAC-SHA256-PAYLOAD, STREAMING-AWS4-HMAC-SHA256-PAYLOAD-TRAILER or a valid sha256 value.',
    );
  }
  const declared = declaredLength(request, form !== undefined, limits);
  const contentMd5 = request.header('content-md5');
  if (contentMd5 !== undefined && !isBase64Of(contentMd5, 16)) {
    throw new S3Error('InvalidDigest', 'The Content-MD5 you specified was invalid.');
  }
  const inHeader = announcedChecksum(request.header);
  const inTrailer = form?.trailer ? announcedTrailer(request) : undefined;
  const algorithm = inHeader?.algorithm ?? inTrailer ?? limits.algorithm;

  const trailers = new Map<string, string>();
  const pieces = form ? decodeAwsChunked(request.body(), form, authorisation, trailers) : request.body();
  const md5 = createHash('md5');
  const sha256 = /^[0-9a-f]{64}$/.test(payloadHash) ? createHash('sha256') : undefined;
  const running = algorithm && startChecksum(algorithm);
  let size = 0;
  for await (const bytes of pieces) {
    size += bytes.length;
    if (size > (declared ?? limits.maxBytes)) throw tooLongOrShort(declared);
    md5.update(bytes);
    sha256?.update(bytes);
    running?.update(bytes);
    await sink(bytes);
  }

  if (declared !== undefined && size !== declared) throw tooLongOrShort(declared);
  const sha256Hex = sha256?.digest('hex') ?? payloadHash;
  if (sha256Hex !== payloadHash) {
    throw new S3Error(
      'XAmzContentSHA256Mismatch',
      "The provided 'x-amz-content-sha256' header does not match what was computed.",
      { ClientComputedContentSHA256: payloadHash, S3ComputedContentSHA256: sha256Hex },
    );
  }
  const md5Digest = md5.digest();
  if (contentMd5 !== undefined && md5Digest.toString('base64') !== contentMd5) {
    throw new S3Error('BadDigest', 'The Content-MD5 you specified did not match what we received.');
  }
  const stated = inHeader ?? (inTrailer && statedInTrailer(inTrailer, trailers));
  const computed = running?.digest().toString('base64');
  if (stated && stated.value !== computed) {
    throw new S3Error(
      'BadDigest',
      `The ${stated.algorithm.toUpperCase()} you specified did not match the calculated checksum.`,
    );
  }
  const checksum = algorithm && computed !== undefined ? { checksum: { algorithm, value: computed } } : {};
  return { size, md5Hex: md5Digest.toString('hex'), ...checksum };
}

/** Reads and checks a body that is a document, of at most 4 MiB, and gives it as text. */
export async function receiveText(request: S3Request, authorisation: Authorisation): Promise<string> {
  const pieces: Buffer[] = [];
  const limits = { maxBytes: MAX_DOCUMENT_BYTES, lengthRequired: false };
  await receiveBody(request, authorisation, limits, async (bytes) => {
    pieces.push(bytes);
    return Promise.resolve();
  });
  return Buffer.concat(pieces).toString('utf8');
}

/** The length of the data as stated, in bytes; of an `aws-chunked` body that is the length after decoding. */
function declaredLength(request: S3Request, streaming: boolean, limits: Limits): number | undefined {
  const text = request.header(streaming ? 'x-amz-decoded-content-length' : 'content-length');
  if (text === undefined) {
    if (!limits.lengthRequired && !streaming) return undefined;
    throw new S3Error('MissingContentLength', 'You must provide the Content-Length HTTP header.');
  }
  if (!/^\d{1,15}$/.test(text))
    throw new S3Error('InvalidArgument', 'The stated length is not a number of bytes.');
  const length = Number(text);
  if (length > limits.maxBytes) {
    throw new S3Error('EntityTooLarge', 'Your proposed upload exceeds the maximum allowed size', {
      ProposedSize: text,
      MaxSizeAllowed: String(limits.maxBytes),
    });
  }
  return length;
}

function tooLongOrShort(declared: number | undefined): S3Error {
  if (declared === undefined) return new S3Error('EntityTooLarge', 'The document is too long.');
  return new S3Error(
    'IncompleteBody',
    'You did not provide the number of bytes specified by the Content-Length HTTP header.',
  );
}

function announcedTrailer(request: S3Request): ChecksumAlgorithm | undefined {
  const name = request.header('x-amz-trailer')?.toLowerCase();
  if (name === undefined) return undefined;
  const algorithm = CHECKSUM_ALGORITHMS.find((candidate) => checksumHeader(candidate) === name);
  if (!algorithm) {
    throw new S3Error('InvalidRequest', 'The value specified in the x-amz-trailer header is not supported');
  }
  return algorithm;
}

function statedInTrailer(algorithm: ChecksumAlgorithm, trailers: ReadonlyMap<string, string>): Checksum {
  const found = announcedChecksum((name) => trailers.get(name));
  if (found?.algorithm === algorithm) return found;
  throw new S3Error(
    'MalformedTrailerError',
    'The request did not contain the trailer that its headers announce.',
  );
}
