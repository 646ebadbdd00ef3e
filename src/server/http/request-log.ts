import { type Logger } from 'pino';

/** How the page cache took part: `miss` is a public page rendered now, `none` everything else. */
export type CacheUse = 'hit' | 'miss' | 'none';

export type RequestFacts = {
  readonly requestId: string;
  readonly method: string | undefined;
  /** Without its query: queries carry what people typed. */
  readonly path: string;
  readonly status: number;
  /** Times from `performance.now()`. */
  readonly startedAt: number;
  readonly cache: CacheUse;
  /** The client left before the answer was whole. */
  readonly aborted?: boolean;
};

/** Milliseconds since a time of `performance.now()`, to a tenth. */
export function millisecondsSince(startedAt: number): number {
  return Math.round((performance.now() - startedAt) * 10) / 10;
}

/** A signed token in a path, as long as base64url makes an HMAC-SHA-256: whoever reads it may use it. */
const TOKEN_IN_PATH = /(?<=\/)[\w-]{43}(?=\/|$)/g;

/** Writes the one line of a request. */
export function logRequest(log: Logger, facts: RequestFacts): void {
  const { requestId, method, status, startedAt, cache, aborted } = facts;
  const path = facts.path.replace(TOKEN_IN_PATH, '…');
  const ms = millisecondsSince(startedAt);
  log.info(
    { requestId, method, path, status, ms, cache, ...(aborted === true ? { aborted } : {}) },
    'request',
  );
}
