import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { SLUG_LENGTH, suggestSlug } from '../../../src/domain/slugs.ts';
import {
  ChangeSettingsInput,
  MakeWorkshopInput,
  RESERVED_SLUGS,
  timeZoneOptions,
  workshopName,
  workshopSlug,
} from '../../../src/features/workshops/workshop.ts';

describe('an address name suggested for a workshop', () => {
  test.each([
    ['Marram Lane Workshop', 'marram-lane-workshop'],
    ['  Öl & Späne!  ', 'ol-spane'],
    ['Ångström’s № 5', 'angstrom-s-no-5'],
    ['--x--', 'x'],
    ['工房', ''],
    ['', ''],
    ['Straße', 'stra-e'],
  ])('%j: %j', (name, slug) => {
    expect(suggestSlug(name)).toBe(slug);
  });

  test('is one that can be taken, unless it is too short or kept', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 120 }), (name) => {
        const slug = suggestSlug(name);
        const usable = slug.length >= SLUG_LENGTH.min && !RESERVED_SLUGS.includes(slug);
        expect(workshopSlug.safeParse(slug).success).toBe(usable);
        expect(suggestSlug(slug)).toBe(slug);
      }),
    );
  });
});

test('an address name is taken in any case and without the space around it', () => {
  expect(workshopSlug.parse('  Marram-Lane ')).toBe('marram-lane');
});

test.each(RESERVED_SLUGS)('%s is kept for the product', (slug) => {
  expect(workshopSlug.safeParse(slug).success).toBe(false);
});

test.each([
  ['\u200bShed', 'an invisible character'],
  ['Shed\u202ereversed', 'a change of direction'],
  ['Shed\nLane', 'a line break'],
  ['---', 'no letter or digit'],
  ['x'.repeat(81), 'more than 80 characters'],
])('a name with %j is refused: %s', (name) => {
  expect(workshopName.safeParse(name).success).toBe(false);
});

test('a name is trimmed and its accents are composed', () => {
  expect(workshopName.parse('  Cafe\u0301 ')).toBe('Café');
});

test('a workshop gets its address from its name when none was given', () => {
  const input = { name: 'Quay Shed', timeZone: 'UTC' };
  expect(MakeWorkshopInput.parse(input).slug).toBe('quay-shed');
  expect(MakeWorkshopInput.parse({ ...input, slug: '' }).slug).toBe('quay-shed');
  expect(MakeWorkshopInput.parse({ ...input, slug: 'Other' }).slug).toBe('other');
});

test('a form without the tick means no, with it yes', () => {
  const form = { name: 'Shed', slug: 'shed', timeZone: 'UTC', language: 'en', version: '3' };
  expect(ChangeSettingsInput.parse(form)).toMatchObject({ editorsMaySeeOrders: false, version: 3 });
  expect(ChangeSettingsInput.parse({ ...form, editorsMaySeeOrders: 'on' }).editorsMaySeeOrders).toBe(true);
});

test('every time zone that is offered can be chosen', () => {
  const taken = timeZoneOptions().map(({ value }) =>
    MakeWorkshopInput.safeParse({ name: 'Shed', timeZone: value }),
  );
  expect(taken.filter(({ success }) => !success)).toEqual([]);
  expect(taken.length).toBeGreaterThan(300);
});
