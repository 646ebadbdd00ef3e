import { type ServerResponse } from 'node:http';
import { S3Error } from './errors.ts';
import { type S3Request } from './s3-request.ts';
import { type Authorisation } from './signature.ts';
import { type Storage } from './storage.ts';

/** A verified request and all that is needed to answer it. */
export type Exchange = {
  readonly request: S3Request;
  readonly authorisation: Authorisation;
  readonly response: ServerResponse;
  readonly storage: Storage;
  readonly region: string;
  /** The instant of the request, ISO 8601. */
  readonly now: string;
};

/** Answers with a document. */
export function sendXml(response: ServerResponse, status: number, document: string): void {
  const body = Buffer.from(document);
  response.writeHead(status, { 'content-type': 'application/xml', 'content-length': body.length });
  response.end(body);
}

/** Answers with headers alone. */
export function sendEmpty(
  response: ServerResponse,
  status: number,
  headers: Readonly<Record<string, string>> = {},
): void {
  // A 204 may not have a length (RFC 9110 section 8.6); HEAD and 304 keep that of the object.
  const length = status === 200 && headers['content-length'] === undefined ? { 'content-length': '0' } : {};
  response.writeHead(status, { ...length, ...headers });
  response.end();
}

/** Text as Node wants header values: one character a byte of its UTF-8 form. Throws InvalidArgument. */
export function headerValue(text: string): string {
  // eslint-disable-next-line no-control-regex
  if (/[\u0000-\u0008\u000a-\u001f\u007f]/.test(text)) {
    throw new S3Error('InvalidArgument', 'Header value cannot be represented.');
  }
  return Buffer.from(text, 'utf8').toString('latin1');
}

/** A whole number in a query parameter between 0 and `max`, larger ones cut to it. Throws InvalidArgument. */
export function countParam(request: S3Request, name: string, max: number): number {
  const text = request.param(name);
  if (text === undefined) return max;
  if (!/^\d{1,10}$/.test(text) || Number(text) > 2_147_483_647) {
    throw new S3Error('InvalidArgument', `Provided ${name} not an integer or within integer range`, {
      ArgumentName: name,
      ArgumentValue: text,
    });
  }
  return Math.min(Number(text), max);
}
