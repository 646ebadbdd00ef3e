import { type IncomingMessage, type ServerResponse } from 'node:http';
import { hasBody } from './body-limit.ts';

/** How long what a refused client still sends is thrown away, so that it gets to read the answer. */
const LINGER_MS = 2_000;

type Headers = Readonly<Record<string, string>>;

function plainHeaders(text: string): Headers {
  return {
    'Content-Type': 'text/plain; charset=utf-8',
    'Content-Length': String(Buffer.byteLength(text)),
    'Cache-Control': 'no-store',
  };
}

/** Answers with one sentence, kept by nobody. */
export function answerPlainly(
  res: ServerResponse,
  status: number,
  sentence: string,
  headers: Headers = {},
): void {
  const text = `${sentence}\n`;
  res.writeHead(status, { ...plainHeaders(text), ...headers });
  res.end(text);
}

/**
 * Answers with one sentence before the body, if any, has been read. A connection that still has a body coming is
 * closed, once the client has had time to read why.
 * @returns to be called when the body has ended, by a caller who keeps it from the request
 */
export function refuse(
  req: IncomingMessage,
  res: ServerResponse,
  status: number,
  sentence: string,
  headers: Headers = {},
): () => void {
  if (!hasBody(req) || req.complete) {
    answerPlainly(res, status, sentence, headers);
    return () => undefined;
  }
  const text = `${sentence}\n`;
  res.writeHead(status, { ...plainHeaders(text), Connection: 'close', ...headers });
  // The answer is whole with its last byte. Ending it now would close the socket on bytes still unread, and the
  // reset that follows can overtake the answer.
  if (req.method === 'HEAD') res.flushHeaders();
  else res.write(text);
  const end = res.end.bind(res);
  const finish = () => {
    clearTimeout(timer);
    end();
  };
  const timer = setTimeout(finish, LINGER_MS);
  req.once('end', finish);
  res.once('close', () => {
    clearTimeout(timer);
  });
  mute(res);
  req.resume();
  return finish;
}

/** Leaves a response that has been answered deaf to whoever still writes to it. */
function mute(res: ServerResponse): void {
  res.writeHead = () => res;
  res.write = () => true;
  res.end = () => res;
  res.destroy = () => res;
}
