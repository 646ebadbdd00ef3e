import { beforeAll, describe, expect, test } from 'vitest';
import { diaryEntries } from '../../../src/db/schema/diary.ts';
import { type ChangeBuild, ChangeBuildInput, MakeBuildInput } from '../../../src/features/builds/build.ts';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { changeBuild } from '../../../src/features/builds/server/change-build.ts';
import { changeStage } from '../../../src/features/builds/server/change-stage.ts';
import { deleteBuild } from '../../../src/features/builds/server/delete-build.ts';
import { deleteStage } from '../../../src/features/builds/server/delete-stage.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { getPublicBuild } from '../../../src/features/builds/server/get-public-build.ts';
import { listDeletedBuilds } from '../../../src/features/builds/server/list-deleted-builds.ts';
import { listStages } from '../../../src/features/builds/server/list-stages.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { moveStage } from '../../../src/features/builds/server/move-stage.ts';
import { restoreBuild } from '../../../src/features/builds/server/restore-build.ts';
import { restoreStage } from '../../../src/features/builds/server/restore-stage.ts';
import { addEntry } from '../../../src/features/diary/server/add-entry.ts';
import { listEntries } from '../../../src/features/diary/server/list-entries.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

async function aBuild(): Promise<string> {
  count += 1;
  build = `mill-${String(count)}`;
  await makeBuild(shed.owner, {
    name: `Mill ${String(count)}`,
    slug: build,
    about: '',
    plannedEpisodes: null,
  });
  return build;
}

function settings(given: Partial<ChangeBuild>): ChangeBuild {
  return {
    ...{ name: 'Mill', slug: build, about: '', plannedEpisodes: null, currency: 'GBP' },
    ...{ visibility: 'private', version: 1, ...given },
  };
}

const stages = async () => (await listStages(shed.owner, { build })).items;
const stageNames = async () => (await stages()).map(({ name }) => name);

async function threeStages(): Promise<[string, string, string]> {
  await aBuild();
  const ids: string[] = [];
  for (const name of ['Frame', 'Mill', 'Trials']) {
    ids.push((await addStage(shed.editor, { build, name, about: '' })).id);
  }
  return ids as [string, string, string];
}

describe('a build', () => {
  test.each([
    ['', 'name'],
    ['!!!', 'name'],
    ['Feed', 'slug'],
    ['Ω', 'slug'],
    ['x'.repeat(81), 'name'],
  ])('called %j is told so at its %s', (name, field) => {
    const parsed = MakeBuildInput.safeParse({ name });
    expect(parsed.error?.issues.map(({ path }) => path[0])).toContain(field);
  });

  test('whose address name is taken is told so there', async () => {
    await aBuild();
    const made = makeBuild(shed.owner, { name: 'Other', slug: build, about: '', plannedEpisodes: null });
    await expect(made).rejects.toThrow(Invalid);
    await expect(made).rejects.toHaveProperty('fields.slug');
  });

  test('moves, and its old address leads to it and is given to no other', async () => {
    const old = await aBuild();
    await changeBuild(shed.editor, { ...settings({ slug: `${old}-two` }), build: old });
    expect(await getBuild(shed.owner, { build: old })).toMatchObject({ slug: `${old}-two`, version: 2 });
    await expect(
      makeBuild(shed.owner, { name: 'Thief', slug: old, about: '', plannedEpisodes: null }),
    ).rejects.toThrow(Invalid);
    await changeBuild(shed.owner, { ...settings({ slug: old, version: 2 }), build: old });
    expect((await getBuild(shed.owner, { build: `${old}-two` })).slug).toBe(old);
  });

  test('that someone else changed is not written over', async () => {
    await aBuild();
    await changeBuild(shed.editor, { ...settings({ name: 'Theirs' }), build });
    const mine = changeBuild(shed.owner, { ...settings({ name: 'Mine' }), build });
    await expect(mine).rejects.toThrow(Conflict);
    await expect(mine).rejects.toMatchObject({ stored: { name: 'Theirs' } });
  });

  test('is seen by everyone only while it is on show', async () => {
    await aBuild();
    await expect(getPublicBuild(shed.anyone, { build })).rejects.toThrow(NotFound);
    await changeBuild(shed.owner, { ...settings({ visibility: 'public' }), build });
    expect(await getPublicBuild(shed.anyone, { build })).toMatchObject({ slug: build });
  });

  test('is deleted and brought back', async () => {
    await aBuild();
    await deleteBuild(shed.owner, { build, version: 1 });
    await expect(getBuild(shed.owner, { build })).rejects.toThrow(NotFound);
    const { items } = await listDeletedBuilds(shed.owner, undefined);
    expect(items.map(({ slug }) => slug)).toContain(build);
    await restoreBuild(shed.owner, { build });
    expect(await getBuild(shed.owner, { build })).toMatchObject({ version: 3 });
  });

  test('refuses a moderator', async () => {
    await aBuild();
    for (const asked of [
      () => changeBuild(shed.moderator, { ...settings({}), build }),
      () => deleteBuild(shed.moderator, { build, version: 1 }),
      () => restoreBuild(shed.moderator, { build }),
    ]) {
      await expect(asked()).rejects.toThrow(Forbidden);
    }
  });

  test('of another workshop is not found', async () => {
    await aBuild();
    for (const context of [shed.outsider, shed.viewer]) {
      await expect(changeBuild(context, { ...settings({}), build })).rejects.toThrow(NotFound);
      await expect(deleteBuild(context, { build, version: 1 })).rejects.toThrow(NotFound);
      await expect(restoreBuild(context, { build })).rejects.toThrow(NotFound);
    }
  });

  test('takes only currencies that there are', () => {
    expect(ChangeBuildInput.shape.currency.safeParse('EUR').success).toBe(true);
    expect(ChangeBuildInput.shape.currency.safeParse('XYZW').success).toBe(false);
  });
});

describe('a stage', () => {
  test('is added after the others, and moved up and down', async () => {
    const [frame, , trials] = await threeStages();
    expect(await stageNames()).toEqual(['Frame', 'Mill', 'Trials']);
    const { version } = await moveStage(shed.editor, { build, stage: trials, to: 'up', version: 1 });
    expect(await stageNames()).toEqual(['Frame', 'Trials', 'Mill']);
    await moveStage(shed.editor, { build, stage: trials, to: 'down', version });
    await moveStage(shed.editor, { build, stage: frame, to: 'up', version: 1 });
    expect(await stageNames()).toEqual(['Frame', 'Mill', 'Trials']);
  });

  test('that someone else changed is not written over', async () => {
    const [frame] = await threeStages();
    await changeStage(shed.editor, { build, stage: frame, name: 'Base', about: '', version: 1 });
    const stale = { build, stage: frame, version: 1 };
    await expect(changeStage(shed.owner, { ...stale, name: 'Mine', about: '' })).rejects.toThrow(Conflict);
    await expect(moveStage(shed.owner, { ...stale, to: 'down' })).rejects.toThrow(Conflict);
    await expect(deleteStage(shed.owner, stale)).rejects.toThrow(Conflict);
  });

  test('with diary entries asks where they go', async () => {
    const [frame, mill] = await threeStages();
    const entry = { build, day: '2026-11-03', text: 'cut', visibility: 'private' as const, photos: [] };
    await addEntry(shed.owner, { ...entry, stage: frame });
    expect((await stages())[0]).toMatchObject({ entries: 1 });
    await expect(deleteStage(shed.owner, { build, stage: frame, version: 1 })).rejects.toHaveProperty(
      'fields.entries',
    );
    await deleteStage(shed.owner, { build, stage: frame, version: 1, entries: mill });
    expect((await listEntries(shed.owner, { build })).items[0]?.stage).toMatchObject({ name: 'Mill' });
    await deleteStage(shed.owner, { build, stage: mill, version: 1, entries: 'none' });
    expect((await listEntries(shed.owner, { build })).items[0]?.stage).toBeNull();
    await restoreStage(shed.owner, { build, stage: mill, version: 2 });
    expect((await listEntries(shed.owner, { build })).items[0]?.stage).toMatchObject({ name: 'Mill' });
    expect(await services.db.$count(diaryEntries)).toBeGreaterThan(0);
  });

  test('refuses a moderator', async () => {
    const [frame] = await threeStages();
    const one = { build, stage: frame, version: 1 };
    for (const asked of [
      () => addStage(shed.moderator, { build, name: 'x', about: '' }),
      () => changeStage(shed.moderator, { ...one, name: 'x', about: '' }),
      () => moveStage(shed.moderator, { ...one, to: 'down' }),
      () => deleteStage(shed.moderator, one),
      () => restoreStage(shed.moderator, one),
    ]) {
      await expect(asked()).rejects.toThrow(Forbidden);
    }
  });

  test('of another build or workshop is not found', async () => {
    const [frame] = await threeStages();
    const elsewhere = { build: await aBuild(), stage: frame, version: 1 };
    for (const asked of [
      () => changeStage(shed.owner, { ...elsewhere, name: 'x', about: '' }),
      () => moveStage(shed.owner, { ...elsewhere, to: 'down' }),
      () => deleteStage(shed.owner, elsewhere),
      () => restoreStage(shed.owner, elsewhere),
      () => addStage(shed.outsider, { build, name: 'x', about: '' }),
    ]) {
      await expect(asked()).rejects.toThrow(NotFound);
    }
  });
});
