import { fileURLToPath } from 'node:url';
import { isPublicPage, takesLists } from './paths.ts';
import { liveUntilStopped, startProcess } from './process-life.ts';
import { openProcessServices } from './process-services.ts';
import { readServiceSettings } from './server/env.ts';
import { DEFAULT_BODY_LIMIT, LIST_BODY_LIMIT } from './server/http/body-limit.ts';
import { type FrontServerOptions } from './server/http/front-options.ts';
import { startFrontServer } from './server/http/front-server.ts';
import { listenForPageChanges } from './server/http/page-changes.ts';

await startProcess(async () => {
  const settings = readServiceSettings();
  const services = await openProcessServices(settings, 'web');
  const changes = await listenForPageChanges({ connectionString: settings.DATABASE_URL, log: services.log });
  // Built beside this bundle by `astro build`; unknown to the compiler.
  const entry = new URL('./server/entry.mjs', import.meta.url).href;
  const { handler } = (await import(entry)) as { handler: FrontServerOptions['render'] };
  const front = await startFrontServer({
    host: settings.HOST,
    port: settings.PORT,
    publicUrl: settings.PUBLIC_URL,
    trustedProxies: settings.TRUSTED_PROXIES,
    clientDir: fileURLToPath(new URL('./client', import.meta.url)),
    render: handler,
    changes,
    isHealthy: () => services.isHealthy(),
    isPublicPage,
    bodyLimit: (path) => (takesLists(path) ? LIST_BODY_LIMIT : DEFAULT_BODY_LIMIT),
    log: services.log,
    locals: () => ({ services }),
  });
  liveUntilStopped({ port: front.port }, async () => {
    await front.close();
    await changes.close();
    await services.close();
  });
});
