import { expect, test } from 'vitest';
import { z } from 'zod';
import { POST as changePasswordRoute } from '../../../src/pages/api/account/password.ts';
import { POST as resetRoute } from '../../../src/pages/api/account/reset.ts';
import { POST as signUpRoute } from '../../../src/pages/api/account/sign-up.ts';
import { POST as inviteRoute } from '../../../src/pages/api/workshops/[workshop]/invitations/index.ts';
import { GET as meRoute } from '../../../src/pages/api/me.ts';
import { exportedFunctions, isRoute, sourceFiles } from '../../support/authorisation/find-ruled.ts';
import { callRoute } from '../../support/call-route.ts';
import { aPerson, aWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const shed = await aWorkshop(services);
const routes = (await exportedFunctions(sourceFiles('src/pages/api', /\.ts$/))).filter(isRoute);

test('a form comes back with what was entered, never with the password', async () => {
  const answer = await callRoute(services, signUpRoute, {
    form: { name: 'Jo', email: 'not an address', password: 'short' },
  });
  expect(answer).toMatchObject({ status: 422, page: { path: '/sign-up' } });
  expect(answer.headers.get('cache-control')).toBe('no-store');
  expect(answer.page?.form.values).toEqual({ name: 'Jo', email: 'not an address' });
  expect(Object.keys(answer.page?.form.errors ?? {}).sort()).toEqual(['email', 'password']);
});

test('a form that a link led to comes back with its token, and without the password', async () => {
  const form = { token: 'from-the-mail', newPassword: 'short' };
  const answer = await callRoute(services, resetRoute, { form });
  expect(answer.page?.form.values).toEqual({ token: 'from-the-mail' });
  expect(answer.page?.path).toBe('/reset/password?token=from-the-mail');
});

test('what a form shows in place comes back with it', async () => {
  const person = await aPerson(services);
  const form = { password: 'not-the-password', newPassword: 'a-new-long-password' };
  const answer = await callRoute(services, changePasswordRoute, { form, actor: person });
  expect(answer).toMatchObject({
    status: 422,
    page: { path: '/account', form: { values: {}, errors: { password: 'That is not your password.' } } },
  });
});

test('a form of a workshop comes back on its page', async () => {
  const answer = await callRoute(services, inviteRoute, {
    params: { workshop: shed.slug },
    actor: shed.people.owner,
    form: { email: shed.people.editor.email, role: 'editor' },
  });
  expect(answer.page).toMatchObject({
    path: `/bench/${shed.slug}/team`,
    form: { values: { email: shed.people.editor.email, role: 'editor' } },
  });
});

test('a form of someone whose session has ended leads to signing in, and back to its page', async () => {
  const answer = await callRoute(services, inviteRoute, {
    params: { workshop: shed.slug },
    form: { email: 'x@example.com', role: 'editor' },
  });
  expect(answer).toMatchObject({ status: 303, location: `detour:sign_in_needed:/bench/${shed.slug}/team` });
});

test('no form gives back a field that is a secret', () => {
  const leaks = routes.flatMap(({ file, thing: { route } }) => {
    if (!route.form || !(route.body instanceof z.ZodObject)) return [];
    return Object.keys(route.body.shape as object)
      .filter((field) => /password|^code$/i.test(field) && !route.form?.secrets?.includes(field))
      .map((field) => `${file}: ${field}`);
  });
  expect(leaks).toEqual([]);
});

test('who is signed in is told without what is not to be shown', async () => {
  const answer = await callRoute(services, meRoute, { actor: shed.people.editor });
  expect(answer.json).toEqual({
    name: shed.people.editor.name,
    workshops: [{ slug: shed.slug, name: shed.owner.workshop.name }],
  });
  expect((await callRoute(services, meRoute)).json).toBeNull();
});
