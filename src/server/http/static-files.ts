import { type IncomingMessage, type ServerResponse } from 'node:http';
import { type Readable } from 'node:stream';
import sirv from 'sirv';

/** Files whose name carries a hash of their bytes; a name never changes its meaning. */
export const HASHED_FOLDER = '/_astro/';

const IMMUTABLE = 'public, max-age=31536000, immutable';
const SHORT = 'public, max-age=300';

export type StaticFiles = (req: IncomingMessage, res: ServerResponse, next: () => void) => void;

/**
 * Serves the files of the built client folder, in their precompressed form where there is one. The folder is
 * listed once: files that come later are not seen.
 * @throws when the folder is not there
 */
export function serveStaticFiles(clientDir: string): StaticFiles {
  const serve = sirv(clientDir, {
    etag: true,
    gzip: true,
    brotli: true,
    extensions: [],
    setHeaders: (res, pathname) => {
      res.setHeader('Cache-Control', pathname.startsWith(HASHED_FOLDER) ? IMMUTABLE : SHORT);
    },
  });
  return (req, res, next) => {
    if (req.method !== 'GET' && req.method !== 'HEAD') {
      next();
      return;
    }
    closeFileWithResponse(res);
    // Whole files only: they are small, and a range out of order would throw.
    const { range } = req.headers;
    delete req.headers.range;
    serve(req, res, () => {
      if (range !== undefined) req.headers.range = range;
      next();
    });
  };
}

/** A piped file stays open when the client leaves in the middle, and its error would end the process. */
function closeFileWithResponse(res: ServerResponse): void {
  res.once('pipe', (file: Readable) => {
    res.once('close', () => file.destroy());
    file.once('error', () => res.destroy());
  });
}
