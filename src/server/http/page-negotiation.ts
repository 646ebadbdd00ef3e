/** The forms in which a page is kept. */
export type PageEncoding = 'br' | 'gzip' | 'identity';

/** Best first: ties in a client's preference go to the smaller form. */
const PREFERENCE: readonly PageEncoding[] = ['br', 'gzip', 'identity'];

/** Browsers send a handful of headers in all; the limit only bounds what others may send. */
const REMEMBERED_HEADERS = 200;
const remembered = new Map<string, PageEncoding>();

function negotiate(header: string): PageEncoding {
  const wishes = new Map<string, number>();
  for (const item of header.toLowerCase().split(',')) {
    const [name = '', ...parameters] = item.split(';').map((part) => part.trim());
    const q = parameters.find((parameter) => parameter.startsWith('q='));
    wishes.set(name, q === undefined ? 1 : Number(q.slice(2)) || 0);
  }
  // Identity is acceptable without being named, but only when nothing better is.
  const wish = (form: PageEncoding) =>
    wishes.get(form) ?? wishes.get('*') ?? (form === 'identity' ? 0.001 : 0);
  let best: PageEncoding = 'identity';
  for (const form of [...PREFERENCE].reverse()) {
    if (wish(form) > 0 && wish(form) >= wish(best)) best = form;
  }
  return best;
}

/**
 * The form that suits a client best.
 * @param header the value of Accept-Encoding
 */
export function choosePageEncoding(header: string | undefined): PageEncoding {
  if (header === undefined || header === '') return 'identity';
  const known = remembered.get(header);
  if (known !== undefined) return known;
  const form = negotiate(header);
  if (remembered.size < REMEMBERED_HEADERS) remembered.set(header, form);
  return form;
}

/**
 * Whether If-None-Match names this ETag, by the weak comparison that it asks for.
 * @param header the value of If-None-Match
 * @param etag the ETag with its quotes
 */
export function matchesEtag(header: string | undefined, etag: string): boolean {
  if (header === undefined) return false;
  if (header === etag) return true;
  return header.split(',').some((item) => {
    const candidate = item.trim();
    return (
      candidate === '*' || candidate === etag || (candidate.startsWith('W/') && candidate.slice(2) === etag)
    );
  });
}
