import { randomUUID } from 'node:crypto';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { type Logger } from 'pino';
import { sendPageForm } from './page-answers.ts';
import { type PageCache } from './page-cache.ts';
import { choosePageEncoding } from './page-negotiation.ts';
import { logRequest } from './request-log.ts';

/**
 * Makes the short way for pages that are kept. It takes only requests that need none of the other checks: a path
 * in the cache, asked for plainly under our own name. All others it leaves to the long way.
 * @param host PUBLIC_URL's host, as browsers send it
 * @returns whether the request was answered
 */
export function keptPageServer(cache: PageCache, host: string, isDraining: () => boolean, log: Logger) {
  return (req: IncomingMessage, res: ServerResponse): boolean => {
    const { method, url = '' } = req;
    if ((method !== 'GET' && method !== 'HEAD') || isDraining()) return false;
    const mark = url.indexOf('?');
    const path = mark === -1 ? url : url.slice(0, mark);
    const page = cache.get(path);
    if (page === undefined) return false;
    const startedAt = performance.now();
    const { headers } = req;
    if (headers.host !== host || headers['transfer-encoding'] !== undefined) return false;
    if (headers['content-length'] !== undefined) return false;
    const requestId = randomUUID();
    const form = page[choosePageEncoding(headers['accept-encoding'])];
    const status = sendPageForm(req, res, form, requestId);
    logRequest(log, { requestId, method, path, status, startedAt, cache: 'hit' });
    return true;
  };
}
