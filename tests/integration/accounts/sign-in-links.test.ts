import { expect, test } from 'vitest';
import { askSignInLink } from '../../../src/features/accounts/server/ask-sign-in-link.ts';
import { confirmSecondFactor } from '../../../src/features/accounts/server/confirm-second-factor.ts';
import { openSignInLink } from '../../../src/features/accounts/server/open-sign-in-link.ts';
import { startSecondFactor } from '../../../src/features/accounts/server/start-second-factor.ts';
import { joinTeam } from '../../../src/seed/people.ts';
import { appCode, askedToken, mailsOf, signUpAs, withCookiesOf } from '../../support/account-steps.ts';
import { aPerson, aWorkshop, contextFor, PASSWORD } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const shed = await aWorkshop(services);

async function askFor(email: string): Promise<string[]> {
  const nobody = await contextFor(services, null, null);
  return mailsOf(services, async () =>
    expect(await askSignInLink(nobody, { email })).toEqual({ done: true }),
  );
}

async function tokenFor(email: string): Promise<string> {
  expect(await askFor(email)).toEqual(['signInLink']);
  return askedToken(services, 'signInLink');
}

async function open(token: string) {
  const context = await contextFor(services, null, null);
  await openSignInLink(context, { token });
  return withCookiesOf(services, context);
}

const OVER = { fields: { '': expect.stringContaining('no longer works') as string } };
const NOT_FOR_YOU = { fields: { '': expect.stringContaining('signs in with its password') as string } };

test('a viewer signs in by a mailed link, once', async () => {
  const viewer = await aPerson(services);
  const token = await tokenFor(viewer.email);
  expect((await open(token)).actor).toMatchObject({ kind: 'account', id: viewer.id });
  await expect(open(token)).rejects.toMatchObject(OVER);
});

test('the link in the mail leads to our page, which asks for one more press', async () => {
  const viewer = await aPerson(services);
  const token = await tokenFor(viewer.email);
  const { links } = await services.outbox.messageTo(viewer.email);
  expect(links).toEqual([`http://shed.test/sign-in/open?token=${token}`]);
});

test.each(['owner', 'editor', 'moderator'] as const)('the %s of a workshop is mailed none', async (role) => {
  expect(await askFor(shed.people[role].email)).toEqual([]);
});

test('an account with a second factor is mailed none, nor an unconfirmed or unknown address', async () => {
  const guarded = await aPerson(services, { secondFactor: true });
  expect(await askFor(guarded.email)).toEqual([]);
  await signUpAs(services, { name: 'Unconfirmed', email: 'unconfirmed@example.com' });
  expect(await askFor('unconfirmed@example.com')).toEqual([]);
  expect(await askFor('nobody@example.com')).toEqual([]);
});

test('a link asked for before a role was gained opens nothing after', async () => {
  const person = await aPerson(services);
  const token = await tokenFor(person.email);
  await joinTeam(services, { owner: shed.people.owner, slug: shed.slug }, person, 'moderator');
  await expect(open(token)).rejects.toMatchObject(NOT_FOR_YOU);
});

test('a link asked for before a second factor was set up opens nothing after', async () => {
  const person = await aPerson(services);
  const token = await tokenFor(person.email);
  const context = await contextFor(services, person, null);
  const { secret } = await startSecondFactor(context, { password: PASSWORD });
  await confirmSecondFactor(context, { code: appCode(secret) });
  await expect(open(token)).rejects.toMatchObject(NOT_FOR_YOU);
});

test('a token that was never mailed opens nothing', async () => {
  await expect(open('never-mailed')).rejects.toMatchObject(OVER);
  await expect(open('x'.repeat(2000))).rejects.toMatchObject(OVER);
});
