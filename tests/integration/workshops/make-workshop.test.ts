import { expect, test } from 'vitest';
import { getSettings } from '../../../src/features/workshops/server/get-settings.ts';
import { listTeam } from '../../../src/features/workshops/server/list-team.ts';
import { makeWorkshop } from '../../../src/features/workshops/server/make-workshop.ts';
import { POST as makeRoute } from '../../../src/pages/api/workshops/index.ts';
import { addSecondFactor } from '../../../src/seed/people.ts';
import { callRoute, codeOf, fieldsOf } from '../../support/call-route.ts';
import { aPerson, contextFor, inWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const ZONE = 'Europe/London';

test('whoever makes a workshop is its owner, and is sent to set up a second factor first', async () => {
  const maker = await aPerson(services);
  const made = await callRoute(services, makeRoute, {
    form: { name: 'Quay Shed', slug: '', timeZone: ZONE },
    actor: maker,
  });
  expect(made).toMatchObject({ status: 303, location: '/bench/quay-shed' });
  const bare = await inWorkshop(services, maker, 'quay-shed');
  expect(bare.role).toBe('owner');
  await expect(listTeam(bare, undefined)).rejects.toMatchObject({ code: 'second_factor_needed' });
  const { person } = await addSecondFactor(services, maker);
  const { members } = await listTeam(await inWorkshop(services, person, 'quay-shed'), undefined);
  expect(members).toMatchObject([{ accountId: maker.id, role: 'owner', secondFactor: true }]);
});

test('nobody who is not signed in makes one', async () => {
  const answer = await callRoute(services, makeRoute, { body: { name: 'No Shed', timeZone: ZONE } });
  expect(codeOf(answer)).toBe('sign_in_needed');
  const form = await callRoute(services, makeRoute, { form: { name: 'No Shed', timeZone: ZONE } });
  expect(form.location).toBe('detour:sign_in_needed:/bench/new');
});

test.each([
  ['bench', 'is kept for the product'],
  ['Centrepop', 'is kept for the product'],
  ['a', 'at least 2'],
  ['a'.repeat(41), 'at most 40'],
  ['two--hyphens', 'single hyphens'],
  ['-before', 'single hyphens'],
  ['sch\u00f6ne-werkstatt', 'letters a to z'],
  ['a/b/c', 'letters a to z'],
])('the address name %s is refused: %s', async (slug, why) => {
  const answer = await callRoute(services, makeRoute, {
    body: { name: 'A Shed', slug, timeZone: ZONE },
    actor: await aPerson(services),
  });
  expect(answer.status).toBe(422);
  expect(fieldsOf(answer)['slug']).toContain(why);
});

test('a taken address name is refused at its field, and nothing is made', async () => {
  const [first, second] = [await aPerson(services), await aPerson(services)];
  const input = { name: 'Twice', slug: 'twice', timeZone: ZONE };
  await makeWorkshop(await contextFor(services, first, null), input);
  await expect(makeWorkshop(await contextFor(services, second, null), input)).rejects.toMatchObject({
    fields: { slug: 'That address name is taken. Choose another.' },
  });
  expect((await inWorkshop(services, second, 'twice')).role).toBe('viewer');
});

test('of two who want one address name at once, one gets it', async () => {
  const makers = await Promise.all([aPerson(services), aPerson(services)]);
  const input = { name: 'Race', slug: 'race', timeZone: ZONE };
  const outcomes = await Promise.allSettled(
    makers.map(async (maker) => makeWorkshop(await contextFor(services, maker, null), input)),
  );
  expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
});

test('a name that leaves nothing for an address asks for one', async () => {
  const answer = await callRoute(services, makeRoute, {
    body: { name: '\u5de5\u623f', timeZone: ZONE },
    actor: await aPerson(services),
  });
  expect(Object.keys(fieldsOf(answer))).toEqual(['slug']);
});

test('its settings start as its maker gave them', async () => {
  const owner = await aPerson(services, { secondFactor: true });
  await makeWorkshop(await contextFor(services, owner, null), {
    name: 'Start',
    slug: 'start',
    timeZone: ZONE,
  });
  expect(await getSettings(await inWorkshop(services, owner, 'start'), undefined)).toMatchObject({
    name: 'Start',
    slug: 'start',
    timeZone: ZONE,
    language: 'en',
    editorsMaySeeOrders: false,
    version: 1,
  });
});
