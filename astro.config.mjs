import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'astro/config';

/** Astro hashes the scripts that it bundles, not those that stand in the page as they are. */
const unitsScript = readFileSync(new URL('src/client/units-before-paint.js', import.meta.url));
const unitsHash = /** @type {const} */ (
  `sha256-${createHash('sha256').update(unitsScript).digest('base64')}`
);

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'middleware' }),
  integrations: [react()],
  devToolbar: { enabled: false },
  trailingSlash: 'never',
  security: {
    // apiRoute compares Origin with PUBLIC_URL for every body, JSON included.
    checkOrigin: false,
    // The front server has checked Host and overwritten x-forwarded-* before a request comes here.
    allowedDomains: [{}],
  },
  experimental: {
    // Hashes only, sent as a header; the middleware adds what is known at run time.
    csp: {
      directives: [
        "default-src 'self'",
        "object-src 'none'",
        "base-uri 'none'",
        "form-action 'self'",
        "frame-ancestors 'none'",
        "img-src 'self' data:",
        "font-src 'self'",
      ],
      scriptDirective: { hashes: [unitsHash] },
    },
  },
  vite: {
    plugins: [tailwindcss()],
    ssr: { noExternal: ['zod'] },
  },
});
