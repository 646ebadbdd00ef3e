import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'astro/config';

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
  vite: {
    plugins: [tailwindcss()],
    ssr: { noExternal: ['zod'] },
  },
});
