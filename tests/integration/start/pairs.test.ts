import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { request } from 'node:http';
import { text } from 'node:stream/consumers';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { findFreePort } from '../../../scripts/ports.ts';
import { changeSettings } from '../../../src/features/workshops/server/change-settings.ts';
import { getSettings } from '../../../src/features/workshops/server/get-settings.ts';
import { ChangeSettingsInput } from '../../../src/features/workshops/workshop.ts';
import { paths } from '../../../src/paths.ts';
import { newAddress, openProduct, type Owner, type Product } from '../../support/e2e/product.ts';
import { outboxAt } from '../../support/outbox.ts';
import { contextFor } from '../../support/people.ts';
import { ROOT, type StartedProduct, startProduct } from '../../support/started-product.ts';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('pairs');
// As the start scripts set it: the SDK announces on stderr that it will want a newer Node one day.
process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';

let copy: StartedProduct;
let product: Product;
let owner: Owner;
/** Of the copy's own web server and of the second one. */
let ports: number[];
const seconds: ChildProcess[] = [];

/** Starts one more process beside those of the copy, as ROLE=web or ROLE=worker does on another machine. */
async function startSecond(program: 'web' | 'worker', settings: Record<string, string> = {}) {
  const child = spawn(process.execPath, [`dist/${program}.mjs`], {
    cwd: ROOT,
    env: { ...process.env, ...copy.environment, ...settings, ROLE: program },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  seconds.push(child);
  await once(child, 'message');
}

/** A page of one of the web servers, which all know themselves by the copy's one public address. */
async function ask(port: number, path: string): Promise<string> {
  const host = new URL(copy.environment['PUBLIC_URL'] ?? '').host;
  const asking = request({ port, path, host: '127.0.0.1', headers: { host } }).end();
  const [answer] = (await once(asking, 'response')) as [NodeJS.ReadableStream];
  return text(answer);
}

beforeAll(async () => {
  const port = await findFreePort();
  copy = await startProduct({ PORT: String(port), DATA_DIR: folder.path, DEMO: '0', LOG_LEVEL: 'warn' });
  const another = await findFreePort();
  await Promise.all([startSecond('web', { PORT: String(another) }), startSecond('worker')]);
  ports = [port, another];
  product = await openProduct(copy.environment);
  owner = await product.owner('Hollin Crewe', 'Two of each');
});

afterAll(async () => {
  // None of these is there when the copy did not start.
  await (product as Product | undefined)?.services.close();
  for (const child of seconds) child.kill('SIGTERM');
  await Promise.all(seconds.map((child) => child.exitCode ?? once(child, 'close')));
  await (copy as StartedProduct | undefined)?.stop();
  folder.remove();
});

test('a change is seen at both web servers, which had kept the page', async () => {
  const page = paths.workshop(owner.workshop);
  const both = () => Promise.all(ports.map((port) => ask(port, page)));
  const named = async (name: string) => (await both()).every((html) => html.includes(`>${name}</h1>`));
  for (const html of await both()) expect(html).toContain('Two of each');
  for (const name of ['Two of everything', 'Two and no more']) {
    const context = await contextFor(product.services, owner, owner.workshop);
    await changeSettings(context, ChangeSettingsInput.parse({ ...(await getSettings(context, {})), name }));
    // That it takes less than a second is for the test of page changes, on a page that costs nothing to render.
    await vi.waitUntil(() => named(name), { timeout: 10_000, interval: 50 });
  }
});

test('two workers send each mail once', async () => {
  const { OUTBOX_URL = '' } = copy.environment;
  const invited = Array.from({ length: 20 }, (_, index) => newAddress(`guest ${String(index)}`));
  await Promise.all(invited.map((email) => product.invite(owner, email, 'editor')));
  const outbox = outboxAt(OUTBOX_URL);
  for (const email of invited) await outbox.messageTo(email);
  // A second worker would have sent its own by the time that the last mail is there.
  for (const email of invited) expect(await outbox.messages({ to: email })).toHaveLength(1);
});

test('two whole copies on one machine know nothing of each other', async () => {
  const other = throwawayFolder('other-copy');
  const port = await findFreePort();
  const second = await startProduct({
    PORT: String(port),
    DATA_DIR: other.path,
    DEMO: '0',
    LOG_LEVEL: 'warn',
  });
  try {
    for (const name of ['DATABASE_URL', 'S3_ENDPOINT', 'OUTBOX_URL', 'AUTH_SECRET', 'INSTALLATION_ID'])
      expect(second.environment[name]).not.toBe(copy.environment[name]);
    const page = paths.workshop(owner.workshop);
    expect(await ask(ports[0] ?? 0, page)).toContain('Two and no more');
    const there = await fetch(new URL(page, second.environment['PUBLIC_URL']));
    expect(there.status).toBe(404);
    // A browser sends both copies the cookies of 127.0.0.1, whatever the port.
    const cookie = product.cookiesOf(owner).join('; ');
    const me = (at: StartedProduct) =>
      fetch(new URL('/api/me', at.environment['PUBLIC_URL']), { headers: { cookie } }).then((answer) =>
        answer.text(),
      );
    expect(await me(copy)).toContain(owner.name);
    expect(await me(second)).not.toContain(owner.name);
  } finally {
    await second.stop();
    other.remove();
  }
});
