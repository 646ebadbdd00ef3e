import { type IncomingMessage, type ServerResponse } from 'node:http';
import { constants } from 'node:zlib';
import compression from 'compression';

type Step = (req: IncomingMessage, res: ServerResponse, next: () => void) => void;

/** Good enough for an answer that is made once and sent once. */
const BROTLI_QUALITY = 4;

function isWorthIt(req: IncomingMessage, res: ServerResponse): boolean {
  const type = String(res.getHeader('Content-Type') ?? '');
  // An event stream must arrive as it is written, and a range counts the bytes of the plain form.
  if (type.startsWith('text/event-stream') || res.statusCode === 206) return false;
  return compression.filter(req as Parameters<typeof compression.filter>[0], res as never);
}

/** Makes the step that compresses text on its way out, as the client accepts it. */
export function dynamicCompression(): Step {
  return compression({
    filter: isWorthIt,
    brotli: { params: { [constants.BROTLI_PARAM_QUALITY]: BROTLI_QUALITY } },
  }) as unknown as Step;
}
