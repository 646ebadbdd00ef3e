import { type IncomingMessage, type ServerResponse } from 'node:http';
import { type PageForm } from './page-forms.ts';
import { matchesEtag } from './page-negotiation.ts';
import { type CapturedAnswer } from './page-render.ts';

type Asked = {
  readonly requestId: string;
  readonly ifNoneMatch: string | undefined;
  /** Asked by HEAD. */
  readonly bodyless: boolean;
};

/**
 * Sends one form of a page, or 304 when the client has it.
 * @returns the status sent
 */
export function sendPageForm(
  res: ServerResponse,
  form: PageForm,
  { requestId, ifNoneMatch, bodyless }: Asked,
): number {
  if (matchesEtag(ifNoneMatch, form.etag)) {
    res.writeHead(304, [...form.notModifiedHead, 'X-Request-Id', requestId]);
    res.end();
    return 304;
  }
  res.writeHead(200, [...form.head, 'X-Request-Id', requestId]);
  if (bodyless) res.end();
  else res.end(form.body);
  return 200;
}

/** Sends an answer that was rendered for a public path but is not kept: a redirect, an error. */
export function sendCaptured(
  req: IncomingMessage,
  res: ServerResponse,
  answer: CapturedAnswer,
  query: string,
): void {
  for (const [name, value] of answer.headers) res.setHeader(name, value);
  const location = res.getHeader('Location');
  // A page is rendered without its query; a redirect to its new address must not lose `?t=`.
  if (typeof location === 'string' && query !== '' && !/[?#]/.test(location)) {
    res.setHeader('Location', location + query);
  }
  if (!res.hasHeader('Cache-Control')) res.setHeader('Cache-Control', 'no-cache');
  if (answer.status !== 304 && answer.status !== 204) res.setHeader('Content-Length', answer.body.length);
  res.writeHead(answer.status);
  if (req.method === 'HEAD') res.end();
  else res.end(answer.body);
}
