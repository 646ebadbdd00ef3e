import { describe, expect, test } from 'vitest';
import {
  AppCodeInput,
  personName,
  ResetPasswordInput,
  SecondStepInput,
  SignInInput,
  SignUpInput,
} from '../../../src/features/accounts/account.ts';
import { makeRecoveryCodes, readRecoveryCode } from '../../../src/server/auth/recovery-codes.ts';

const person = { name: 'Jo', email: 'jo@example.com', password: 'long-enough' };

test('an address is taken in lower case, without the space around it', () => {
  expect(SignUpInput.parse({ ...person, email: ' Jo@Example.COM ' }).email).toBe('jo@example.com');
});

test.each([
  '',
  'jo',
  'jo@',
  '@example.com',
  'jo@example',
  'jo@exa mple.com',
  `${'j'.repeat(250)}@example.com`,
])('the address %j is refused', (email) => {
  expect(SignUpInput.safeParse({ ...person, email }).success).toBe(false);
});

test.each([
  [9, false],
  [10, true],
  [128, true],
  [129, false],
])('a new password of %i characters: %s', (length, expected) => {
  const newPassword = 'p'.repeat(length);
  expect(ResetPasswordInput.safeParse({ token: 't', newPassword }).success).toBe(expected);
});

test('a password is taken as it was typed, spaces included', () => {
  expect(SignUpInput.parse({ ...person, password: '  two words  ' }).password).toBe('  two words  ');
});

describe('a name', () => {
  test.each(['', '   ', 'a\u0000b', 'a\nb', '<b>', 'x'.repeat(81)])('cannot be %j', (name) => {
    expect(personName.safeParse(name).success).toBe(false);
  });

  test.each(['José', '王', "O'Neil-Smith", '👩‍🔧 Kit'])('can be %s', (name) => {
    expect(personName.parse(` ${name} `)).toBe(name);
  });
});

test.each([undefined, 7, 'x'.repeat(501)])('where to go next is ignored when it is %j', (next) => {
  expect(SignInInput.parse({ email: person.email, password: 'p', next }).next).toBeUndefined();
});

test('the six digits may be typed with spaces', () => {
  expect(AppCodeInput.parse({ code: ' 123 456 ' }).code).toBe('123456');
  expect(AppCodeInput.safeParse({ code: '12345a' }).success).toBe(false);
});

test('the second step is by the app unless it says otherwise', () => {
  expect(SecondStepInput.parse({ code: '1' }).kind).toBe('code');
  expect(SecondStepInput.safeParse({ code: '1', kind: 'sms' }).success).toBe(false);
});

describe('recovery codes', () => {
  test('are ten, all different, and hold nothing that is mistaken for something else', () => {
    const codes = makeRecoveryCodes();
    expect(new Set(codes).size).toBe(10);
    for (const code of codes) expect(code).toMatch(/^[a-hj-kmnp-z2-9]{5}-[a-hj-kmnp-z2-9]{5}$/);
  });

  test('are read in any case, with or without hyphen and spaces', () => {
    for (const code of makeRecoveryCodes()) {
      for (const typed of [
        code,
        code.toUpperCase(),
        code.replace('-', ''),
        ` ${code.replace('-', ' - ')} `,
      ]) {
        expect(readRecoveryCode(typed)).toBe(code);
      }
    }
  });
});
