import { expect, test } from 'vitest';
import { changeSettings } from '../../../src/features/workshops/server/change-settings.ts';
import { makeWorkshop } from '../../../src/features/workshops/server/make-workshop.ts';
import { type ChangeSettings } from '../../../src/features/workshops/workshop.ts';
import { POST as settingsRoute } from '../../../src/pages/api/workshops/[workshop]/settings.ts';
import { callRoute, fieldsOf } from '../../support/call-route.ts';
import { aPerson, aWorkshop, contextFor, inWorkshop, workshopOf } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const shed = await aWorkshop(services);

async function ownShed() {
  const owner = await aPerson(services, { secondFactor: true });
  const { slug } = await workshopOf(services, owner);
  const settings: ChangeSettings = {
    name: 'Changed',
    slug,
    timeZone: 'UTC',
    language: 'de',
    editorsMaySeeOrders: true,
    version: 1,
  };
  return { owner, slug, settings };
}

test('the owner changes them all', async () => {
  const { owner, slug, settings } = await ownShed();
  await changeSettings(await inWorkshop(services, owner, slug), settings);
  expect((await inWorkshop(services, owner, slug)).workshop).toMatchObject({ ...settings, version: 2 });
});

test.each(['editor', 'moderator'] as const)('refuses the %s', async (role) => {
  await expect(
    changeSettings(shed[role], { ...(await ownShed()).settings, slug: shed.slug }),
  ).rejects.toMatchObject({ code: 'forbidden' });
});

test('does not find another workshop’s', async () => {
  const change = changeSettings(shed.outsider, { ...(await ownShed()).settings, slug: shed.slug });
  await expect(change).rejects.toMatchObject({ code: 'not_found' });
});

test('an old address name leads to the workshop for ever, and is given to nobody else', async () => {
  const { owner, slug, settings } = await ownShed();
  await changeSettings(await inWorkshop(services, owner, slug), { ...settings, slug: `${slug}-moved` });
  const byOldName = await inWorkshop(services, owner, slug);
  expect(byOldName).toMatchObject({ role: 'owner', workshop: { slug: `${slug}-moved` } });

  const other = await contextFor(services, await aPerson(services), null);
  const taken = { fields: { slug: 'That address name is taken. Choose another.' } };
  await expect(makeWorkshop(other, { name: 'Other', slug, timeZone: 'UTC' })).rejects.toMatchObject(taken);
  const { owner: third, slug: thirdSlug } = await ownShed();
  await expect(
    changeSettings(await inWorkshop(services, third, thirdSlug), { ...settings, slug }),
  ).rejects.toMatchObject(taken);

  await changeSettings(byOldName, { ...settings, version: 2 });
  expect((await inWorkshop(services, owner, `${slug}-moved`)).workshop.slug).toBe(slug);
});

test('settings that changed since they were read answer 409 with the stored ones', async () => {
  const { owner, slug, settings } = await ownShed();
  await changeSettings(await inWorkshop(services, owner, slug), { ...settings, name: 'First' });
  const late = await callRoute(services, settingsRoute, {
    params: { workshop: slug },
    actor: owner,
    body: { ...settings, name: 'Second' },
  });
  expect(late).toMatchObject({
    status: 409,
    json: { error: { code: 'conflict', stored: { name: 'First', version: 2, slug } } },
  });
});

test('of two who save at once one is told, with what the other has just saved', async () => {
  const { owner, slug, settings } = await ownShed();
  const context = await inWorkshop(services, owner, slug);
  const outcomes = await Promise.allSettled(
    ['One', 'Two'].map((name) => changeSettings(context, { ...settings, name })),
  );
  const { workshop } = await inWorkshop(services, owner, slug);
  const refused = outcomes.filter((outcome) => outcome.status === 'rejected');
  expect(refused).toMatchObject([
    { reason: { code: 'conflict', stored: { name: workshop.name, version: 2 } } },
  ]);
  expect(workshop.version).toBe(2);
});

test('a form that is late comes back with what was entered', async () => {
  const { owner, slug, settings } = await ownShed();
  await changeSettings(await inWorkshop(services, owner, slug), { ...settings, name: 'First' });
  const late = await callRoute(services, settingsRoute, {
    params: { workshop: slug },
    actor: owner,
    form: { name: 'Second', slug, timeZone: 'UTC', language: 'de', version: '1' },
  });
  expect(late.status).toBe(409);
  expect(late.page).toMatchObject({ path: `/bench/${slug}/settings`, form: { values: { name: 'Second' } } });
  expect(late.page?.form.message).toContain('Someone else changed these settings');
});

test.each([
  ['version', 3_000_000_000, 'Open the page again.'],
  ['version', 'x', 'Open the page again.'],
  ['timeZone', 'Mars/Olympus', 'Choose a time zone from the list.'],
  ['language', 'xx', 'Choose a language from the list.'],
  ['editorsMaySeeOrders', 'perhaps', 'Tick it or leave it.'],
  ['slug', 'settings', 'That name is kept for the product. Choose another.'],
])('%s is not taken as %s', async (field, value, sentence) => {
  const { owner, slug, settings } = await ownShed();
  const answer = await callRoute(services, settingsRoute, {
    params: { workshop: slug },
    actor: owner,
    body: { ...settings, [field]: value },
  });
  expect(answer.status).toBe(422);
  expect(fieldsOf(answer)).toEqual({ [field]: sentence });
});
