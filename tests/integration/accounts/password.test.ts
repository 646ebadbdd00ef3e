import { describe, expect, test } from 'vitest';
import { askPasswordReset } from '../../../src/features/accounts/server/ask-password-reset.ts';
import { changePassword } from '../../../src/features/accounts/server/change-password.ts';
import { resetPassword } from '../../../src/features/accounts/server/reset-password.ts';
import { askedToken, isSignedIn, mailsOf, signInAs, withCookiesOf } from '../../support/account-steps.ts';
import { anotherSession, aPerson, contextFor, PASSWORD } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const NEW_PASSWORD = 'a-new-long-password';

async function askFor(email: string): Promise<string[]> {
  const nobody = await contextFor(services, null, null);
  return mailsOf(services, async () =>
    expect(await askPasswordReset(nobody, { email })).toEqual({ done: true }),
  );
}

async function reset(token: string, newPassword = NEW_PASSWORD) {
  return resetPassword(await contextFor(services, null, null), { token, newPassword });
}

const OVER = { fields: { '': expect.stringContaining('no longer works') as string } };

describe('a forgotten password', () => {
  test('answers alike for a known and an unknown address, and mails the known one', async () => {
    const person = await aPerson(services);
    expect(await askFor(person.email)).toEqual(['resetPassword']);
    expect(await askFor('nobody@example.com')).toEqual([]);
    expect((await services.outbox.messageTo(person.email)).links).toEqual([
      `http://shed.test/reset/password?token=${askedToken(services, 'resetPassword')}`,
    ]);
  });

  test('is replaced by the link, once; every session ends, and the holder is told', async () => {
    const person = await aPerson(services);
    const phone = { headers: await anotherSession(services, person.id) };
    await askFor(person.email);
    const token = askedToken(services, 'resetPassword');
    expect(await mailsOf(services, () => reset(token))).toEqual(['passwordChanged']);
    expect(await isSignedIn(services, person)).toBe(false);
    expect(await isSignedIn(services, phone)).toBe(false);
    await expect(signInAs(services, person.email)).rejects.toMatchObject({ code: 'invalid' });
    await signInAs(services, person.email, NEW_PASSWORD);
    await expect(reset(token, 'yet-another-password')).rejects.toMatchObject(OVER);
  });

  test('leaves the second factor on', async () => {
    const person = await aPerson(services, { secondFactor: true });
    await askFor(person.email);
    await reset(askedToken(services, 'resetPassword'));
    const afterPassword = await withCookiesOf(services, await signInAs(services, person.email, NEW_PASSWORD));
    expect(afterPassword.actor.kind).toBe('anyone');
  });

  test('is not replaced by a token that was never mailed', async () => {
    await expect(reset('never-mailed')).rejects.toMatchObject(OVER);
  });
});

describe('a change of password', () => {
  test('needs the old one', async () => {
    const person = await aPerson(services);
    await expect(
      changePassword(await contextFor(services, person, null), {
        password: 'wrong',
        newPassword: NEW_PASSWORD,
      }),
    ).rejects.toMatchObject({ fields: { password: 'That is not your password.' } });
    await signInAs(services, person.email);
  });

  test('ends every other session and keeps this one', async () => {
    const person = await aPerson(services);
    const phone = { headers: await anotherSession(services, person.id) };
    const context = await contextFor(services, person, null);
    await changePassword(context, { password: PASSWORD, newPassword: NEW_PASSWORD });
    expect(await isSignedIn(services, phone)).toBe(false);
    expect((await withCookiesOf(services, context)).actor).toMatchObject({ id: person.id });
  });
});
