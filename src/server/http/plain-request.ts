/** A request so plain that nothing in it can be read in two ways. */
export type PlainRequest = {
  /** Without the query. */
  readonly path: string;
  readonly host: string;
  readonly acceptEncoding: string | undefined;
  readonly ifNoneMatch: string | undefined;
};

/** One whole GET of HTTP/1.1: names are tokens, each line ends with CRLF, none is folded or holds controls. */
const WHOLE_GET =
  // eslint-disable-next-line no-control-regex -- controls are what it must not let through
  /^GET \/[!-~]* HTTP\/1\.1\r\n(?:[\w!#$%&'*+.^`|~-]+:[^\x00-\x08\x0a-\x1f\x7f]*\r\n)+\r\n$/;

/** Longer ones may be too long altogether, which is not for here to say. */
const LONGEST = 8 * 1024;

/** The headers that change how a request is to be read; with one of them it is not plain. */
const NOT_PLAIN: readonly string[] = [
  'te',
  'expect',
  'upgrade',
  'trailer',
  'content-length',
  'transfer-encoding',
  'proxy-connection',
];
const NOT_PLAIN_LENGTHS = new Set(NOT_PLAIN.map((name) => name.length));

/**
 * Reads a request in its bytes, when it is a whole GET without anything that asks for judgement: no body, no
 * header twice that counts here, nothing but keeping the connection open.
 * @param text the bytes read, as latin1
 * @returns null for everything else, to be left to Node's parser
 */
export function readPlainRequest(text: string): PlainRequest | null {
  if (text.length > LONGEST || !WHOLE_GET.test(text)) return null;
  let host: string | undefined;
  let acceptEncoding: string | undefined;
  let ifNoneMatch: string | undefined;
  const firstLine = text.indexOf('\r\n');
  for (let at = firstLine + 2; at < text.length - 2;) {
    const end = text.indexOf('\r\n', at);
    const colon = text.indexOf(':', at);
    const length = colon - at;
    // The length tells most headers apart before their letters are looked at.
    if (length === 4 || length === 10 || length === 13 || length === 15 || NOT_PLAIN_LENGTHS.has(length)) {
      const name = text.slice(at, colon).toLowerCase();
      const value = text.slice(colon + 1, end).trim();
      if (name === 'host') {
        if (host !== undefined) return null;
        host = value;
      } else if (name === 'accept-encoding') {
        if (acceptEncoding !== undefined) return null;
        acceptEncoding = value;
      } else if (name === 'if-none-match') {
        if (ifNoneMatch !== undefined) return null;
        ifNoneMatch = value;
      } else if (name === 'connection') {
        if (value.toLowerCase() !== 'keep-alive') return null;
      } else if (NOT_PLAIN.includes(name)) {
        return null;
      }
    }
    at = end + 2;
  }
  if (host === undefined) return null;
  const target = text.slice(4, firstLine - ' HTTP/1.1'.length);
  const mark = target.indexOf('?');
  return { path: mark === -1 ? target : target.slice(0, mark), host, acceptEncoding, ifNoneMatch };
}
