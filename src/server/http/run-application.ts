import { type IncomingMessage, type ServerResponse } from 'node:http';
import { dynamicCompression } from './dynamic-compression.ts';
import { type FrontServerOptions } from './front-options.ts';
import { sendCaptured, sendPageForm } from './page-answers.ts';
import { type PageCache } from './page-cache.ts';
import { choosePageEncoding } from './page-negotiation.ts';
import { renderPublicPage } from './page-render.ts';
import { answerPlainly, refuse } from './plain-answers.ts';
import { createPublicPages } from './public-pages.ts';
import { type CacheUse } from './request-log.ts';
import { type HeaderPair } from './security-headers.ts';
import { HASHED_FOLDER, serveStaticFiles } from './static-files.ts';

/** Where the application has its page for what is not there. */
const NOT_FOUND_PATH = '/404';

export type ApplicationSetup = {
  readonly publicUrl: URL;
  readonly everyAnswer: readonly HeaderPair[];
  readonly cache: PageCache;
  readonly renderTimeoutMs: number;
};

/** A request that has passed all checks. */
export type PassedRequest = {
  readonly path: string;
  readonly query: string;
  readonly requestId: string;
  readonly clientAddress: string;
  noteCache(use: CacheUse): void;
};

type Exchange = (req: IncomingMessage, res: ServerResponse, request: PassedRequest) => Promise<void>;

/** Makes the function that answers checked requests: public pages, static files, and all else by the application. */
export function createApplication(options: FrontServerOptions, setup: ApplicationSetup): Exchange {
  const { publicUrl } = setup;
  const compress = dynamicCompression();
  const serveStatic = serveStaticFiles(options.clientDir);

  /** Lets the application answer; for an address that it does not know, with its own page for that. */
  async function render(req: IncomingMessage, res: ServerResponse, locals: object): Promise<void> {
    for (const again of [true, false]) {
      let missed = false;
      let failure: unknown;
      const next = (error?: unknown) => {
        missed = true;
        failure = error;
      };
      await options.render(req, res, next, { ...options.locals?.(), ...locals });
      if (failure !== undefined) throw failure;
      if (!missed) return;
      if (again) req.url = NOT_FOUND_PATH;
    }
    answerPlainly(res, 404, 'There is nothing at this address.');
  }

  const answerPublicPage = createPublicPages({
    ...setup,
    changes: options.changes,
    renderPage: (path, requestId) =>
      renderPublicPage(
        // The page is for everyone: it gets no address of whoever happened to ask first.
        (req, res) => render(req, res, { requestId, clientAddress: '' }),
        path,
        publicUrl,
        setup.renderTimeoutMs,
      ),
  });

  const servePublicPage: Exchange = async (req, res, { path, query, requestId, noteCache }) => {
    if (req.method !== 'GET' && req.method !== 'HEAD') {
      refuse(req, res, 405, 'This page is only read.', { Allow: 'GET, HEAD' });
      return;
    }
    noteCache('miss');
    const answer = await answerPublicPage(path, requestId);
    const form =
      answer.kind === 'page' && (await answer.form(choosePageEncoding(req.headers['accept-encoding'])));
    if (res.destroyed) return;
    if (form !== false) {
      const bodyless = req.method === 'HEAD';
      sendPageForm(res, form, { requestId, ifNoneMatch: req.headers['if-none-match'], bodyless });
    } else if (answer.kind === 'other') {
      compress(req, res, () => {
        sendCaptured(req, res, answer.answer, query);
      });
    }
  };

  const serveTheRest: Exchange = (req, res, { path, requestId, clientAddress }) =>
    new Promise((resolve, reject) => {
      compress(req, res, () => {
        serveStatic(req, res, () => {
          if (path.startsWith(HASHED_FOLDER)) refuse(req, res, 404, 'There is no such file.');
          else render(req, res, { requestId, clientAddress }).then(resolve, reject);
        });
      });
    });

  return (req, res, request) =>
    options.isPublicPage(request.path) ? servePublicPage(req, res, request) : serveTheRest(req, res, request);
}
