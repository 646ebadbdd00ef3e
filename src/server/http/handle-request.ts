import { randomUUID } from 'node:crypto';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { announcesTooMuch, BodyTooLarge, countBody, DEFAULT_BODY_LIMIT } from './body-limit.ts';
import { clientAddressFinder, overwriteForwardedHeaders } from './client-address.ts';
import { type FrontServerOptions, type FrontTimes } from './front-options.ts';
import { answerHealth, HEALTH_PATH } from './health-check.ts';
import { hostChecker } from './host-check.ts';
import { type PageCache } from './page-cache.ts';
import { refuse } from './plain-answers.ts';
import { logRequest, type CacheUse } from './request-log.ts';
import { ALLOW, readRequestTarget, type RequestTarget } from './request-target.ts';
import { guardResponse } from './response-guard.ts';
import { createApplication } from './run-application.ts';
import { securityHeaders } from './security-headers.ts';
import { keptPageServer } from './serve-kept-page.ts';

type Handle = (req: IncomingMessage, res: ServerResponse, sendContinue?: () => void) => void;

/** Makes the function that takes a request from its first look to its answer. */
export function createRequestHandler(
  options: FrontServerOptions,
  times: FrontTimes,
  cache: PageCache,
  isDraining: () => boolean,
): Handle {
  const { log } = options;
  const publicUrl = new URL(options.publicUrl);
  const everyAnswer = securityHeaders(options.publicUrl);
  const serveKeptPage = keptPageServer({ cache, host: publicUrl.host, log, isDraining });
  const judgeHost = hostChecker(publicUrl);
  const findClientAddress = clientAddressFinder(options.trustedProxies);
  const runApplication = createApplication(options, {
    publicUrl,
    everyAnswer,
    cache,
    renderTimeoutMs: times.render,
  });

  /** Answers requests that go no further. Gives false for one that may go on. */
  function turnAway(req: IncomingMessage, res: ServerResponse, target: RequestTarget): boolean {
    const verdict = judgeHost(req.headers.host);
    if (verdict === 'another loopback name' && (req.method === 'GET' || req.method === 'HEAD')) {
      refuse(req, res, 308, `This address is ${options.publicUrl}.`, {
        Location: publicUrl.origin + target.path + target.query,
      });
      return true;
    }
    if (verdict !== 'ours') {
      refuse(req, res, 421, `This server answers only for ${publicUrl.host}.`);
      return true;
    }
    const limit = options.bodyLimit?.(target.path) ?? DEFAULT_BODY_LIMIT;
    const tooLarge = () => {
      if (!res.headersSent)
        return refuse(req, res, 413, `A request may bring at most ${String(limit)} bytes here.`);
      return () => res.destroy();
    };
    if (announcesTooMuch(req, limit)) {
      tooLarge();
      return true;
    }
    countBody(req, limit, tooLarge);
    return false;
  }

  function fail(req: IncomingMessage, res: ServerResponse, requestId: string, error: unknown): void {
    // Answered already, when the limit was passed.
    if (error instanceof BodyTooLarge) return;
    log.error({ err: error, requestId }, 'a request failed');
    const sentence = `Something went wrong here. Its number, should you ask us about it: ${requestId}`;
    if (res.headersSent) res.destroy();
    else refuse(req, res, 500, sentence);
  }

  return (req, res, sendContinue) => {
    if (serveKeptPage(req, res)) return;
    const startedAt = performance.now();
    const requestId = randomUUID();
    guardResponse(res, requestId, everyAnswer, isDraining);
    const { method, url = '' } = req;
    const target = readRequestTarget(method, url, publicUrl.origin);
    const refused = 'status' in target;
    if (!refused && target.path === HEALTH_PATH) {
      if (method === 'GET' || method === 'HEAD') void answerHealth(res, options.isHealthy, isDraining);
      else refuse(req, res, 405, 'This address is only read.', { Allow: 'GET, HEAD' });
      return;
    }
    const seen: { cache: CacheUse } = { cache: 'none' };
    const path = refused ? (url.slice(0, 200).split('?')[0] ?? '') : target.path;
    res.once('close', () => {
      const { statusCode: status, writableFinished } = res;
      logRequest(log, {
        requestId,
        method,
        path,
        status,
        startedAt,
        cache: seen.cache,
        aborted: !writableFinished && status < 400,
      });
    });
    if (refused) {
      refuse(req, res, target.status, target.sentence, target.status === 405 ? { Allow: ALLOW } : {});
      return;
    }
    const noteCache = (use: CacheUse) => {
      seen.cache = use;
    };
    const goOn = async () => {
      if (turnAway(req, res, target)) return;
      const clientAddress = findClientAddress(req);
      overwriteForwardedHeaders(req, clientAddress, publicUrl);
      req.url = target.path + target.query;
      sendContinue?.();
      await runApplication(req, res, { ...target, requestId, clientAddress, noteCache });
    };
    goOn().catch((error: unknown) => {
      fail(req, res, requestId, error);
    });
  };
}
