import { Readable } from 'node:stream';
import { attachment, type ByteRange } from '../storage/storage-objects.ts';
import { type Storage } from '../storage/storage.ts';

/** Something kept that whoever asks may have. */
export interface Media {
  readonly key: string;
  /** The same exactly as long as the bytes are. */
  readonly tag: string;
  readonly contentType: string;
  readonly bytes: number;
  readonly isPublic: boolean;
  /** Streamed from here, streamed to be saved, or fetched from the storage itself. */
  readonly way: 'streamed' | 'attached' | 'elsewhere';
  /** The person's own name for it, for what is saved. */
  readonly saveAs: string | null;
}

/** Where a video lies now is asked again after this; the address itself holds for 11 hours at least. */
const REDIRECT_SECONDS = 300;

/**
 * Answers a request for something kept: images and documents as they come from the storage, in ranges too; what
 * is long by a signed address there. HEAD is answered from what is known.
 */
export async function answerMedia(
  request: Request,
  media: Media,
  storage: Storage,
  now: Date,
): Promise<Response> {
  const headers = headersOf(media);
  if (request.method === 'HEAD') {
    headers.set('content-length', String(media.bytes));
    return new Response(null, { headers });
  }
  if (media.way === 'elsewhere') {
    const saveAs = media.saveAs ?? undefined;
    const location = await storage.signRead(media.key, media.contentType, now, saveAs);
    const keep = media.isPublic ? `public, max-age=${String(REDIRECT_SECONDS)}` : 'private, no-store';
    return new Response(null, { status: 302, headers: { location, 'cache-control': keep } });
  }
  const tag = headers.get('etag') ?? '';
  if (
    request.headers
      .get('if-none-match')
      ?.split(/\s*,\s*/)
      .some((one) => one.replace(/^W\//, '') === tag)
  ) {
    return new Response(null, { status: 304, headers });
  }
  const condition = request.headers.get('if-range');
  const asked = condition === null || condition === tag ? request.headers.get('range') : null;
  const range = readRange(asked, media.bytes);
  if (range === 'unsatisfiable') {
    headers.set('content-range', `bytes */${String(media.bytes)}`);
    return new Response(null, { status: 416, headers });
  }
  return stream(request, media, storage, headers, range);
}

async function stream(
  request: Request,
  media: Media,
  storage: Storage,
  headers: Headers,
  range: ByteRange | null,
): Promise<Response> {
  const body = await storage.read(media.key, range ?? undefined, request.signal);
  const { first, last } = range ?? { first: 0, last: media.bytes - 1 };
  headers.set('content-length', String(last - first + 1));
  if (range !== null)
    headers.set('content-range', `bytes ${String(first)}-${String(last)}/${String(media.bytes)}`);
  return new Response(Readable.toWeb(body) as ReadableStream, {
    status: range === null ? 200 : 206,
    headers,
  });
}

function headersOf(media: Media): Headers {
  const headers = new Headers({
    'content-type': media.contentType,
    'accept-ranges': 'bytes',
    etag: `"${media.tag}"`,
    'x-content-type-options': 'nosniff',
    'content-security-policy': "default-src 'none'; sandbox",
    'cache-control': media.isPublic ? 'public, max-age=31536000, immutable' : 'private, no-store',
  });
  if (media.saveAs !== null) headers.set('content-disposition', attachment(media.saveAs));
  return headers;
}

/**
 * One range of a Range header (RFC 9110, section 14). Several at once, or what is no range, gives the whole, as the
 * standard allows.
 */
export function readRange(header: string | null, bytes: number): ByteRange | 'unsatisfiable' | null {
  const [, from = '', to = ''] = /^bytes=(\d*)-(\d*)$/.exec(header ?? '') ?? [];
  if (from === '' && to === '') return null;
  if (from === '') {
    const length = Math.min(Number(to), bytes);
    return length === 0 ? 'unsatisfiable' : { first: bytes - length, last: bytes - 1 };
  }
  const first = Number(from);
  const last = to === '' ? bytes - 1 : Math.min(Number(to), bytes - 1);
  if (to !== '' && Number(to) < first) return null;
  return first >= bytes ? 'unsatisfiable' : { first, last };
}
