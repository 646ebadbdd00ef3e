import { IncomingMessage, ServerResponse, type OutgoingHttpHeader } from 'node:http';
import { Socket } from 'node:net';
import { applyHeaders, PAGE_TAGS_HEADER } from './response-guard.ts';

/** The application as the front server calls it: the handler of Astro's node adapter in middleware mode. */
export type Render = (
  req: IncomingMessage,
  res: ServerResponse,
  next: (error?: unknown) => void,
  locals: object,
) => void | Promise<void>;

/** A whole answer held in memory. */
export type CapturedAnswer = {
  readonly status: number;
  /** Lower-case name, value; without the tags header. */
  readonly headers: readonly (readonly [string, OutgoingHttpHeader])[];
  readonly body: Buffer;
  /** The tags that the page named, or null when it named none. */
  readonly tags: readonly string[] | null;
};

type Done = (error?: Error | null) => void;

/** Collects what the application writes. */
class CapturedResponse extends ServerResponse {
  readonly #chunks: Buffer[] = [];
  readonly done: Promise<void>;
  #settle: { resolve: () => void; reject: (error: Error) => void } | undefined;

  constructor(req: IncomingMessage) {
    super(req);
    this.done = new Promise((resolve, reject) => {
      this.#settle = { resolve, reject };
    });
  }

  get body(): Buffer {
    return Buffer.concat(this.#chunks);
  }

  override writeHead(status: number, ...rest: unknown[]): this {
    this.statusCode = status;
    applyHeaders(this, typeof rest[0] === 'string' ? rest[1] : rest[0]);
    return this;
  }

  override write(chunk: unknown, encoding?: BufferEncoding | Done, done?: Done): boolean {
    this.#keep(chunk, encoding);
    (typeof encoding === 'function' ? encoding : done)?.();
    return true;
  }

  override end(chunk?: unknown, encoding?: unknown): this {
    if (chunk !== undefined && chunk !== null && typeof chunk !== 'function') this.#keep(chunk, encoding);
    this.#settle?.resolve();
    this.emit('finish');
    this.emit('close');
    return this;
  }

  override destroy(error?: Error): this {
    this.#settle?.reject(error ?? new Error('The page was given up in the middle.'));
    this.emit('close');
    return this;
  }

  #keep(chunk: unknown, encoding: unknown): void {
    if (typeof chunk === 'string') {
      this.#chunks.push(
        Buffer.from(chunk, typeof encoding === 'string' ? (encoding as BufferEncoding) : 'utf8'),
      );
    } else if (chunk instanceof Uint8Array) {
      this.#chunks.push(Buffer.from(chunk));
    }
  }
}

/** Everything a public page may know of a request: nothing that differs between readers. */
function anonymousRequest(path: string, publicUrl: URL): IncomingMessage {
  const req = new IncomingMessage(new Socket());
  req.method = 'GET';
  req.url = path;
  req.headers = {
    host: publicUrl.host,
    'x-forwarded-host': publicUrl.host,
    'x-forwarded-proto': publicUrl.protocol.slice(0, -1),
  };
  req.push(null);
  return req;
}

function readTags(header: unknown): readonly string[] | null {
  if (typeof header !== 'string') return null;
  const tags = header
    .split(',')
    .map((tag) => tag.trim())
    .filter((tag) => tag !== '');
  return tags.length === 0 ? null : tags;
}

/**
 * Renders a public page for nobody in particular: without query, cookies or any header of the request that
 * asked for it, and on no connection, so that a reader who leaves does not end it for others.
 * @throws what the application throws; a page that takes longer than `timeoutMs` counts as failed
 */
export async function renderPublicPage(
  render: (req: IncomingMessage, res: ServerResponse) => Promise<void>,
  path: string,
  publicUrl: URL,
  timeoutMs: number,
): Promise<CapturedAnswer> {
  const req = anonymousRequest(path, publicUrl);
  const res = new CapturedResponse(req);
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => {
      reject(new Error(`The page took longer than ${String(timeoutMs)} ms.`));
    }, timeoutMs);
  });
  try {
    await Promise.race([Promise.all([render(req, res), res.done]), tooLate]);
  } finally {
    clearTimeout(timer);
    req.socket.destroy();
  }
  const tags = readTags(res.getHeader(PAGE_TAGS_HEADER));
  res.removeHeader(PAGE_TAGS_HEADER);
  return {
    status: res.statusCode,
    headers: res.getHeaderNames().map((name) => [name, res.getHeader(name) ?? ''] as const),
    body: res.body,
    tags,
  };
}
