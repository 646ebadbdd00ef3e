import { type IncomingMessage, type ServerResponse } from 'node:http';
import { S3Error } from './errors.ts';

const METHODS = 'GET, HEAD, PUT, POST, DELETE';

/** Headers that a page may read: an uploader needs the ETag of each part, a player the range. */
const EXPOSED = [
  'ETag',
  'Content-Length',
  'Content-Range',
  'Accept-Ranges',
  'Last-Modified',
  'x-amz-request-id',
  'x-amz-checksum-crc32',
  'x-amz-checksum-crc32c',
  'x-amz-checksum-crc64nvme',
  'x-amz-checksum-sha1',
  'x-amz-checksum-sha256',
].join(', ');

/** Adds what lets pages of an allowed origin read an answer, refusals included. `allowed` may be `['*']`. */
export function allowOrigin(
  incoming: IncomingMessage,
  response: ServerResponse,
  allowed: readonly string[],
): void {
  response.setHeader('vary', 'Origin, Access-Control-Request-Headers, Access-Control-Request-Method');
  const origin = allowedOrigin(incoming, allowed);
  if (origin === undefined) return;
  response.setHeader('access-control-allow-origin', origin);
  response.setHeader('access-control-expose-headers', EXPOSED);
}

/**
 * Answers a preflight, which carries no signature. Throws AccessForbidden when the origin or the method is not allowed.
 * Call `allowOrigin` first.
 */
export function answerPreflight(
  incoming: IncomingMessage,
  response: ServerResponse,
  allowed: readonly string[],
): void {
  const method = incoming.headers['access-control-request-method'];
  if (
    allowedOrigin(incoming, allowed) === undefined ||
    method === undefined ||
    !METHODS.split(', ').includes(method)
  ) {
    throw new S3Error('AccessForbidden', 'CORSResponse: This CORS request is not allowed.');
  }
  const headers = incoming.headers['access-control-request-headers'];
  if (headers !== undefined) response.setHeader('access-control-allow-headers', headers);
  response.writeHead(200, {
    'access-control-allow-methods': METHODS,
    'access-control-max-age': '3000',
    'content-length': '0',
  });
  response.end();
}

function allowedOrigin(incoming: IncomingMessage, allowed: readonly string[]): string | undefined {
  const { origin } = incoming.headers;
  if (origin === undefined) return undefined;
  if (allowed.includes('*')) return '*';
  return allowed.includes(origin) ? origin : undefined;
}
