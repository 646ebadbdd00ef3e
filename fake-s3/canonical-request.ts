import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import { encodeRfc3986, headerText, type S3Request } from './s3-request.ts';

/** What a signature is bound to: `day/region/service/aws4_request`. */
export type CredentialScope = { readonly day: string; readonly region: string };

/** The text form of a scope for the one service this server plays. */
export function scopeText(scope: CredentialScope): string {
  return `${scope.day}/${scope.region}/s3/aws4_request`;
}

/**
 * The canonical request of AWS Signature Version 4 in its S3 flavour (path encoded once, not normalised).
 * The query parameter `X-Amz-Signature` is left out, since it is the result.
 */
export function canonicalRequest(
  request: S3Request,
  signedHeaders: readonly string[],
  payloadHash: string,
): string {
  const path = request.path.split('/').map(encodeRfc3986).join('/');
  const query = request.query
    .filter(([name]) => name !== 'X-Amz-Signature')
    .map(([name, value]) => [encodeRfc3986(name), encodeRfc3986(value)] as const)
    .sort(([nameA, valueA], [nameB, valueB]) => compare(nameA, nameB) || compare(valueA, valueB))
    .map(([name, value]) => `${name}=${value}`)
    .join('&');
  const headers = signedHeaders.map((name) => {
    const value = (headerText(request.incoming, name) ?? '').trim().replace(/ +/g, ' ');
    return `${name}:${value}\n`;
  });
  return [request.method, path, query, headers.join(''), signedHeaders.join(';'), payloadHash].join('\n');
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** The string to sign for a canonical request. `timestamp` as `20260131T120000Z`. */
export function stringToSign(canonical: string, timestamp: string, scope: CredentialScope): string {
  return ['AWS4-HMAC-SHA256', timestamp, scopeText(scope), sha256Hex(canonical)].join('\n');
}

/** The key that a secret gives for one day and region. */
export function signingKey(secret: string, scope: CredentialScope): Buffer {
  return [scope.day, scope.region, 's3', 'aws4_request'].reduce<Buffer>(
    (key, text) => createHmac('sha256', key).update(text).digest(),
    Buffer.from(`AWS4${secret}`),
  );
}

/** Hex HMAC-SHA-256 of a text: the form of every signature here. */
export function sign(key: Buffer, text: string): string {
  return createHmac('sha256', key).update(text).digest('hex');
}

/** Whether two hex signatures are equal, in a time that does not tell how much of them is. */
export function sameSignature(expected: string, given: string): boolean {
  const a = Buffer.from(expected);
  const b = Buffer.from(given);
  return a.length === b.length && timingSafeEqual(a, b);
}

/** Hex SHA-256 of a text. */
export function sha256Hex(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
