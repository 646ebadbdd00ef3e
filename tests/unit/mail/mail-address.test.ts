import { describe, expect, test } from 'vitest';
import { isMailAddress, maskAddress, maskAnswer } from '../../../src/server/mail/mail-address.ts';
import { readMailFrom } from '../../../src/server/mail/mail-from.ts';

test.each([
  'wren@maker.example',
  'wren.hale+press@shed.maker.example',
  "o'brien@example.com",
  'jürgen@müller.example',
  'a@xn--mller-kva.example',
])('%s is a mail address', (address) => {
  expect(isMailAddress(address)).toBe(true);
});

test.each([
  '',
  'wren',
  '@maker.example',
  'wren@',
  'wren@maker',
  'wren@maker..example',
  'wren@-maker.example',
  '.wren@maker.example',
  'wr..en@maker.example',
  'wren hale@maker.example',
  'wren@maker.example, jo@maker.example',
  'Wren <wren@maker.example>',
  'wren@maker.example\r\nRCPT TO:<jo@maker.example>',
  'wren\u0000@maker.example',
  'wren@jo@maker.example',
  '"wren hale"@maker.example',
  'wren@[127.0.0.1]',
  `${'w'.repeat(65)}@maker.example`,
  `wren@${'m'.repeat(64)}.example`,
  `w@${'m.'.repeat(130)}example`,
])('%j is not a mail address', (address) => {
  expect(isMailAddress(address)).toBe(false);
});

describe('what a log may hold', () => {
  test('is the first letter and the domain of an address', () => {
    expect(maskAddress('wren@maker.example')).toBe('w…@maker.example');
    expect(maskAddress('nobody')).toBe('…');
  });

  test("is a server's answer without addresses and links, on one line", () => {
    const answer =
      '550 5.1.1 <wren.hale@maker.example>: unknown\r\nsee https://mx.example/why?token=abc for jo@maker.example';
    expect(maskAnswer(answer)).toBe('550 5.1.1 <w…@maker.example>: unknown see (link) for j…@maker.example');
  });

  test('is cut at 200 characters', () => {
    expect(maskAnswer('x'.repeat(500))).toHaveLength(200);
  });
});

describe('MAIL_FROM', () => {
  test.each([
    ['post@example.com', { name: 'Centrepop', address: 'post@example.com' }],
    ['Marram Lane <post@example.com>', { name: 'Marram Lane', address: 'post@example.com' }],
    ['"Lane, Marram" <post@example.com>', { name: 'Lane, Marram', address: 'post@example.com' }],
  ])('%s is read', (text, expected) => {
    expect(readMailFrom(text)).toEqual(expected);
  });

  test.each(['', 'Marram Lane', 'Marram <post>', 'a@example.com, b@example.com'])(
    '"%s" is refused at the start',
    (text) => {
      expect(() => readMailFrom(text)).toThrow('MAIL_FROM must be one address');
    },
  );
});
