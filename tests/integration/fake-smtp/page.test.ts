import { request } from 'node:http';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { openOutbox, type Outbox } from '../../support/outbox.ts';

let outbox: Outbox;

beforeEach(async () => {
  outbox = await openOutbox();
});

afterEach(async () => {
  await outbox.close();
});

const send = (to: string, rest = {}) =>
  createTransport({ url: outbox.smtpUrl }).sendMail({
    from: 'post@centrepop.test',
    to,
    subject: 'Episode 4 is out',
    text: 'Out now.',
    ...rest,
  });

/** The status of a request with headers that fetch would not let us set. */
function statusOf(
  method: string,
  path: string,
  headers: Record<string, string>,
): Promise<number | undefined> {
  return new Promise((resolve, reject) => {
    request(new URL(path, outbox.page), { method, headers }, (response) => {
      response.resume();
      resolve(response.statusCode);
    })
      .on('error', reject)
      .end();
  });
}

test('whoever waits for a message gets it when it comes', async () => {
  const waiting = outbox.messageTo('wren@maker.example');
  await send('jo@maker.example');
  await send('wren@maker.example');
  expect((await waiting).to).toEqual(['wren@maker.example']);
});

test('whoever waits in vain gets an empty list at the end', async () => {
  expect(await outbox.messages({ to: 'wren@maker.example', wait: '0.05' })).toEqual([]);
});

test('whoever waits is answered when the server closes', async () => {
  const waiting = fetch(`${outbox.page}/messages.json?wait=30`);
  // The list answers only after the waiting request was taken up: both use one event loop, in order.
  await outbox.messages();
  await outbox.stop();
  expect(await (await waiting).json()).toEqual({ messages: [] });
});

test('messages are listed newest first, by recipient and after another', async () => {
  await send('wren@maker.example', { subject: 'One' });
  await send('wren@maker.example', { subject: 'Two' });
  await send('jo@maker.example', { subject: 'Three' });
  const all = await outbox.messages();
  expect(all.map(({ subject }) => subject)).toEqual(['Three', 'Two', 'One']);
  const one = all[2]!;
  expect(await outbox.messages({ to: 'wren@maker.example', after: one.id })).toMatchObject([
    { subject: 'Two' },
  ]);
  expect(await outbox.messages({ after: all[0]!.receivedAt })).toMatchObject([{ subject: 'Three' }]);
  expect(await outbox.messages({ limit: '1' })).toHaveLength(1);
});

test('a message is shown as a person would see it, with nothing of it running', async () => {
  await send('wren@maker.example', {
    subject: '<script>alert(1)</script>',
    html: '<head></head><script>alert(2)</script><a href="https://press.example/confirm">Confirm</a>',
    text: 'Confirm: https://press.example/confirm.\n<script>alert(3)</script>',
  });
  const { id } = await outbox.messageTo('wren@maker.example');
  const page = await (await fetch(`${outbox.page}/messages/${id}`)).text();
  expect(page).not.toContain('<script');
  expect(page).toContain('<a href="https://press.example/confirm" target="_blank" rel="noreferrer">');
  expect(page).toMatch(/<iframe[^>]+sandbox="allow-popups allow-popups-to-escape-sandbox"/);
  const shown = await fetch(`${outbox.page}/messages/${id}/shown`);
  expect(shown.headers.get('content-security-policy')).toMatch(
    /^sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none';/,
  );
  expect(await shown.text()).toContain('<base target="_blank">');
  const raw = await fetch(`${outbox.page}/messages/${id}.eml`);
  expect(raw.headers.get('content-type')).toBe('message/rfc822');
  expect(await raw.text()).toContain('To: wren@maker.example');
});

test('the list says what it is when it is empty, and who is treated how', async () => {
  await outbox.tell({ recipient: 'jo@maker.example', answer: 'defer', times: 1 });
  const page = await (await fetch(outbox.page)).text();
  expect(page).toContain('No mail yet.');
  expect(page).toContain('Mail to jo@maker.example is put off until later, once more.');
});

test('a long list goes on over an older page', async () => {
  const transport = createTransport({ url: outbox.smtpUrl, pool: true, maxConnections: 10 });
  const letter = { from: 'post@centrepop.test', to: 'wren@maker.example', subject: 'x', text: 'x' };
  await Promise.all(Array.from({ length: 101 }, () => transport.sendMail(letter)));
  transport.close();
  const rows = async (address: string) => {
    const page = await (await fetch(outbox.page + address)).text();
    const [, older = ''] = /<a href="([^"]+)">Older mail/.exec(page) ?? [];
    return { count: page.match(/class="row"/g)?.length, older: older.replaceAll('&amp;', '&') };
  };
  const newest = await rows('/');
  expect(newest.count).toBe(100);
  expect(await rows(newest.older)).toEqual({ count: 1, older: '' });
});

test('deleting takes away every message, by request and by the button', async () => {
  for (const [method, path, status] of [
    ['DELETE', '/messages', 204],
    ['POST', '/messages/delete', 303],
  ] as const) {
    await send('wren@maker.example');
    const { id } = await outbox.messageTo('wren@maker.example');
    expect(await statusOf(method, path, { Origin: outbox.page })).toBe(status);
    expect(await outbox.messages()).toEqual([]);
    expect(await statusOf('GET', `/messages/${id}`, {})).toBe(404);
  }
});

test('a foreign name for this machine is not answered', async () => {
  expect(await statusOf('GET', '/', { Host: 'outbox.example' })).toBe(421);
  expect(await statusOf('GET', '/', { Host: 'localhost.example:80' })).toBe(421);
  expect(await statusOf('GET', '/', { Host: 'localhost:4000' })).toBe(200);
});

test("another site's page changes nothing", async () => {
  for (const origin of ['https://other.example', 'null', 'http://127.0.0.1:1']) {
    for (const [method, path] of [
      ['DELETE', '/messages'],
      ['POST', '/messages/delete'],
      ['PUT', '/behaviour'],
      ['DELETE', '/behaviour'],
    ] as const) {
      expect(await statusOf(method, path, { Origin: origin })).toBe(403);
    }
  }
});
