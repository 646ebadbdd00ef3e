// npm run build: the pages and the processes into dist/, from scratch.
import { setUp } from './setup.mjs';
import { runScript } from './trouble.mjs';

await runScript(async () => {
  await setUp({ build: 'always' });
  return 0;
});
