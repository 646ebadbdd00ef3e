import { createServer } from 'node:http';
import { type AddressInfo } from 'node:net';
import { DEFAULT_TIMES, type FrontServerOptions } from './front-options.ts';
import { prepareGracefulStop } from './graceful-stop.ts';
import { createRequestHandler } from './handle-request.ts';
import { openKeptPageLane } from './kept-page-lane.ts';
import { DEFAULT_CACHE_BYTES, PageCache } from './page-cache.ts';
import { keptPageAnswers } from './serve-kept-page.ts';

export type FrontServer = {
  /** The port listened on. */
  readonly port: number;
  /** Stops accepting, lets requests in flight finish for at most ten seconds, then cuts off what is left. */
  close(): Promise<void>;
};

const MOST_HEADER_BYTES = 16 * 1024;
const MOST_HEADERS = 100;

/**
 * Starts the server that stands before the application: it judges requests, keeps public pages as bytes and serves
 * them past the application, serves static files, and sets what every answer must carry.
 * @throws when the client folder is missing, a trusted proxy is no address, or the port cannot be listened on
 */
export async function startFrontServer(options: FrontServerOptions): Promise<FrontServer> {
  const times = { ...DEFAULT_TIMES, ...options.times };
  const cache = new PageCache(options.cacheBytes ?? DEFAULT_CACHE_BYTES);
  const server = createServer({
    headersTimeout: times.headers,
    requestTimeout: times.request,
    keepAliveTimeout: times.keepAlive,
    // How often the two limits above are looked at.
    connectionsCheckingInterval: Math.min(2_000, times.headers / 2),
    maxHeaderSize: MOST_HEADER_BYTES,
    noDelay: true,
  });
  server.maxHeadersCount = MOST_HEADERS;
  server.timeout = times.stalled;

  const host = new URL(options.publicUrl).host;
  const isDraining = () => graceful.isDraining();
  const lane = openKeptPageLane(server, {
    answer: keptPageAnswers({ cache, host, log: options.log, isDraining }, times.keepAlive),
    firstMs: times.headers,
    idleMs: times.keepAlive,
  });
  const graceful = prepareGracefulStop(server, times.drain, () => {
    lane.close();
  });
  const handle = createRequestHandler(options, times, cache, isDraining);
  server.on('request', (req, res) => {
    handle(req, res);
  });
  server.on('checkContinue', (req, res) => {
    handle(req, res, () => {
      res.writeContinue();
    });
  });

  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, options.host, () => {
      server.off('error', reject);
      resolve();
    });
  });
  const unsubscribe = options.changes.subscribe((tags) => {
    cache.drop(tags);
  });

  return {
    port: (server.address() as AddressInfo).port,
    async close() {
      await graceful.stop();
      unsubscribe();
      cache.drop(['*']);
    },
  };
}
