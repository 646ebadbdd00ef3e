import { once } from 'node:events';
import { readFile } from 'node:fs/promises';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { createRequire } from 'node:module';
import type { AddressInfo } from 'node:net';
import { parseRule, type Behaviour } from './behaviour.ts';
import type { Kept, Mailbox, Wanted } from './mailbox.ts';
import { framedHtml, messagePage, outboxPage, sentencePage } from './pages.ts';
import { readMessage, type Message } from './read-message.ts';

const PAGE_LENGTH = 100;
const LONGEST_WAIT = 60;
const LARGEST_BODY = 10_000;
const PAGE_POLICY =
  "default-src 'none'; style-src 'self'; font-src 'self'; img-src data:; frame-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'";
// The mail itself: no scripts, nothing fetched; its links open outside the frame's limits.
const MAIL_POLICY =
  "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; img-src data:; style-src 'unsafe-inline'; form-action 'none'";

type Reply = {
  readonly status?: number;
  readonly type: string;
  readonly body: string | Buffer;
  readonly headers?: Readonly<Record<string, string>>;
};

const html = (body: string, status = 200): Reply => ({ status, type: 'text/html; charset=utf-8', body });
const sentence = (status: number, text: string): Reply => ({
  status,
  type: 'text/plain; charset=utf-8',
  body: `${text}\n`,
});
const json = (value: unknown): Reply => ({
  type: 'application/json',
  body: `${JSON.stringify(value, undefined, 2)}\n`,
});
const done: Reply = { status: 204, type: 'text/plain', body: '' };

/** Why a request is not answered: it came by a foreign name, or another site's page sent it. */
function findObjection({ method = 'GET', headers }: IncomingMessage): Reply | undefined {
  const host = headers.host ?? '';
  if (!/^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/i.test(host))
    return sentence(421, 'This page answers only to loopback names.');
  const { origin } = headers;
  const changes = method !== 'GET' && method !== 'HEAD';
  if (changes && origin !== undefined && origin !== `http://${host}`)
    return sentence(403, 'Another site cannot change this.');
  return undefined;
}

async function readBody(request: IncomingMessage): Promise<string> {
  let body = '';
  for await (const chunk of request) {
    body += String(chunk);
    if (body.length > LARGEST_BODY) throw new RangeError('That is too long.');
  }
  return body;
}

function readWanted(query: URLSearchParams): Wanted {
  const to = query.get('to') ?? '';
  const after = query.get('after') ?? '';
  const before = query.get('before') ?? '';
  const moment = new Date(after);
  return {
    ...(to !== '' && { to }),
    ...(after !== '' && { after: Number.isNaN(moment.getTime()) ? after : moment }),
    ...(before !== '' && { before }),
  };
}

/**
 * The outbox for people and for tests, over HTTP.
 *
 * - `GET /`, `GET /messages/{id}`: pages. `GET /messages/{id}.eml`: as received
 * - `GET /messages.json?to=&after=&before=&limit=&wait=`: `{ messages }`, newest first. `after` is an id or an
 *   instant; `wait` holds the answer for that many seconds, 60 at most, until there is one
 * - `DELETE /messages`
 * - `GET`, `PUT`, `DELETE /behaviour`: the rules; PUT takes one as JSON, see `Rule`
 */
export function createPageServer(mailbox: Mailbox, behaviour: Behaviour) {
  const read = new Map<string, Message>();
  const closing = new AbortController();

  async function load(kept: Kept): Promise<Message> {
    const known = read.get(kept.id);
    if (known) return known;
    const message = await readMessage(kept, await mailbox.raw(kept));
    if (read.size >= 500) read.clear();
    read.set(kept.id, message);
    return message;
  }

  async function outbox(query: URLSearchParams): Promise<Reply> {
    const wanted = readWanted(query);
    const found = mailbox.list(wanted, PAGE_LENGTH + 1);
    const messages = await Promise.all(found.slice(0, PAGE_LENGTH).map(load));
    return html(
      outboxPage({
        messages,
        count: mailbox.count(),
        to: wanted.to,
        older: found.length > PAGE_LENGTH ? messages.at(-1)?.id : undefined,
        rules: behaviour.list(),
      }),
    );
  }

  async function listing(query: URLSearchParams, response: ServerResponse): Promise<Reply> {
    const wanted = readWanted(query);
    const limit = Math.min(Number(query.get('limit') ?? PAGE_LENGTH), 1000);
    const wait = Math.min(Number(query.get('wait') ?? 0), LONGEST_WAIT);
    if (!(limit > 0) || !(wait >= 0)) return sentence(400, 'limit and wait are numbers.');
    if (wait > 0) {
      const gone = new AbortController();
      response.once('close', () => {
        gone.abort();
      });
      const limits = [gone.signal, closing.signal, AbortSignal.timeout(wait * 1000)];
      await mailbox.arrival(wanted, AbortSignal.any(limits));
    }
    return json({ messages: await Promise.all(mailbox.list(wanted, limit).map(load)) });
  }

  async function message(id: string, view: string): Promise<Reply> {
    const kept = mailbox.find(id);
    if (!kept) return html(sentencePage('That message is not here.'), 404);
    const raw = await mailbox.raw(kept);
    if (view === '.eml') return { type: 'message/rfc822', body: raw };
    const read = await load(kept);
    if (view === '') return html(messagePage(read, raw.toString('utf8')));
    if (read.html === undefined) return html(sentencePage('That message has no HTML part.'), 404);
    return { ...html(framedHtml(read.html)), headers: { 'Content-Security-Policy': MAIL_POLICY } };
  }

  async function tell(request: IncomingMessage): Promise<Reply> {
    try {
      const rule = parseRule(JSON.parse(await readBody(request)));
      if (typeof rule === 'string') return sentence(400, rule);
      behaviour.set(rule);
      return done;
    } catch {
      return sentence(400, 'Send a JSON object.');
    }
  }

  async function font(weight: string): Promise<Reply> {
    try {
      const file = createRequire(import.meta.url).resolve(
        `@fontsource/karla/files/karla-latin-${weight}-normal.woff2`,
      );
      return {
        type: 'font/woff2',
        body: await readFile(file),
        headers: { 'Cache-Control': 'max-age=86400' },
      };
    } catch {
      return sentence(404, 'The font is not installed.');
    }
  }

  async function answer(request: IncomingMessage, response: ServerResponse): Promise<Reply> {
    const objection = findObjection(request);
    if (objection) return objection;
    const { pathname, searchParams } = new URL(request.url ?? '/', 'http://outbox.test');
    switch (`${request.method ?? ''} ${pathname}`) {
      case 'GET /':
        return outbox(searchParams);
      case 'GET /messages.json':
        return listing(searchParams, response);
      case 'DELETE /messages':
        await mailbox.clear();
        return done;
      case 'POST /messages/delete':
        await mailbox.clear();
        return { status: 303, type: 'text/plain', body: '', headers: { Location: '/' } };
      case 'GET /behaviour':
        return json({ rules: behaviour.list() });
      case 'PUT /behaviour':
        return tell(request);
      case 'DELETE /behaviour':
        behaviour.clear();
        return done;
      case 'GET /style.css':
        return { type: 'text/css', body: await readFile(new URL('style.css', import.meta.url)) };
    }
    const [, id, view = ''] = /^\/messages\/([0-9a-f-]{36})(\.eml|\/shown)?$/.exec(pathname) ?? [];
    if (request.method === 'GET' && id !== undefined) return message(id, view);
    const [, weight] = /^\/fonts\/(400|700)\.woff2$/.exec(pathname) ?? [];
    if (request.method === 'GET' && weight !== undefined) return font(weight);
    return html(sentencePage('There is nothing at this address.'), 404);
  }

  const server = createServer((request, response) => {
    answer(request, response)
      .catch((): Reply => sentence(500, 'The message could not be read.'))
      .then(({ status = 200, type, body, headers }) => {
        response.writeHead(status, {
          'Content-Type': type,
          'Cache-Control': 'no-store',
          'Content-Security-Policy': PAGE_POLICY,
          'Cross-Origin-Resource-Policy': 'same-origin',
          'Referrer-Policy': 'same-origin',
          'X-Content-Type-Options': 'nosniff',
          ...headers,
        });
        response.end(body);
      })
      .catch(() => response.destroy());
  });

  return {
    /** Listens on loopback and gives the port. */
    async listen(port: number): Promise<number> {
      server.listen(port, '127.0.0.1');
      await once(server, 'listening');
      return (server.address() as AddressInfo).port;
    },
    /** Answers those who wait with what there is, then closes. */
    async close(): Promise<void> {
      closing.abort();
      const closed = once(server, 'close');
      server.close();
      server.closeIdleConnections();
      const late = setTimeout(() => {
        server.closeAllConnections();
      }, 1000);
      await closed;
      clearTimeout(late);
    },
  };
}
