// npm run centrepop-admin -- …: the administrator's commands, on DATABASE_URL or this copy's own database.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { ROOT, setUp } from './setup.mjs';
import { runScript } from './trouble.mjs';

await runScript(async () => {
  await setUp({ debian: process.env['DATABASE_URL'] ? [] : ['postgresql-15'] });
  const { register } = await import('tsx/esm/api');
  register();
  const { withDatabase } = await import('./with-database.ts');
  return withDatabase(ROOT, async (environment) => {
    const args = ['--import', 'tsx', 'src/server/admin/main.ts', ...process.argv.slice(2)];
    const child = spawn(process.execPath, args, { cwd: ROOT, env: environment, stdio: 'inherit' });
    const [status] = await once(child, 'exit');
    return Number(status ?? 1);
  });
});
