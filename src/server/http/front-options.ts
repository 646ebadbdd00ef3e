import { type Logger } from 'pino';
import { type PageChanges } from './change-counter.ts';
import { type Render } from './page-render.ts';

/** How long things may take, in milliseconds. */
export const DEFAULT_TIMES = {
  /** From the first byte of a request to the end of its headers, and to the end of its body. */
  headers: 10_000,
  request: 120_000,
  /** Longer than proxies keep an idle connection, so that they never send into one being closed. */
  keepAlive: 65_000,
  /** A reader who takes nothing for so long is cut off. */
  stalled: 120_000,
  /** One render of a public page. */
  render: 30_000,
  /** Requests in flight, once the server is told to stop. */
  drain: 10_000,
};

export type FrontTimes = typeof DEFAULT_TIMES;

export type FrontServerOptions = {
  readonly host: string;
  /** 0 lets the system choose. */
  readonly port: number;
  /** PUBLIC_URL. */
  readonly publicUrl: string;
  /** Addresses and CIDR ranges whose X-Forwarded-For is believed. */
  readonly trustedProxies: readonly string[];
  /** The built client folder, served as files. */
  readonly clientDir: string;
  readonly render: Render;
  readonly changes: PageChanges;
  readonly isHealthy: () => Promise<boolean> | boolean;
  /** Whether a path shows the same to everyone, so that its page may be kept and is rendered without cookies. */
  readonly isPublicPage: (path: string) => boolean;
  readonly log: Logger;
  /** Bytes that a request body may have, by path. */
  readonly bodyLimit?: (path: string) => number;
  /** What the application gets in its locals beside `requestId` and `clientAddress`. */
  readonly locals?: () => object;
  readonly cacheBytes?: number;
  readonly times?: Partial<FrontTimes>;
};
