import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { accounts } from '../../../src/db/schema/accounts.ts';
import { changeEmail } from '../../../src/features/accounts/server/change-email.ts';
import { confirmNewAddress } from '../../../src/features/accounts/server/confirm-new-address.ts';
import { askedToken, mailsOf, signInAs, signUpAs } from '../../support/account-steps.ts';
import { aPerson, contextFor, PASSWORD, type TestPerson } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();

async function ask(person: TestPerson, email: string, password = PASSWORD): Promise<string[]> {
  const context = await contextFor(services, person, null);
  return mailsOf(services, async () =>
    expect(await changeEmail(context, { email, password })).toEqual({ done: true }),
  );
}

async function take(person: TestPerson, token: string): Promise<string[]> {
  const context = await contextFor(services, person, null);
  return mailsOf(services, () => confirmNewAddress(context, { token }));
}

async function addressOf(person: TestPerson) {
  const [row] = await services.db.select().from(accounts).where(eq(accounts.id, person.id));
  return { email: row?.email, confirmed: row?.emailVerified };
}

const OVER = { fields: { '': expect.stringContaining('no longer works') as string } };

test('the old address approves, then the new one confirms; nothing changes before both have', async () => {
  const person = await aPerson(services);
  expect(await ask(person, 'moved@example.com')).toEqual(['approveNewAddress']);
  expect((await services.outbox.messageTo(person.email)).subject).toBe('Approve your new address');
  expect(await addressOf(person)).toEqual({ email: person.email, confirmed: true });

  const approval = askedToken(services, 'approveNewAddress');
  expect(await take(person, approval)).toEqual(['confirmNewAddress']);
  expect((await services.outbox.messageTo('moved@example.com')).subject).toBe('Confirm your new address');
  expect(await addressOf(person)).toEqual({ email: person.email, confirmed: true });

  await take(person, askedToken(services, 'confirmNewAddress'));
  expect(await addressOf(person)).toEqual({ email: 'moved@example.com', confirmed: true });
  await signInAs(services, 'moved@example.com');
  await expect(take(person, approval)).rejects.toMatchObject(OVER);
});

test('an address that is taken answers alike, and nobody is mailed', async () => {
  const [person, other] = [await aPerson(services), await aPerson(services)];
  expect(await ask(person, other.email)).toEqual([]);
  expect(await addressOf(person)).toEqual({ email: person.email, confirmed: true });
});

test('an address that someone took between the two steps stays theirs', async () => {
  const person = await aPerson(services);
  await ask(person, 'wanted@example.com');
  await take(person, askedToken(services, 'approveNewAddress'));
  await aPerson(services, { email: 'wanted@example.com' });
  await expect(take(person, askedToken(services, 'confirmNewAddress'))).rejects.toMatchObject(OVER);
  expect(await addressOf(person)).toEqual({ email: person.email, confirmed: true });
  services.logged.splice(0);
});

test('it needs the password, and an address that differs', async () => {
  const person = await aPerson(services);
  await expect(ask(person, 'other@example.com', 'not-the-password')).rejects.toMatchObject({
    fields: { password: 'That is not your password.' },
  });
  await expect(ask(person, person.email)).rejects.toMatchObject({
    fields: { email: 'That is your address already.' },
  });
});

test('another account cannot take the links', async () => {
  const [person, other] = [await aPerson(services), await aPerson(services)];
  await ask(person, 'mine@example.com');
  await expect(take(other, askedToken(services, 'approveNewAddress'))).rejects.toMatchObject({
    fields: { '': expect.stringContaining('another account') as string },
  });
  expect(await addressOf(person)).toEqual({ email: person.email, confirmed: true });
});

test('the link of a new account is not taken here, where no password is asked for', async () => {
  const person = await aPerson(services);
  await signUpAs(services, { name: 'Newcomer', email: 'newcomer@example.com' });
  await expect(take(person, askedToken(services, 'confirmAddress'))).rejects.toMatchObject(OVER);
  await expect(signInAs(services, 'newcomer@example.com')).rejects.toMatchObject({ code: 'invalid' });
});
