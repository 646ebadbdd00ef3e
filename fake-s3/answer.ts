import { randomBytes } from 'node:crypto';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { allowOrigin, answerPreflight } from './cors.ts';
import { S3Error } from './errors.ts';
import { chooseOperation } from './operations.ts';
import { readRequest } from './s3-request.ts';
import { verifySignature, type Account } from './signature.ts';
import { type Storage } from './storage.ts';
import { errorDocument } from './xml.ts';

/** What every request is answered with. */
export type Service = {
  readonly account: Account;
  readonly storage: Storage;
  /** Origins whose pages may read answers; `*` for any. */
  readonly allowedOrigins: readonly string[];
  readonly clock: () => Date;
  /** Told of a request that failed for a reason that is not the client's. */
  readonly onFault: (error: unknown) => void;
};

/**
 * Answers one request; never rejects. `expectsContinue` when the client waits for `100 Continue` before it
 * sends the body, so that a refusal spares it the sending.
 */
export async function answer(
  service: Service,
  incoming: IncomingMessage,
  response: ServerResponse,
  expectsContinue: boolean,
): Promise<void> {
  const requestId = randomBytes(8).toString('hex').toUpperCase();
  let waiting = expectsContinue;
  response.setHeader('x-amz-request-id', requestId);
  allowOrigin(incoming, response, service.allowedOrigins);
  try {
    if (incoming.method === 'OPTIONS') {
      answerPreflight(incoming, response, service.allowedOrigins);
      return;
    }
    const request = readRequest(incoming, () => {
      if (waiting) response.writeContinue();
      waiting = false;
    });
    const { account, storage } = service;
    const now = service.clock();
    const authorisation = verifySignature(request, account, now);
    const run = chooseOperation(request);
    await run({ request, authorisation, response, storage, region: account.region, now: now.toISOString() });
  } catch (error) {
    refuse(service, incoming, response, error, { requestId, close: waiting });
  }
}

function refuse(
  service: Service,
  incoming: IncomingMessage,
  response: ServerResponse,
  error: unknown,
  { requestId, close }: { requestId: string; close: boolean },
): void {
  const clientIsGone = incoming.errored !== null || response.destroyed;
  if (clientIsGone) {
    response.destroy();
    return;
  }
  if (!(error instanceof S3Error)) service.onFault(error);
  if (response.headersSent) {
    // Part of an object is on its way: a broken connection is the only way left to say that the rest is not.
    response.destroy();
    return;
  }
  const refusal =
    error instanceof S3Error
      ? error
      : new S3Error('InternalError', 'We encountered an internal error. Please try again.');
  const bare = incoming.method === 'HEAD' || refusal.status === 304;
  const body = Buffer.from(bare ? '' : errorDocument(refusal, incoming.url?.split('?')[0] ?? '/', requestId));
  response.writeHead(refusal.status, {
    ...refusal.headers,
    ...(bare ? {} : { 'content-type': 'application/xml', 'content-length': body.length }),
    // A client that was never told to go on will not send its body: the next bytes would be misread as it.
    ...(close ? { connection: 'close' } : {}),
  });
  response.end(body);
  // What is still being sent is read and dropped, or the client would meet a reset instead of the refusal.
  incoming.resume();
}
