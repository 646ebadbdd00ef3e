import { type APIContext } from 'astro';
import { type Person } from '../../src/seed/people.ts';
import { readSession } from '../../src/server/auth/session.ts';
import { type RuledRoute } from '../../src/server/http/api-route.ts';
import { EMPTY_FORM, type FormState } from '../../src/server/http/request-parts.ts';
import { type Services } from '../../src/server/services.ts';
import { PUBLIC_URL } from './services.ts';

export interface RouteCall {
  /** Of the path: `{ workshop: 'marram-lane' }`. */
  readonly params?: Readonly<Record<string, string>>;
  /** Sent as JSON, unless `headers` say otherwise; a string is sent as it stands. */
  readonly body?: unknown;
  /** Sent as a plain form instead. */
  readonly form?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  /** Whose cookies come along; nobody's when left out. */
  readonly actor?: Person | null;
  readonly clientAddress?: string;
  /** The Origin header: the product's own when left out, none at all for null. */
  readonly origin?: string | null;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface RouteAnswer {
  readonly status: number;
  readonly headers: Headers;
  /** The body, when it is JSON. */
  readonly json: unknown;
  /** Of an answer to a form that leads elsewhere. */
  readonly location: string | null;
  /** The page that is shown in place, with what its form is given, as `Astro.locals.form`. */
  readonly page: { readonly path: string; readonly form: FormState } | null;
  /** Set-Cookie lines. */
  readonly setCookies: readonly string[];
}

/** The code of a refusal in JSON, such as `not_found`; null for an answer that is none. */
export function codeOf({ json }: RouteAnswer): string | null {
  const body = json as { error?: { code?: string } } | null;
  return body?.error?.code ?? null;
}

/** The sentences of a refusal in JSON, by field. */
export function fieldsOf({ json }: RouteAnswer): Readonly<Record<string, string>> {
  return (json as { error?: { fields?: Record<string, string> } }).error?.fields ?? {};
}

/**
 * Calls an endpoint as a browser would, without Astro around it: the middleware's part is done here, a page to be
 * shown in place is recorded and not rendered, and a detour answers `detour:CODE:PAGE` as its location.
 * @param route the exported POST or GET of a module below src/pages/api
 */
export async function callRoute(
  services: Services,
  route: RuledRoute,
  call: RouteCall = {},
): Promise<RouteAnswer> {
  const request = requestOf(route, call);
  const session = await readSession(services.auth, services.settings, request.headers);
  let page: RouteAnswer['page'] = null;
  const clientAddress = call.clientAddress ?? '192.0.2.1';
  const locals: App.Locals = {
    services,
    requestId: 'test',
    clientAddress,
    form: EMPTY_FORM,
    detourFor: (code, next) => `detour:${code}:${next}`,
    parts: {
      services,
      actor: session.actor,
      requestId: 'test',
      clientAddress,
      headers: request.headers,
      setCookies: [...session.setCookies],
    },
  };
  const context = {
    request,
    url: new URL(request.url),
    params: call.params ?? {},
    locals,
    redirect: (path: string, status: number) => new Response(null, { status, headers: { location: path } }),
    rewrite: (shown: Request) => {
      page = { path: shown.url.replace(PUBLIC_URL, ''), form: locals.form };
      return Promise.resolve(new Response('a page', { headers: { 'content-type': 'text/html' } }));
    },
  };
  const response = await route(context as unknown as APIContext);
  const isJson = response.headers.get('content-type')?.startsWith('application/json') ?? false;
  return {
    status: response.status,
    headers: response.headers,
    json: isJson ? await response.json() : null,
    location: response.headers.get('location'),
    page,
    setCookies: locals.parts.setCookies,
  };
}

function requestOf(route: RuledRoute, call: RouteCall): Request {
  const url = new URL('/api/asked', PUBLIC_URL);
  url.search = new URLSearchParams(call.query).toString();
  const headers = new Headers({ ...call.headers });
  const cookie = call.actor?.headers.get('cookie');
  if (cookie) headers.set('cookie', cookie);
  if (route.route.verb.rule.kind === 'read') return new Request(url, { headers });
  if (call.origin !== null) headers.set('origin', call.origin ?? PUBLIC_URL);
  if (call.form) return new Request(url, { method: 'POST', headers, body: new URLSearchParams(call.form) });
  if (!headers.has('content-type')) headers.set('content-type', 'application/json');
  const body = typeof call.body === 'string' ? call.body : JSON.stringify(call.body ?? {});
  return new Request(url, { method: 'POST', headers, body });
}
