/** Longer addresses are refused; Node's own parser ends the connection past 16 KiB. */
export const LONGEST_URL = 8 * 1024;

const ALLOWED_METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];

/** Sent with 405. */
export const ALLOW = ALLOWED_METHODS.join(', ');

/** The part of a request line that routing needs: a canonical path, and the query with its `?` or empty. */
export type RequestTarget = { readonly path: string; readonly query: string };

export type Refusal = { readonly status: number; readonly sentence: string };

const UNRESERVED = /[\w.~-]/;

/** RFC 3986's normal form: dot segments resolved, no escape that is not needed, escapes in capitals. */
function canonicalPath(path: string): string | null {
  try {
    const resolved = new URL(`http://host${path}`).pathname;
    if (!resolved.includes('%')) return resolved;
    decodeURIComponent(resolved);
    return resolved.replace(/%[\da-f]{2}/gi, (escape) => {
      const character = String.fromCharCode(parseInt(escape.slice(1), 16));
      return UNRESERVED.test(character) ? character : escape.toUpperCase();
    });
  } catch {
    return null;
  }
}

function refuse(status: number, sentence: string): Refusal {
  return { status, sentence };
}

/**
 * Checks the request line and takes it apart.
 * @param origin PUBLIC_URL's origin: a target in absolute form may name it
 */
export function readRequestTarget(
  method: string | undefined,
  url: string | undefined,
  origin: string,
): RequestTarget | Refusal {
  if (method === undefined || !ALLOWED_METHODS.includes(method)) {
    return method === 'TRACE' || method === 'CONNECT'
      ? refuse(405, 'This method is not allowed here.')
      : refuse(501, 'This method is not known here.');
  }
  if (url === undefined) return refuse(400, 'The address cannot be read.');
  if (url.length > LONGEST_URL) return refuse(414, 'The address is too long.');
  const target = url.startsWith(`${origin}/`) ? url.slice(origin.length) : url;
  if (!target.startsWith('/')) return refuse(400, 'The address cannot be read.');
  const mark = target.indexOf('?');
  const path = mark === -1 ? target : target.slice(0, mark);
  if (/%00|\0|#/.test(target)) return refuse(400, 'The address cannot be read.');
  const canonical = canonicalPath(path);
  if (canonical === null) return refuse(400, 'The address cannot be read.');
  return { path: canonical, query: mark === -1 ? '' : target.slice(mark) };
}
