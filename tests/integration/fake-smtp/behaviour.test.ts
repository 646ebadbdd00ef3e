import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { openOutbox, type Outbox } from '../../support/outbox.ts';
import { converseToData } from './conversation.ts';

let outbox: Outbox;

beforeEach(async () => {
  outbox = await openOutbox();
});

afterEach(async () => {
  await outbox.close();
});

const send = (to: string, socketTimeout = 20_000) =>
  createTransport({ url: outbox.smtpUrl, socketTimeout }).sendMail({
    from: 'post@centrepop.test',
    to,
    subject: 'Episode 4 is out',
    text: 'Out now.',
  });

test('refused mail is answered 550 and not kept', async () => {
  await outbox.tell({ recipient: 'wren@maker.example', answer: 'refuse' });
  await expect(send('Wren@maker.example')).rejects.toMatchObject({ responseCode: 550 });
  expect(await outbox.messages()).toEqual([]);
});

test('deferred mail is answered 451, as many times as told', async () => {
  await outbox.tell({ recipient: 'wren@maker.example', answer: 'defer', times: 2 });
  await expect(send('wren@maker.example')).rejects.toMatchObject({ responseCode: 451 });
  await expect(send('wren@maker.example')).rejects.toMatchObject({ responseCode: 451 });
  await expect(send('wren@maker.example')).resolves.toBeDefined();
});

test('a dropped connection ends without an answer, and without the message', async () => {
  await outbox.tell({ recipient: '*', answer: 'drop', times: 1 });
  await expect(send('wren@maker.example')).rejects.toMatchObject({ code: 'ECONNECTION' });
  expect(await outbox.messages()).toEqual([]);
});

test('a connection dropped after keeping leaves the sender in doubt and the message here', async () => {
  await outbox.tell({ recipient: '*', answer: 'drop', times: 1, keep: true });
  await expect(send('wren@maker.example')).rejects.toMatchObject({ code: 'ECONNECTION' });
  expect(await outbox.messages()).toHaveLength(1);
});

test('a hanging connection gives no answer until the server closes', async () => {
  await outbox.tell({ recipient: '*', answer: 'hang' });
  const talk = await converseToData(outbox.port, 'wren@maker.example');
  const ended = talk.say('Subject: hanging\r\n\r\nhello\r\n.');
  await outbox.stop();
  expect(await ended).toBeUndefined();
});

test('a sender gives up on a hanging connection by its own time limit', async () => {
  await outbox.tell({ recipient: '*', answer: 'hang' });
  await expect(send('wren@maker.example', 200)).rejects.toMatchObject({ code: 'ETIMEDOUT' });
});

test('a rule for one recipient goes before the rule for all, and all are listed and forgotten', async () => {
  await outbox.tell({ recipient: '*', answer: 'refuse' });
  await outbox.tell({ recipient: 'wren@maker.example', answer: 'accept' });
  await expect(send('wren@maker.example')).resolves.toBeDefined();
  await expect(send('jo@maker.example')).rejects.toMatchObject({ responseCode: 550 });
  const listed = (await (await fetch(`${outbox.page}/behaviour`)).json()) as { rules: unknown[] };
  expect(listed.rules).toHaveLength(2);
  await fetch(`${outbox.page}/behaviour`, { method: 'DELETE' });
  await expect(send('jo@maker.example')).resolves.toBeDefined();
});

test.each([
  ['not JSON', 'Send a JSON object.'],
  ['[]', 'recipient is an address, or * for all.'],
  ['{"recipient":"*","answer":"explode"}', 'answer is one of accept, refuse, defer, drop, hang.'],
  ['{"recipient":"*","answer":"drop","times":0}', 'times is a whole number from 1.'],
  ['{"recipient":"*","answer":"drop","keep":1}', 'keep is true or false.'],
])('the rule %s is answered with what is wrong', async (body, sentence) => {
  const response = await fetch(`${outbox.page}/behaviour`, { method: 'PUT', body });
  expect(response.status).toBe(400);
  expect(await response.text()).toBe(`${sentence}\n`);
});
