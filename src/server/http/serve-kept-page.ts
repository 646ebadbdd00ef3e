import { randomUUID } from 'node:crypto';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { type Logger } from 'pino';
import { type LaneAnswer } from './kept-page-lane.ts';
import { sendPageForm } from './page-answers.ts';
import { type PageCache } from './page-cache.ts';
import { type PageForm } from './page-forms.ts';
import { choosePageEncoding, matchesEtag } from './page-negotiation.ts';
import { type PlainRequest } from './plain-request.ts';
import { logRequest, millisecondsSince } from './request-log.ts';

export type KeptPageOptions = {
  readonly cache: PageCache;
  /** PUBLIC_URL's host, as browsers send it. */
  readonly host: string;
  readonly log: Logger;
  isDraining(): boolean;
};

/**
 * Makes the short way for pages that are kept, on an ordinary connection. It takes only requests that need none of
 * the other checks: a path in the cache, asked for without a body under our own name. Others go the long way.
 * @returns whether the request was answered
 */
export function keptPageServer({ cache, host, log, isDraining }: KeptPageOptions) {
  return (req: IncomingMessage, res: ServerResponse): boolean => {
    const { method, url = '', headers } = req;
    if ((method !== 'GET' && method !== 'HEAD') || isDraining()) return false;
    const startedAt = performance.now();
    const path = url.split('?', 1)[0] ?? '';
    const page = cache.get(path);
    if (page === undefined || headers.host !== host) return false;
    if (headers['content-length'] !== undefined || headers['transfer-encoding'] !== undefined) return false;
    const requestId = randomUUID();
    const status = sendPageForm(res, page[choosePageEncoding(headers['accept-encoding'])], {
      requestId,
      ifNoneMatch: headers['if-none-match'],
      bodyless: method === 'HEAD',
    });
    logRequest(log, { requestId, method, path, status, startedAt, cache: 'hit' });
    return true;
  };
}

/** Today's date as a header, made once a second. */
function dateClock(): () => string {
  let second = 0;
  let text = '';
  return () => {
    const now = Math.floor(Date.now() / 1_000);
    if (now !== second) {
      second = now;
      text = new Date(now * 1_000).toUTCString();
    }
    return text;
  };
}

/** Makes the function that answers for kept pages in the short lane before the HTTP server. */
export function keptPageAnswers({ cache, host, log }: KeptPageOptions, idleMs: number) {
  const date = dateClock();
  const tail = `\r\nConnection: keep-alive\r\nKeep-Alive: timeout=${String(Math.floor(idleMs / 1_000))}\r\n\r\n`;
  /** A logger an answer, with all of its line that is the same every time written out once. */
  const hitLogs = new WeakMap<PageForm, { sent: Logger; notModified: Logger }>();

  function logsOf(form: PageForm, path: string): { sent: Logger; notModified: Logger } {
    const known = hitLogs.get(form);
    if (known !== undefined) return known;
    const facts = { method: 'GET', path, cache: 'hit' };
    const logs = {
      sent: log.child({ ...facts, status: 200 }),
      notModified: log.child({ ...facts, status: 304 }),
    };
    hitLogs.set(form, logs);
    return logs;
  }

  return (request: PlainRequest): LaneAnswer | null => {
    if (request.host !== host) return null;
    const startedAt = performance.now();
    const page = cache.get(request.path);
    if (page === undefined) return null;
    const form = page[choosePageEncoding(request.acceptEncoding)];
    const requestId = randomUUID();
    const fresh = matchesEtag(request.ifNoneMatch, form.etag);
    const logs = logsOf(form, request.path);
    (fresh ? logs.notModified : logs.sent).info({ requestId, ms: millisecondsSince(startedAt) }, 'request');
    const head = fresh ? form.notModifiedText : form.headText;
    return {
      head: `${head}X-Request-Id: ${requestId}\r\nDate: ${date()}${tail}`,
      body: fresh ? undefined : form.body,
    };
  };
}
