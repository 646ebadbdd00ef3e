import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { findFreePort } from '../../../scripts/ports.ts';
import { childrenOf, PROGRAMS } from '../../support/child-processes.ts';
import { type StartedProduct, startProduct } from '../../support/started-product.ts';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('whole-copy');
let product: StartedProduct;

async function start(): Promise<StartedProduct> {
  return startProduct({
    PORT: String(await findFreePort()),
    DATA_DIR: folder.path,
    DEMO: '0',
    LOG_LEVEL: 'error',
  });
}

beforeAll(async () => {
  product = await start();
});
afterAll(async () => {
  // Not there when it did not start.
  await (product as StartedProduct | undefined)?.stop();
  folder.remove();
});

async function answers(): Promise<boolean> {
  const { PUBLIC_URL = '' } = product.environment;
  return fetch(`${PUBLIC_URL}/healthz`).then(
    ({ ok }) => ok,
    () => false,
  );
}

/** Whether a process still runs; one that has ended and waits to be noticed has no command line. */
function runs(pid: number): boolean {
  try {
    return readFileSync(`/proc/${String(pid)}/cmdline`, 'utf8') !== '';
  } catch {
    return false;
  }
}

test('it serves and names its address and its outbox', async () => {
  expect(await answers()).toBe(true);
  expect(product.printed()).toContain(`Centrepop is running: ${String(product.environment['PUBLIC_URL'])}`);
  expect(product.printed()).toContain(String(product.environment['OUTBOX_URL']));
});

test.each(Object.entries(PROGRAMS))(
  'a killed part is reported by name and started again: %s',
  async (name, program) => {
    const [part] = childrenOf(product.process.pid).filter(({ command }) => command.includes(program));
    process.kill(part!.pid, 'SIGKILL');
    await vi.waitFor(
      async () => {
        expect(product.printed()).toContain(`${name} was ended by SIGKILL; starting it again.`);
        expect(product.printed()).toContain(`${name} is running again.`);
        expect(await answers()).toBe(true);
      },
      { timeout: 25_000, interval: 100 },
    );
  },
);

// A whole second start fits into it, however busy the machine is.
test(
  'when it is killed itself nothing is left running and the next start finds its data',
  { timeout: 120_000 },
  async () => {
    const parts = childrenOf(product.process.pid).filter(({ command }) => !command.includes('esbuild'));
    expect(parts.length).toBeGreaterThanOrEqual(5);
    product.process.kill('SIGKILL');
    await vi.waitFor(
      () => {
        expect(parts.filter(({ pid }) => runs(pid))).toEqual([]);
      },
      { timeout: 20_000, interval: 100 },
    );
    const before = product.environment;
    product = await start();
    expect(await answers()).toBe(true);
    for (const name of ['AUTH_SECRET', 'INSTALLATION_ID', 'S3_ENDPOINT', 'OUTBOX_URL'] as const) {
      expect(product.environment[name]).toBe(before[name]);
    }
  },
);

test('SIGTERM ends all of it with status 0', async () => {
  const parts = childrenOf(product.process.pid);
  await product.stop();
  expect(product.process.exitCode).toBe(0);
  expect(parts.filter(({ pid }) => runs(pid))).toEqual([]);
});
