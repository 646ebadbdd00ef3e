import { type IncomingMessage } from 'node:http';
import { S3Error } from './errors.ts';

/** A request taken apart, before anything about it is believed. */
export type S3Request = {
  readonly method: string;
  /** The decoded path, as `/bucket/some/key`. */
  readonly path: string;
  /** Empty when the request is about the service itself. */
  readonly bucket: string;
  /** Empty when the request is about a bucket. */
  readonly key: string;
  readonly query: readonly (readonly [name: string, value: string])[];
  /** First value of a query parameter; undefined when absent, empty when it has no value. */
  readonly param: (name: string) => string | undefined;
  /** A header by lower-case name. `x-amz-*` parameters of a presigned address count as headers, as in S3. */
  readonly header: (name: string) => string | undefined;
  readonly presigned: boolean;
  /** Names of all headers in the sense of `header`. */
  readonly headerNames: readonly string[];
  /** The bytes of the body as sent. A client that waits for `100 Continue` gets it when this is called. */
  readonly body: () => AsyncIterable<Buffer>;
  readonly incoming: IncomingMessage;
};

/**
 * Takes a request apart, path style (`/bucket/key`). `onBodyWanted` runs before the body is first read.
 * Throws InvalidURI when an escape cannot be decoded.
 */
export function readRequest(incoming: IncomingMessage, onBodyWanted: () => void): S3Request {
  const url = incoming.url ?? '/';
  const mark = url.indexOf('?');
  const rawPath = mark < 0 ? url : url.slice(0, mark);
  if (!rawPath.startsWith('/')) throw new S3Error('InvalidURI', "Couldn't parse the specified URI.");
  const query = mark < 0 ? [] : parseQuery(url.slice(mark + 1));
  const path = decode(rawPath);
  const slash = path.indexOf('/', 1);
  const param = (name: string) => query.find(([found]) => found === name)?.[1];
  const presigned = param('X-Amz-Algorithm') !== undefined || param('X-Amz-Signature') !== undefined;
  const hoisted = new Map(
    presigned ? query.map(([name, value]) => [name.toLowerCase(), value] as const) : [],
  );
  return {
    method: incoming.method ?? 'GET',
    path,
    bucket: slash < 0 ? path.slice(1) : path.slice(1, slash),
    key: slash < 0 ? '' : path.slice(slash + 1),
    query,
    param,
    header: (name) =>
      headerText(incoming, name) ?? (name.startsWith('x-amz-') ? hoisted.get(name) : undefined),
    presigned,
    headerNames: [
      ...Object.keys(incoming.headersDistinct),
      ...[...hoisted.keys()].filter((name) => name.startsWith('x-amz-')),
    ],
    body: () => {
      onBodyWanted();
      // Leaving early must not destroy the socket: the refusal still has to be sent over it.
      return incoming.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>;
    },
    incoming,
  };
}

/** The text of a header as sent, repeated ones joined by a comma without a space, which is how they are signed. */
export function headerText(incoming: IncomingMessage, name: string): string | undefined {
  const values = incoming.headersDistinct[name];
  if (!values) return undefined;
  // Node gives each byte as a character; clients sign the UTF-8 text those bytes spell.
  const latin1 = values.join(',');
  const utf8 = Buffer.from(latin1, 'latin1').toString('utf8');
  return utf8.includes('\ufffd') ? latin1 : utf8;
}

function parseQuery(raw: string): [string, string][] {
  return raw
    .split('&')
    .filter((pair) => pair !== '')
    .map((pair) => {
      const equals = pair.indexOf('=');
      const [name, value] = equals < 0 ? [pair, ''] : [pair.slice(0, equals), pair.slice(equals + 1)];
      return [decode(name.replaceAll('+', ' ')), decode(value.replaceAll('+', ' '))];
    });
}

function decode(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    throw new S3Error('InvalidURI', "Couldn't parse the specified URI.");
  }
}

/** Percent-encodes all but RFC 3986's unreserved characters, upper case, as Signature Version 4 wants it. */
export function encodeRfc3986(text: string): string {
  return encodeURIComponent(text).replace(
    /[!'()*]/g,
    (char) => `%${char.charCodeAt(0).toString(16).toUpperCase()}`,
  );
}
