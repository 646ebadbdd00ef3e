import { expect, test } from 'vitest';
import { classifyMailError, MailDeferred, MailRefused } from '../../../src/server/mail/mail-errors.ts';
import { mailHeaders } from '../../../src/server/mail/mail-headers.ts';

test.each(['From', 'to', 'BCC', 'Subject', 'Message-ID', 'Content-Type', 'Resent-To', 'DKIM-Signature'])(
  'a caller cannot set %s',
  (name) => {
    expect(() => mailHeaders({ [name]: 'wren@maker.example' })).toThrow(RangeError);
  },
);

test.each(['a\r\nBcc: jo@maker.example', 'a\nb', 'a\u0000', 'a\u2028b', '', '  ', 'x'.repeat(901)])(
  'a header of the value %j is refused',
  (value) => {
    expect(() => mailHeaders({ 'List-Id': value })).toThrow(RangeError);
  },
);

test.each(['X Note', 'X:Note', 'X\r\nBcc', '', '1'])('a header of the name %j is refused', (name) => {
  expect(() => mailHeaders({ [name]: 'x' })).toThrow(RangeError);
});

test.each(['plain', 'a@example.com', '<a@example.com>\r\nBcc: x', '<a b@example.com>', '<a@b@example.com>'])(
  '%j is not a Message-ID',
  (messageId) => {
    expect(() => mailHeaders({}, messageId)).toThrow('A Message-ID looks like');
  },
);

test.each([
  ['a mailbox that does not exist', { code: 'EENVELOPE', responseCode: 550 }, MailRefused, 550],
  ['a message that is refused', { code: 'EMESSAGE', responseCode: 554 }, MailRefused, 554],
  ['a message too large for the server', { code: 'EMESSAGE' }, MailRefused, 552],
  ['a server that is busy', { code: 'EMESSAGE', responseCode: 451 }, MailDeferred, 451],
  ['a server that goes away', { code: 'ECONNECTION', responseCode: 421 }, MailDeferred, 421],
  ['a conversation out of step', { code: 'EENVELOPE', responseCode: 503 }, MailDeferred, 503],
  ['a wrong password', { code: 'EAUTH', responseCode: 535 }, MailDeferred, 535],
  ['a server that wants a password', { code: 'EENVELOPE', responseCode: 530 }, MailDeferred, 530],
  ['a lost connection', { code: 'ECONNECTION' }, MailDeferred, undefined],
  ['a server that says nothing', { code: 'ETIMEDOUT' }, MailDeferred, undefined],
  ['a name that cannot be looked up', { code: 'EDNS' }, MailDeferred, undefined],
])('%s is told apart', (_what, error, kind, code) => {
  const sorted = classifyMailError(Object.assign(new Error('x'), error));
  expect(sorted).toBeInstanceOf(kind);
  expect(sorted.code).toBe(code);
});
