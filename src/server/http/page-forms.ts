import { createHash } from 'node:crypto';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';
import { type PageEncoding } from './page-negotiation.ts';
import { type CapturedAnswer } from './page-render.ts';
import { FALLBACK_POLICY, type HeaderPair } from './security-headers.ts';

/** One form of a page, with its headers as `writeHead` takes them: name, value, name, value. */
export type PageForm = {
  readonly etag: string;
  readonly body: Buffer;
  readonly head: readonly string[];
  readonly notModifiedHead: readonly string[];
  /** The same as they go on the wire, status line first, without the empty line at the end. */
  readonly headText: string;
  readonly notModifiedText: string;
};

/** A page as it is kept: every form, made once. */
export type KeptPage = Readonly<Record<PageEncoding, PageForm>>;

/** Set here or by Node, whatever the application said. */
const OWN_HEADERS = new Set([
  'cache-control',
  'connection',
  'content-encoding',
  'content-length',
  'date',
  'etag',
  'keep-alive',
  'last-modified',
  'server',
  'transfer-encoding',
  'vary',
  'x-powered-by',
  'x-request-id',
]);

/** Fast enough to do while a reader waits, and close to what the slow qualities reach on HTML. */
const BROTLI_QUALITY = 5;

const compress = {
  br: promisify(brotliCompress),
  gzip: promisify(gzip),
};

async function encode(body: Buffer, encoding: PageEncoding): Promise<Buffer> {
  if (encoding === 'identity') return body;
  if (encoding === 'gzip') return compress.gzip(body);
  return compress.br(body, {
    params: {
      [constants.BROTLI_PARAM_QUALITY]: BROTLI_QUALITY,
      [constants.BROTLI_PARAM_SIZE_HINT]: body.length,
    },
  });
}

/** The headers that all forms of a page share: the application's, then ours where it set none. */
function sharedHead(answer: CapturedAnswer, everyAnswer: readonly HeaderPair[]): string[] {
  const given = answer.headers.filter(([name]) => !OWN_HEADERS.has(name.toLowerCase()));
  const names = new Set(given.map(([name]) => name.toLowerCase()));
  const policy: HeaderPair = ['Content-Security-Policy', FALLBACK_POLICY];
  const added = [...everyAnswer, policy].filter(([name]) => !names.has(name.toLowerCase()));
  return [
    ...given.flatMap(([name, value]) =>
      (Array.isArray(value) ? value : [value]).flatMap((one) => [name, String(one)]),
    ),
    ...added.flat(),
  ];
}

/** Makes one form of a page. */
export async function makePageForm(
  answer: CapturedAnswer,
  encoding: PageEncoding,
  everyAnswer: readonly HeaderPair[],
): Promise<PageForm> {
  const hash = createHash('sha256').update(answer.body).digest('base64url').slice(0, 22);
  const etag = encoding === 'identity' ? `"${hash}"` : `"${hash}-${encoding}"`;
  const body = await encode(answer.body, encoding);
  const freshness = ['Cache-Control', 'public, no-cache', 'Vary', 'Accept-Encoding', 'ETag', etag];
  const head = [
    ...sharedHead(answer, everyAnswer),
    ...freshness,
    ...(encoding === 'identity' ? [] : ['Content-Encoding', encoding]),
    'Content-Length',
    String(body.length),
  ];
  // The browser keeps the page's own headers with the page; a 304 repeats only what concerns the keeping.
  const notModifiedHead = [...freshness, ...everyAnswer.flat()];
  return {
    etag,
    body,
    head,
    notModifiedHead,
    headText: `HTTP/1.1 200 OK\r\n${headerLines(head)}`,
    notModifiedText: `HTTP/1.1 304 Not Modified\r\n${headerLines(notModifiedHead)}`,
  };
}

/** Names and values have been looked over by Node when they were set. */
function headerLines(flat: readonly string[]): string {
  return flat.map((text, at) => (at % 2 === 0 ? `${text}: ` : `${text}\r\n`)).join('');
}

/** The bytes that keeping a page costs, its headers counted roughly. */
export function keptSize(page: KeptPage): number {
  return [page.identity, page.gzip, page.br].reduce(
    (sum, form) => sum + form.body.length + 2 * (form.headText.length + form.notModifiedText.length),
    1_000,
  );
}
