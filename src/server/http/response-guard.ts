import { type OutgoingHttpHeaders, type ServerResponse } from 'node:http';
import { FALLBACK_POLICY, type HeaderPair } from './security-headers.ts';

/** Names the tags of a public page inside the process; it never leaves. */
export const PAGE_TAGS_HEADER = 'x-page-tags';

const NEVER_SENT = [PAGE_TAGS_HEADER, 'x-powered-by', 'server'];

/** Puts headers in any of the forms that `writeHead` takes into the response. */
export function applyHeaders(res: ServerResponse, headers: unknown): void {
  if (Array.isArray(headers)) {
    const flat = headers.flat().map(String);
    const names = flat.filter((_text, at) => at % 2 === 0);
    for (const name of names) res.removeHeader(name);
    for (const [at, name] of names.entries()) res.appendHeader(name, flat[2 * at + 1] ?? '');
    return;
  }
  for (const [name, value] of Object.entries((headers ?? {}) as OutgoingHttpHeaders)) {
    if (value !== undefined) res.setHeader(name, value);
  }
}

/**
 * Sets the headers of every answer, and looks over those of the application just before they are sent: internal
 * ones are taken out, a missing content policy is filled in.
 * @param isDraining asked at that moment; true closes the connection with this answer
 */
export function guardResponse(
  res: ServerResponse,
  requestId: string,
  everyAnswer: readonly HeaderPair[],
  isDraining: () => boolean,
): void {
  for (const [name, value] of everyAnswer) res.setHeader(name, value);
  res.setHeader('X-Request-Id', requestId);
  const writeHead = res.writeHead.bind(res) as (status: number, message?: string) => ServerResponse;
  res.writeHead = (status: number, ...rest: unknown[]) => {
    applyHeaders(res, typeof rest[0] === 'string' ? rest[1] : rest[0]);
    for (const name of NEVER_SENT) res.removeHeader(name);
    // A 304 renews the headers of what the browser kept: a fallback here would replace the page's own policy.
    if (status !== 304 && !res.hasHeader('Content-Security-Policy')) {
      res.setHeader('Content-Security-Policy', FALLBACK_POLICY);
    }
    if (isDraining()) res.setHeader('Connection', 'close');
    return typeof rest[0] === 'string' && rest[0] !== '' ? writeHead(status, rest[0]) : writeHead(status);
  };
}
