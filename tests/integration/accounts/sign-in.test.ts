import { expect, test } from 'vitest';
import { signOutEverywhere } from '../../../src/features/accounts/server/sign-out-everywhere.ts';
import { signOut } from '../../../src/features/accounts/server/sign-out.ts';
import { POST as signInRoute } from '../../../src/pages/api/account/sign-in.ts';
import { isSignedIn, signInAs, withCookiesOf } from '../../support/account-steps.ts';
import { callRoute } from '../../support/call-route.ts';
import { anotherSession, aPerson, contextFor, PASSWORD } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const person = await aPerson(services);

test('the right password signs in, whatever the case of the address', async () => {
  const answer = await callRoute(services, signInRoute, {
    form: { email: ` ${person.email.toUpperCase()} `, password: PASSWORD },
  });
  expect(answer).toMatchObject({ status: 303, location: '/bench' });
  const session = answer.setCookies.find((line) => line.includes('session_token='));
  expect(session).toMatch(/^centrepop\.session_token=.*; HttpOnly; SameSite=Lax/);
  expect(answer.setCookies.some((line) => line.startsWith('centrepop.signed_in=1;'))).toBe(true);
});

test('a wrong password and an unknown address are refused in the same words, and set no cookie', async () => {
  const wrong = await callRoute(services, signInRoute, {
    body: { email: person.email, password: 'not-the-password' },
  });
  const unknown = await callRoute(services, signInRoute, {
    body: { email: 'nobody@example.com', password: 'not-the-password' },
  });
  expect(wrong).toMatchObject({ status: 422, setCookies: [] });
  expect(wrong.json).toEqual(unknown.json);
});

test('signing in leads to the page that was asked for, if it is one of ours', async () => {
  const to = async (next: string) =>
    (await callRoute(services, signInRoute, { form: { email: person.email, password: PASSWORD, next } }))
      .location;
  expect(await to('/bench/some-shed/team')).toBe('/bench/some-shed/team');
  expect(await to('//elsewhere.example')).toBe('/bench');
  expect(await to('/'.padEnd(3000, 'x'))).toBe('/bench');
});

test('signing out ends this session only; doing it twice is no error', async () => {
  const [here, there] = [await withCookiesOf(services, await signInAs(services, person.email)), person];
  await signOut(here, undefined);
  expect(await isSignedIn(services, here)).toBe(false);
  expect(await isSignedIn(services, there)).toBe(true);
  await signOut(here, undefined);
});

test('signing out everywhere ends every session of the account, and nobody else’s', async () => {
  const [devices, other] = [await aPerson(services), await aPerson(services)];
  const phone = { headers: await anotherSession(services, devices.id) };
  await signOutEverywhere(await contextFor(services, devices, null), undefined);
  expect(await isSignedIn(services, devices)).toBe(false);
  expect(await isSignedIn(services, phone)).toBe(false);
  expect(await isSignedIn(services, other)).toBe(true);
});

test('a session cookie with a foreign signature is nobody’s', async () => {
  const cookie = person.headers
    .get('cookie')!
    .replace(/\.[^.]*$/, `.${encodeURIComponent(btoa('x'.repeat(32)))}`);
  expect(await isSignedIn(services, { headers: new Headers({ cookie }) })).toBe(false);
});
