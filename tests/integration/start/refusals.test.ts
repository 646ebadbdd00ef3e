import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createServer, type AddressInfo } from 'node:net';
import { afterAll, expect, test } from 'vitest';
import { ROOT } from '../../support/started-product.ts';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('refusals');
afterAll(folder.remove);

/** Runs only the part of npm start that comes after set-up. */
async function supervise(settings: Record<string, string>): Promise<{ status: number; printed: string }> {
  const script = `
    import { runScript } from '${ROOT}/scripts/trouble.mjs';
    import { supervise } from '${ROOT}/scripts/supervise.ts';
    await runScript(() => supervise({ root: '${ROOT}', mode: 'built', durable: false }));`;
  const child = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '--eval', script], {
    cwd: ROOT,
    env: { PATH: process.env['PATH'], DATA_DIR: folder.path, ...settings },
  });
  let printed = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (chunk: string) => (printed += chunk));
  }
  const [status] = (await once(child, 'close')) as [number];
  return { status, printed: printed.trim() };
}

test('a port in use is said in one sentence with a way on', async () => {
  const stranger = createServer().listen(0, '127.0.0.1');
  await once(stranger, 'listening');
  const { port } = stranger.address() as AddressInfo;
  const { status, printed } = await supervise({ PORT: String(port) });
  stranger.close();
  expect(printed).toBe(
    `Port ${String(port)} is in use. Stop what uses it, or start with another: PORT=${String(port + 1)} npm start`,
  );
  expect(status).toBe(1);
});

test('a host that is not of this machine is said in one sentence', async () => {
  const { status, printed } = await supervise({
    HOST: '192.0.2.1',
    PUBLIC_URL: 'https://diary.example',
    SMTP_URL: 'smtp://mail.example',
    MAIL_FROM: 'diary@workshop.example',
    S3_ENDPOINT: 'https://files.example',
    S3_ACCESS_KEY_ID: 'key',
    S3_SECRET_ACCESS_KEY: 'secret',
  });
  expect(printed).toBe(
    'HOST is 192.0.2.1, which is not an address of this machine (EADDRNOTAVAIL). Set HOST to one that is.',
  );
  expect(status).toBe(1);
});

test('settings that do not go together are all named, without a stack', async () => {
  const { status, printed } = await supervise({ HOST: '0.0.0.0', PORT: 'x' });
  expect(printed).toMatch(/^The settings cannot be used:\n {2}- PORT/);
  expect(printed).not.toContain(' at ');
  expect(status).toBe(1);
});
