// npm run dev: everything as npm start, with the pages and the worker from the sources.
import { ROOT, setUp } from './setup.mjs';
import { runScript } from './trouble.mjs';

await runScript(async () => {
  await setUp({ debian: ['postgresql-15', 'ffmpeg', 'libheif-examples'] });
  const { register } = await import('tsx/esm/api');
  register();
  const { supervise } = await import('./supervise.ts');
  return supervise({ root: ROOT, mode: 'sources' });
});
