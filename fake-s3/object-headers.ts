import { checksumHeader } from './checksums.ts';
import { httpDate } from './conditions.ts';
import { S3Error } from './errors.ts';
import { headerValue } from './exchange.ts';
import { type ObjectRecord } from './object-store.ts';
import { type S3Request } from './s3-request.ts';

/** Headers of a write that are given back by a read. */
const KEPT = [
  'content-type',
  'cache-control',
  'content-disposition',
  'content-encoding',
  'content-language',
  'expires',
];

/** Headers that ask for what this server does not do; taking them silently would hide a mistake. */
const UNSUPPORTED =
  /^x-amz-(tagging|object-lock|server-side-encryption|website-redirect|copy-source-server-side)/;

const MAX_METADATA_BYTES = 2048;
const MAX_KEY_BYTES = 1024;

/**
 * The headers to keep with an object that a request writes. Throws KeyTooLongError, MetadataTooLarge, and
 * NotImplemented for features that are missing here.
 */
export function keptHeaders(request: S3Request): Record<string, string> {
  if (Buffer.byteLength(request.key) > MAX_KEY_BYTES) {
    throw new S3Error('KeyTooLongError', 'Your key is too long', { MaxSizeAllowed: String(MAX_KEY_BYTES) });
  }
  const unsupported = request.headerNames.find((name) => UNSUPPORTED.test(name));
  if (unsupported) {
    throw new S3Error(
      'NotImplemented',
      'A header you provided implies functionality that is not implemented',
      {
        Header: unsupported,
      },
    );
  }
  const names = [...KEPT, ...request.headerNames.filter((name) => name.startsWith('x-amz-meta-'))];
  const kept: Record<string, string> = {};
  let metadataBytes = 0;
  for (const name of names) {
    const value = name === 'content-encoding' ? contentEncoding(request) : request.header(name);
    if (value === undefined) continue;
    kept[name] = value;
    if (name.startsWith('x-amz-meta-')) {
      metadataBytes += Buffer.byteLength(name) - 'x-amz-meta-'.length + Buffer.byteLength(value);
    }
  }
  if (metadataBytes > MAX_METADATA_BYTES) {
    throw new S3Error('MetadataTooLarge', 'Your metadata headers exceed the maximum allowed metadata size', {
      MaxSizeAllowed: String(MAX_METADATA_BYTES),
    });
  }
  return kept;
}

/** `aws-chunked` is how the body travelled and no property of the object. */
function contentEncoding(request: S3Request): string | undefined {
  const codings = (request.header('content-encoding') ?? '')
    .split(',')
    .map((coding) => coding.trim())
    .filter((coding) => coding !== '' && coding !== 'aws-chunked');
  return codings.length > 0 ? codings.join(', ') : undefined;
}

/** The headers of a GET or HEAD of the whole object, its response-* parameters applied. */
export function replyHeaders(request: S3Request, record: ObjectRecord): Record<string, string> {
  const headers: Record<string, string> = { 'content-type': 'binary/octet-stream' };
  for (const [name, value] of Object.entries(record.headers)) headers[name] = headerValue(value);
  for (const name of KEPT) {
    const override = request.param(`response-${name}`);
    if (override !== undefined) headers[name] = headerValue(override);
  }
  if (record.checksum && request.header('x-amz-checksum-mode')?.toUpperCase() === 'ENABLED') {
    headers[checksumHeader(record.checksum.algorithm)] = record.checksum.value;
    headers['x-amz-checksum-type'] = record.checksum.value.includes('-') ? 'COMPOSITE' : 'FULL_OBJECT';
  }
  headers['accept-ranges'] = 'bytes';
  headers['etag'] = `"${record.etag}"`;
  headers['last-modified'] = httpDate(record.modified);
  headers['content-length'] = String(record.size);
  return headers;
}
