import { createHash, createHmac } from 'node:crypto';
import { request } from 'node:http';
import { CREDENTIALS, REGION } from './stand-in.ts';

// A second, plain implementation of Signature Version 4, for sending what no client library would.

export type Answer = {
  readonly status: number;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly text: string;
  /** The code of the XML error, if it is one. */
  readonly code: string | undefined;
};

export type RawRequest = {
  readonly method?: string;
  /** As sent, already encoded; with its query, already sorted. */
  readonly path: string;
  readonly headers?: Readonly<Record<string, string>>;
  readonly body?: string | Buffer;
};

/** Sends a request exactly as given. */
export function send(
  port: number,
  { method = 'GET', path, headers = {}, body }: RawRequest,
): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const outgoing = request({ host: '127.0.0.1', port, method, path, headers, agent: false }, (response) => {
      const pieces: Buffer[] = [];
      response.on('data', (piece: Buffer) => pieces.push(piece));
      response.on('error', reject);
      response.on('end', () => {
        const text = Buffer.concat(pieces).toString('utf8');
        const code = /<Code>(\w+)<\/Code>/.exec(text)?.[1];
        resolve({ status: response.statusCode ?? 0, headers: response.headers, text, code });
      });
    });
    outgoing.on('error', reject);
    outgoing.end(body);
  });
}

export type Signing = {
  readonly date?: Date;
  readonly payloadHash?: string;
  readonly accessKeyId?: string;
  readonly secretAccessKey?: string;
  readonly region?: string;
  /** Tells the time in a Date header and not in x-amz-date. */
  readonly dateHeader?: boolean;
};

export type SignedHeaders = Record<string, string> & { authorization: string };

/** The headers of a request with a signature of all of them. The body's hash unless told otherwise. */
export function signedHeaders(port: number, raw: RawRequest, signing: Signing = {}): SignedHeaders {
  const { method = 'GET', path, body = '' } = raw;
  const { secretAccessKey = CREDENTIALS.secretAccessKey, region = REGION } = signing;
  const accessKeyId = signing.accessKeyId ?? CREDENTIALS.accessKeyId;
  const date = signing.date ?? new Date();
  const timestamp = timestampOf(date);
  const headers: Record<string, string> = {
    host: `127.0.0.1:${String(port)}`,
    ...(signing.dateHeader ? { date: date.toUTCString() } : { 'x-amz-date': timestamp }),
    'x-amz-content-sha256': signing.payloadHash ?? sha256(body),
    ...raw.headers,
  };
  const names = Object.keys(headers).sort();
  const [bare = '', query = ''] = path.split('?');
  const lines = names.map((name) => `${name}:${headers[name] ?? ''}\n`).join('');
  const canonical = [method, bare, query, lines, names.join(';'), headers['x-amz-content-sha256']].join('\n');
  const scope = scopeOf(timestamp, region);
  const toSign = ['AWS4-HMAC-SHA256', timestamp, scope, sha256(canonical)].join('\n');
  const signature = hmac(signingKey(timestamp, region, secretAccessKey), toSign).toString('hex');
  return {
    ...headers,
    authorization: `AWS4-HMAC-SHA256 Credential=${accessKeyId}/${scope}, SignedHeaders=${names.join(';')}, Signature=${signature}`,
  };
}

/** Signs and sends a request. */
export function sendSigned(port: number, raw: RawRequest, signing: Signing = {}): Promise<Answer> {
  return send(port, { ...raw, headers: signedHeaders(port, raw, signing) });
}

export function timestampOf(date: Date): string {
  return date.toISOString().replace(/[-:]|\.\d+/g, '');
}

export function scopeOf(timestamp: string, region = REGION): string {
  return `${timestamp.slice(0, 8)}/${region}/s3/aws4_request`;
}

export function signingKey(
  timestamp: string,
  region = REGION,
  secret: string = CREDENTIALS.secretAccessKey,
): Buffer {
  const day = hmac(Buffer.from(`AWS4${secret}`), timestamp.slice(0, 8));
  return hmac(hmac(hmac(day, region), 's3'), 'aws4_request');
}

export function hmac(key: Buffer, text: string): Buffer {
  return createHmac('sha256', key).update(text).digest();
}

export function sha256(body: string | Buffer): string {
  return createHash('sha256').update(body).digest('hex');
}
