// npm start: sets everything up and runs the product.
import { ROOT, setUp } from './setup.mjs';
import { runScript } from './trouble.mjs';

await runScript(async () => {
  const alone = process.env['ROLE'] === 'web' || process.env['ROLE'] === 'worker';
  const ownDatabase = !alone && !process.env['DATABASE_URL'];
  const needsMedia = process.env['ROLE'] !== 'web';
  await setUp({
    debian: [
      ...(ownDatabase ? /** @type {const} */ (['postgresql-15']) : []),
      ...(needsMedia ? /** @type {const} */ (['ffmpeg', 'libheif-examples']) : []),
    ],
    build: 'when-changed',
  });
  const { register } = await import('tsx/esm/api');
  register();
  const { supervise } = await import('./supervise.ts');
  return supervise({ root: ROOT, mode: 'built', durable: !process.argv.includes('--throwaway') });
});
