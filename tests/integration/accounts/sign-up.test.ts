import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { signJWT } from 'better-auth/crypto';
import { accounts } from '../../../src/db/schema/accounts.ts';
import { sendConfirmationAgain } from '../../../src/features/accounts/server/send-confirmation-again.ts';
import { POST as signUpRoute } from '../../../src/pages/api/account/sign-up.ts';
import {
  askedToken,
  confirmWith,
  isSignedIn,
  mailsOf,
  signInAs,
  signUpAs,
  withCookiesOf,
} from '../../support/account-steps.ts';
import { callRoute } from '../../support/call-route.ts';
import { aPerson, contextFor, PASSWORD } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const known = await aPerson(services, { name: 'Known', email: 'known@example.com' });

function ask(email: string) {
  return callRoute(services, signUpRoute, { body: { name: 'Anyone', email, password: 'another-password' } });
}

test('an address that is known answers as one that is not, and its holder is told by mail', async () => {
  const [toKnown, toUnknown] = [await ask(known.email), await ask('unknown@example.com')];
  expect(toKnown).toMatchObject({ status: 200, json: { done: true }, setCookies: [] });
  expect({ ...toKnown, headers: null }).toEqual({ ...toUnknown, headers: null });
  expect((await services.outbox.messageTo(known.email)).subject).toBe('You already have an account');
  expect((await services.outbox.messageTo('unknown@example.com')).subject).toBe('Confirm your address');
});

test('signing up with a known address changes neither its name nor its password', async () => {
  await ask('KNOWN@example.com ');
  const signedIn = await withCookiesOf(services, await signInAs(services, known.email));
  expect(signedIn.actor).toMatchObject({ name: 'Known' });
  await expect(signInAs(services, known.email, 'another-password')).rejects.toMatchObject({
    fields: { '': 'That address and password do not go together.' },
  });
});

test('nobody signs in before the address is confirmed, and is told how to go on', async () => {
  await signUpAs(services, { name: 'Early', email: 'early@example.com' });
  await expect(signInAs(services, 'early@example.com')).rejects.toMatchObject({
    fields: { '': expect.stringContaining('Confirm your address first') as string, unconfirmed: 'yes' },
  });
  await expect(signInAs(services, 'early@example.com', 'not-the-password')).rejects.toMatchObject({
    fields: { '': 'That address and password do not go together.' },
  });
});

test('the mailed link and the password together confirm and sign in; the link alone does not', async () => {
  await signUpAs(services, { name: 'Lin', email: 'lin@example.com' });
  const token = askedToken(services, 'confirmAddress');
  await expect(confirmWith(services, token, 'not-the-password')).rejects.toMatchObject({
    fields: { password: 'That is not the password you chose.' },
  });
  await expect(signInAs(services, 'lin@example.com')).rejects.toMatchObject({ code: 'invalid' });
  const context = await withCookiesOf(services, await confirmWith(services, token));
  expect(context.actor).toMatchObject({ kind: 'account', email: 'lin@example.com' });
});

test('the link in the mail leads to our page with the token', async () => {
  await signUpAs(services, { name: 'Post', email: 'post@example.com' });
  const { links } = await services.outbox.messageTo('post@example.com');
  const token = askedToken(services, 'confirmAddress');
  expect(links).toEqual([`http://shed.test/confirm?token=${encodeURIComponent(token)}`]);
});

test('a second sign-up with an unconfirmed address makes the first link and password worthless', async () => {
  const email = 'twice@example.com';
  await signUpAs(services, { name: 'First', email }, 'the-first-password');
  const first = askedToken(services, 'confirmAddress');
  await signUpAs(services, { name: 'Second', email }, 'the-second-password');
  await expect(confirmWith(services, first, 'the-first-password')).rejects.toMatchObject({
    fields: { password: 'That is not the password you chose.' },
  });
  await expect(confirmWith(services, first, 'the-second-password')).rejects.toMatchObject({
    fields: { '': expect.stringContaining('no longer works') as string },
  });
  await confirmWith(services, askedToken(services, 'confirmAddress'), 'the-second-password');
  const rows = await services.db.select().from(accounts).where(eq(accounts.email, email));
  expect(rows).toMatchObject([{ name: 'Second', emailVerified: true }]);
});

test('confirming again with the right password just signs in', async () => {
  await signUpAs(services, { name: 'Again', email: 'again@example.com' });
  const token = askedToken(services, 'confirmAddress');
  await confirmWith(services, token);
  const second = await withCookiesOf(services, await confirmWith(services, token));
  expect(await isSignedIn(services, { headers: second.headers })).toBe(true);
});

test('a link of the asker’s own making tries no password', async () => {
  const forged = await signJWT({ email: known.email }, 'not-the-secret-of-this-product', 3600);
  const unsigned = `${Buffer.from('{"alg":"none"}').toString('base64url')}.${forged.split('.')[1] ?? ''}.`;
  const late = await signJWT({ email: known.email }, services.settings.AUTH_SECRET, -60);
  for (const token of [forged, unsigned, late, 'a.b.c', 'nonsense']) {
    await expect(confirmWith(services, token, PASSWORD)).rejects.toMatchObject({
      fields: { '': expect.stringContaining('no longer works') as string },
    });
  }
});

test('the confirmation is sent again only to an account that waits for it, and answers alike', async () => {
  await signUpAs(services, { name: 'Waits', email: 'waits@example.com' });
  const context = await contextFor(services, null, null);
  const again = (email: string) => mailsOf(services, () => sendConfirmationAgain(context, { email }));
  expect(await again('waits@example.com')).toEqual(['confirmAddress']);
  expect(await again(known.email)).toEqual([]);
  expect(await again('nobody@example.com')).toEqual([]);
  await confirmWith(services, askedToken(services, 'confirmAddress'));
});

test('two sign-ups with one address at once leave one account', async () => {
  const email = 'at-once@example.com';
  await Promise.all([signUpAs(services, { name: 'One', email }), signUpAs(services, { name: 'Two', email })]);
  expect(await services.db.select().from(accounts).where(eq(accounts.email, email))).toHaveLength(1);
  // better-auth may have found out the hard way, and says so.
  expect(services.logged.splice(0).every((line) => line.includes('Failed to create user'))).toBe(true);
});
