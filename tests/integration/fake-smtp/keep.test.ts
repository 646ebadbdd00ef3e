import { readdir, readFile, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { startFakeSmtp } from '../../../fake-smtp/start.ts';
import { openOutbox, type Outbox } from '../../support/outbox.ts';
import { throwawayFolder } from '../../support/throwaway.ts';
import { converse, converseToData } from './conversation.ts';

let outbox: Outbox;

beforeEach(async () => {
  outbox = await openOutbox();
});

afterEach(async () => {
  await outbox.close();
});

const letter = {
  from: 'Marram Lane <post@centrepop.test>',
  to: 'wren@maker.example',
  subject: 'Episode 4 is out',
  text: 'See https://press.example/e/4.',
  html: '<a href="https://press.example/e/4">Episode 4</a> <a href="https://press.example/leave?a=1&amp;b=2">leave</a>',
};

test('a message is kept as it came, its envelope beside it, under a name that sorts by time', async () => {
  const transport = createTransport({ url: outbox.smtpUrl });
  await transport.sendMail({
    ...letter,
    envelope: { from: 'back@centrepop.test', to: ['wren@maker.example'] },
  });
  await transport.sendMail({ ...letter, subject: 'Episode 5 is out' });
  const names = (await readdir(outbox.folder)).sort();
  expect(names).toHaveLength(4);
  for (const name of names) {
    expect(name).toMatch(/^\d{8}T\d{9}Z-[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[0-9a-f-]{17}\.(eml|json)$/);
  }
  expect(await readFile(path.join(outbox.folder, names[0]!), 'utf8')).toContain('Subject: Episode 4 is out');
  expect(JSON.parse(await readFile(path.join(outbox.folder, names[1]!), 'utf8'))).toEqual({
    from: 'back@centrepop.test',
    to: ['wren@maker.example'],
  });
});

test('a message is read as a person would see it', async () => {
  await createTransport({ url: outbox.smtpUrl }).sendMail({
    ...letter,
    headers: { 'List-Id': '<press.centrepop.test>' },
    attachments: [{ filename: 'parts.csv', content: 'number,name\n118,Bearing housing\n' }],
  });
  const message = await outbox.messageTo('WREN@maker.example');
  expect(message).toMatchObject({
    to: ['wren@maker.example'],
    from: '"Marram Lane" <post@centrepop.test>',
    subject: 'Episode 4 is out',
    links: ['https://press.example/e/4', 'https://press.example/leave?a=1&b=2'],
    attachments: [{ name: 'parts.csv', type: 'text/csv', bytes: 32 }],
  });
  expect(message.headers['list-id']).toEqual(['<press.centrepop.test>']);
  expect(message.text.trim()).toBe('See https://press.example/e/4.');
});

test.each([['PLAIN'], ['LOGIN'], ['CRAM-MD5']])('any name and password will do with %s', async (method) => {
  const transport = createTransport({
    url: outbox.smtpUrl,
    auth: { user: 'anyone', pass: 'anything' },
    authMethod: method,
  });
  await expect(transport.sendMail(letter)).resolves.toMatchObject({ accepted: ['wren@maker.example'] });
});

test('addresses and subjects beyond ASCII are taken', async () => {
  const to = 'jürgen@maker.example';
  await createTransport({ url: outbox.smtpUrl }).sendMail({ ...letter, to, subject: 'Preßwerk 🔩' });
  expect((await outbox.messageTo(to)).subject).toBe('Preßwerk 🔩');
});

test('a message over 25 MiB is refused and not kept', async () => {
  const talk = await converseToData(outbox.port, 'wren@maker.example');
  const line = `${'x'.repeat(998)}\r\n`;
  for (let written = 0; written <= 25 * 2 ** 20; written += 1000 * line.length) talk.write(line.repeat(1000));
  expect(await talk.say('.')).toMatch(/^552/);
  talk.socket.destroy();
  expect(await readdir(outbox.folder)).toEqual([]);
});

test('a size said beforehand is judged at once', async () => {
  const talk = await converse(outbox.port);
  await talk.answer();
  await talk.say('EHLO bench.test');
  expect(await talk.say('MAIL FROM:<post@centrepop.test> SIZE=30000000')).toMatch(/^552/);
  talk.socket.destroy();
});

test('a sender that goes away in the middle leaves nothing behind', async () => {
  const talk = await converseToData(outbox.port, 'wren@maker.example');
  talk.write('Subject: half\r\n\r\nhalf of it');
  talk.socket.destroy();
  await createTransport({ url: outbox.smtpUrl }).sendMail({ ...letter, to: 'jo@maker.example' });
  await outbox.messageTo('jo@maker.example');
  await outbox.stop();
  expect((await readdir(outbox.folder)).map((name) => path.extname(name)).sort()).toEqual(['.eml', '.json']);
});

test('a new start finds what was kept and clears away what was not finished', async () => {
  await createTransport({ url: outbox.smtpUrl }).sendMail(letter);
  await outbox.stop();
  await writeFile(path.join(outbox.folder, 'left.tmp'), 'half');
  await writeFile(path.join(outbox.folder, '20260101T000000000Z-left.json'), '{}');
  const again = await openOutbox({ path: outbox.folder, remove: () => undefined });
  expect(await again.messages()).toMatchObject([{ subject: 'Episode 4 is out' }]);
  await again.close();
  expect((await readdir(outbox.folder)).filter((name) => name.includes('left'))).toEqual([]);
});

test('messages that come at once are all kept, each once', async () => {
  const transport = createTransport({ url: outbox.smtpUrl, pool: true, maxConnections: 8 });
  const numbers = Array.from({ length: 60 }, (_, index) => String(index));
  await Promise.all(numbers.map((number) => transport.sendMail({ ...letter, subject: number })));
  transport.close();
  const kept = (await outbox.messages()).map(({ subject }) => subject);
  expect(kept.sort((a, b) => Number(a) - Number(b))).toEqual(numbers);
});

test('a folder that cannot be written to is named in the refusal to start', async () => {
  const folder = throwawayFolder('outbox');
  const file = path.join(folder.path, 'file');
  await writeFile(file, '');
  await expect(openOutbox({ path: path.join(file, 'mail'), remove: folder.remove })).rejects.toThrow(
    `The folder ${path.join(file, 'mail')} cannot be used`,
  );
  folder.remove();
});

test('a port that is taken, by mail or by the page, is named and leaves nothing running', async () => {
  const folder = throwawayFolder('outbox');
  const pagePort = Number(new URL(outbox.page).port);
  await expect(startFakeSmtp({ folder: folder.path, pagePort })).rejects.toThrow(
    `Port ${String(pagePort)} on 127.0.0.1 is in use by another program.`,
  );
  await expect(startFakeSmtp({ folder: folder.path, port: outbox.port })).rejects.toThrow(
    `Port ${String(outbox.port)} on 127.0.0.1 is in use by another program.`,
  );
  folder.remove();
});
