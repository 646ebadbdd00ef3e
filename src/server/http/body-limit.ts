import { type IncomingMessage } from 'node:http';

/** What a request may send unless its route says otherwise. */
export const DEFAULT_BODY_LIMIT = 1024 * 1024;

/** What a form with a list in it may send: 2 MiB of it, as a file and as text, which encoding may stretch. */
export const LIST_BODY_LIMIT = 8 * 1024 * 1024;

/** Thrown into a request whose body went past its limit, so that whoever reads it stops. */
export class BodyTooLarge extends Error {
  constructor(readonly limit: number) {
    super(`The request body is larger than ${String(limit)} bytes.`);
    this.name = 'BodyTooLarge';
  }
}

/** Whether a request announces a body. */
export function hasBody(req: IncomingMessage): boolean {
  const length = req.headers['content-length'];
  return req.headers['transfer-encoding'] !== undefined || (length !== undefined && length !== '0');
}

/** Whether the announced length alone is past the limit, in bytes. */
export function announcesTooMuch(req: IncomingMessage, limit: number): boolean {
  return Number(req.headers['content-length'] ?? 0) > limit;
}

/**
 * Counts a body of unknown length as it comes. Past the limit the reader gets `BodyTooLarge`, `onTooLarge` is
 * called once, and what still comes is thrown away; what `onTooLarge` gives back is called at its end. A body of announced length needs no counting: Node's parser
 * ends it there.
 */
export function countBody(req: IncomingMessage, limit: number, onTooLarge: () => () => void): void {
  if (req.headers['transfer-encoding'] === undefined) return;
  const push = req.push.bind(req);
  let received = 0;
  let bodyEnded: (() => void) | undefined;
  // Counted where the parser hands bytes over, so that the body is neither consumed nor copied here.
  req.push = (chunk: Buffer | null, encoding?: BufferEncoding) => {
    if (bodyEnded !== undefined) {
      if (chunk === null) bodyEnded();
      return true;
    }
    received += chunk?.length ?? 0;
    if (received <= limit) return push(chunk, encoding);
    bodyEnded = onTooLarge();
    // Node would close the socket with the request, before the answer has left.
    req._destroy = (error, done) => {
      done(error);
    };
    req.once('error', () => undefined);
    req.destroy(new BodyTooLarge(limit));
    return true;
  };
}
