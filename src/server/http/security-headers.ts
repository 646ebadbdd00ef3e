import { IncomingMessage, ServerResponse } from 'node:http';
import { Socket } from 'node:net';
import helmet from 'helmet';

export type HeaderPair = readonly [name: string, value: string];

const YEAR_IN_SECONDS = 365 * 24 * 60 * 60;

/** For answers without a policy of their own: nothing loads and nobody frames it. Pages bring Astro's. */
export const FALLBACK_POLICY = "default-src 'none'; frame-ancestors 'none'";

/**
 * The headers that every answer carries unless it sets them itself, ready to be written.
 * @param publicUrl PUBLIC_URL; HSTS is sent exactly when it is https
 */
export function securityHeaders(publicUrl: string): HeaderPair[] {
  const scratch = new ServerResponse(new IncomingMessage(new Socket()));
  const middleware = helmet({
    contentSecurityPolicy: false,
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
    strictTransportSecurity: publicUrl.startsWith('https:')
      ? { maxAge: YEAR_IN_SECONDS, includeSubDomains: false }
      : false,
    // Both speak to browsers that no longer exist.
    xDownloadOptions: false,
    xXssProtection: false,
  });
  middleware(scratch.req, scratch, () => undefined);
  scratch.setHeader('Permissions-Policy', 'camera=(), microphone=(), geolocation=()');
  return scratch.getHeaderNames().map((name): HeaderPair => [name, String(scratch.getHeader(name))]);
}
