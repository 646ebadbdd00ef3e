import { readdir } from 'node:fs/promises';
import { describeApi, type Endpoint } from '../src/server/http/describe-api.ts';
import { type RuledRoute } from '../src/server/http/api-route.ts';

const PAGES = new URL('../src/pages/', import.meta.url);

/** Every endpoint below src/pages/api, in the order of their paths. */
export async function listEndpoints(): Promise<Endpoint[]> {
  const files = (await readdir(new URL('api/', PAGES), { recursive: true })).filter((file) =>
    file.endsWith('.ts'),
  );
  const found = await Promise.all(
    files.sort().map(async (file) => {
      const address = new URL(`api/${file.replaceAll('[', '%5B').replaceAll(']', '%5D')}`, PAGES);
      const exported = (await import(/* @vite-ignore */ address.href)) as Record<string, RuledRoute>;
      const path = `/api/${file.replace(/(\/index)?\.ts$/, '')}`;
      return Object.entries(exported).map(([method, { route }]) => ({ path, method, route }));
    }),
  );
  return found.flat();
}

// Run as a program, not loaded by a test.
if (process.argv[1]?.endsWith('openapi.ts') === true) {
  const server = process.env['PUBLIC_URL'] ?? 'http://127.0.0.1:4321';
  console.log(JSON.stringify(describeApi(await listEndpoints(), server), null, 2));
}
