import { beforeAll, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { files } from '../../../src/db/schema/files.ts';
import { changeBuild } from '../../../src/features/builds/server/change-build.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { dayIn } from '../../../src/domain/time/day-in.ts';
import { AddEntryInput, type AddEntry } from '../../../src/features/diary/diary.ts';
import { addEntry } from '../../../src/features/diary/server/add-entry.ts';
import { changeEntry } from '../../../src/features/diary/server/change-entry.ts';
import { deleteEntry } from '../../../src/features/diary/server/delete-entry.ts';
import { listEntries } from '../../../src/features/diary/server/list-entries.ts';
import { listPhotoChoices } from '../../../src/features/diary/server/list-photo-choices.ts';
import { listPublicEntries } from '../../../src/features/diary/server/list-public-entries.ts';
import { restoreEntry } from '../../../src/features/diary/server/restore-entry.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let buildId: string;
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

async function aBuild(): Promise<void> {
  count += 1;
  build = `press-${String(count)}`;
  buildId = (await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null }))
    .id;
}

function entry(given: Partial<AddEntry> = {}) {
  const usual = {
    day: '2026-11-03',
    stage: null,
    text: 'Turned the shaft.',
    visibility: 'private',
    photos: [],
  } as const;
  return { ...usual, photos: [], ...given, build };
}

async function aPhoto(given: Partial<typeof files.$inferInsert> = {}): Promise<string> {
  const id = newId();
  const photo = { purpose: 'diary', name: 'shaft.jpg', bytes: 9, state: 'ready', kind: 'photo' } as const;
  await services.db.insert(files).values({ ...photo, id, workshopId: shed.id, buildId, ...given });
  return id;
}

const shown = async () => (await listEntries(shed.owner, { build })).items;

describe('a diary entry', () => {
  test('is written for a day, shown with the newest day first', async () => {
    await aBuild();
    await addEntry(shed.editor, entry({ day: '2026-11-01', text: 'first' }));
    await addEntry(shed.owner, entry({ day: '2026-11-09', text: '**last**' }));
    await addEntry(shed.owner, entry({ day: '2026-11-05', text: 'between' }));
    expect((await shown()).map(({ text }) => text)).toEqual(['**last**', 'between', 'first']);
    expect((await shown())[0]?.html).toBe('<p><strong>last</strong></p>');
    expect((await shown())[2]?.writtenBy).toBe(shed.people.editor.name);
  });

  test.each([
    [{ day: '2026-02-30' }, 'day'],
    [{ day: 'soon' }, 'day'],
    [{ text: '' }, 'text'],
    [{ text: 'x'.repeat(20_001) }, 'text'],
    [{ stage: 'x' }, 'stage'],
    [{ visibility: 'friends' }, 'visibility'],
  ])('that says %j is told so at its field', (given, field) => {
    const parsed = AddEntryInput.safeParse({ day: '2026-11-03', text: 'x', ...given });
    expect(parsed.error?.issues.map(({ path }) => path[0])).toContain(field);
  });

  test('shows photos of its build that are ready, in the order they were chosen', async () => {
    await aBuild();
    const [one, two] = [await aPhoto(), await aPhoto()];
    const unready = await aPhoto({ state: 'checking' });
    expect((await listPhotoChoices(shed.owner, { build })).items.map(({ id }) => id)).toEqual([two, one]);
    const photos = [
      { file: two, description: 'the shaft in the lathe' },
      { file: one, description: '' },
    ];
    const { id } = await addEntry(shed.owner, entry({ text: '', photos }));
    expect((await shown())[0]?.photos).toMatchObject(photos);
    await expect(
      changeEntry(shed.owner, {
        ...entry({ photos: [{ file: unready, description: '' }] }),
        entry: id,
        version: 1,
      }),
    ).rejects.toThrow(Invalid);
    expect((await shown())[0]?.photos).toHaveLength(2);
    await aBuild();
    await expect(addEntry(shed.owner, entry({ photos }))).rejects.toHaveProperty('fields.photos');
  });

  test('reads the photos of a plain form', () => {
    const id = newId();
    const form = { day: '2026-11-03', text: '', [`photo-${id}`]: 'on', [`photo-${id}-says`]: ' a  shaft ' };
    expect(AddEntryInput.parse(form).photos).toEqual([{ file: id, description: 'a shaft' }]);
  });

  test('is seen by everyone only when it and its build are public', async () => {
    await aBuild();
    await addEntry(shed.owner, entry({ text: 'for the team' }));
    await addEntry(shed.owner, entry({ text: 'for everyone', visibility: 'public' }));
    await expect(listPublicEntries(shed.anyone, { build })).rejects.toThrow(NotFound);
    const settings = { name: 'Press', slug: build, about: '', plannedEpisodes: null, currency: 'GBP' };
    await changeBuild(shed.owner, { ...settings, build, visibility: 'public', version: 1 });
    const { items } = await listPublicEntries(shed.anyone, { build });
    expect(items.map(({ text }) => text)).toEqual(['for everyone']);
  });

  test('that someone else saved meanwhile is not written over', async () => {
    await aBuild();
    const { id } = await addEntry(shed.owner, entry());
    await changeEntry(shed.editor, { ...entry({ text: 'theirs' }), entry: id, version: 1 });
    const mine = changeEntry(shed.owner, { ...entry({ text: 'mine' }), entry: id, version: 1 });
    await expect(mine).rejects.toThrow(Conflict);
    await expect(mine).rejects.toMatchObject({ stored: { text: 'theirs', version: 2 } });
    await expect(deleteEntry(shed.owner, { build, entry: id, version: 1 })).rejects.toThrow(Conflict);
  });

  test('is deleted and brought back', async () => {
    await aBuild();
    const { id } = await addEntry(shed.owner, entry());
    const { version } = await deleteEntry(shed.owner, { build, entry: id, version: 1 });
    expect(await shown()).toEqual([]);
    await restoreEntry(shed.owner, { build, entry: id, version });
    expect(await shown()).toHaveLength(1);
  });

  test('refuses a moderator', async () => {
    await aBuild();
    const { id } = await addEntry(shed.owner, entry());
    for (const asked of [
      () => addEntry(shed.moderator, entry()),
      () => changeEntry(shed.moderator, { ...entry(), entry: id, version: 1 }),
      () => deleteEntry(shed.moderator, { build, entry: id, version: 1 }),
      () => restoreEntry(shed.moderator, { build, entry: id, version: 1 }),
    ]) {
      await expect(asked()).rejects.toThrow(Forbidden);
    }
  });

  test('of another build or workshop is not found', async () => {
    await aBuild();
    const { id } = await addEntry(shed.owner, entry());
    await aBuild();
    for (const asked of [
      () => changeEntry(shed.owner, { ...entry(), entry: id, version: 1 }),
      () => deleteEntry(shed.owner, { build, entry: id, version: 1 }),
      () => restoreEntry(shed.owner, { build, entry: id, version: 1 }),
      () => addEntry(shed.outsider, entry()),
    ]) {
      await expect(asked()).rejects.toThrow(NotFound);
    }
  });
});

test('today is the day where the workshop is', () => {
  const instant = new Date('2026-11-03T23:30:00Z');
  expect(dayIn('Europe/London', instant)).toBe('2026-11-03');
  expect(dayIn('Pacific/Auckland', instant)).toBe('2026-11-04');
});
