import { beforeAll, describe, expect, test } from 'vitest';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { changeBuild } from '../../../src/features/builds/server/change-build.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { PartInput } from '../../../src/features/parts/part.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { addWorksheet } from '../../../src/features/worksheets/server/add-worksheet.ts';
import { changeWorksheet } from '../../../src/features/worksheets/server/change-worksheet.ts';
import { deleteWorksheet } from '../../../src/features/worksheets/server/delete-worksheet.ts';
import { getBuildMass } from '../../../src/features/worksheets/server/get-build-mass.ts';
import { getPublicWorksheet } from '../../../src/features/worksheets/server/get-public-worksheet.ts';
import { listOwners } from '../../../src/features/worksheets/server/list-owners.ts';
import { listPublicWorksheets } from '../../../src/features/worksheets/server/list-public-worksheets.ts';
import { listWorksheets } from '../../../src/features/worksheets/server/list-worksheets.ts';
import { restoreWorksheet } from '../../../src/features/worksheets/server/restore-worksheet.ts';
import { type AddWorksheet, AddWorksheetInput } from '../../../src/features/worksheets/worksheet.ts';
import { Conflict, Forbidden, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let other: TestWorkshop;
let build: string;
let count = 0;

const FIT: AddWorksheet = {
  sheet: 'fits',
  title: 'Drum shaft in its bearing',
  inputs: { size: '25', hole: 'H7', shaft: 'k6' },
  of: null,
  visibility: 'private',
};

beforeAll(async () => {
  shed = await aWorkshop(services);
  other = await aWorkshop(services);
});

async function aBuild(): Promise<void> {
  count += 1;
  build = `press-${String(count)}`;
  await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
}

const kept = async () => (await listWorksheets(shed.owner, { build })).items;

describe('a worksheet', () => {
  test('is kept with a build as it was typed', async () => {
    await aBuild();
    const { id } = await addWorksheet(shed.editor, { ...FIT, build });
    expect(await kept()).toEqual([{ id, ...FIT, version: 1 }]);
  });

  test('belongs to a stage, and is named after it', async () => {
    await aBuild();
    const { id: stage } = await addStage(shed.owner, { build, name: 'Drum', about: '' });
    const { items } = await listOwners(shed.owner, { build });
    expect(items).toEqual([{ value: `stage:${stage}`, label: 'Stage: Drum' }]);
    await addWorksheet(shed.owner, { ...FIT, of: { kind: 'stage', id: stage }, build });
    expect((await kept())[0]?.of).toEqual({ kind: 'stage', id: stage, name: 'Drum' });
    await aBuild();
    await expect(
      addWorksheet(shed.owner, { ...FIT, of: { kind: 'stage', id: stage }, build }),
    ).rejects.toHaveProperty('fields.of');
  });

  test('that someone else saved meanwhile is not written over', async () => {
    await aBuild();
    const { id } = await addWorksheet(shed.owner, { ...FIT, build });
    const first = { ...FIT, inputs: { size: '30', hole: 'H7' }, build, worksheet: id, version: 1 };
    await changeWorksheet(shed.editor, first);
    await expect(changeWorksheet(shed.owner, { ...first, title: 'Mine' })).rejects.toThrow(Conflict);
    expect(await kept()).toMatchObject([
      { title: FIT.title, inputs: { size: '30', hole: 'H7' }, version: 2 },
    ]);
  });

  test('is deleted and brought back', async () => {
    await aBuild();
    const { id } = await addWorksheet(shed.owner, { ...FIT, build });
    await deleteWorksheet(shed.owner, { build, worksheet: id, version: 1 });
    expect(await kept()).toEqual([]);
    await restoreWorksheet(shed.owner, { build, worksheet: id, version: 2 });
    expect(await kept()).toHaveLength(1);
  });

  test('is seen by everyone only when it and its build are public', async () => {
    await aBuild();
    const { id } = await addWorksheet(shed.owner, { ...FIT, visibility: 'public', build });
    await addWorksheet(shed.owner, { ...FIT, title: 'For the team', build });
    await expect(getPublicWorksheet(shed.anyone, { build, worksheet: id })).rejects.toThrow(NotFound);
    const settings = { name: 'Press', slug: build, about: '', plannedEpisodes: null, currency: 'GBP' };
    await changeBuild(shed.owner, { ...settings, build, visibility: 'public', version: 1 });
    expect((await getPublicWorksheet(shed.anyone, { build, worksheet: id })).worksheet.title).toBe(FIT.title);
    expect((await listPublicWorksheets(shed.anyone, { build })).items).toHaveLength(1);
  });

  test('of a plain form gathers the inputs of its sheet', () => {
    const form = { sheet: 'fits', title: ' Shaft ', of: '', visibility: 'public', size: '25', hole: 'H7' };
    expect(AddWorksheetInput.parse(form)).toEqual({
      ...FIT,
      title: 'Shaft',
      inputs: { size: '25', hole: 'H7' },
      visibility: 'public',
    });
  });

  test.each([
    [{ sheet: 'bridge' }, 'sheet'],
    [{ title: '' }, 'title'],
    [{ of: 'stage:1' }, 'of'],
    [{ inputs: { size: 'x'.repeat(201) } }, 'inputs'],
    [{ visibility: 'friends' }, 'visibility'],
  ])('that says %j is told so at its field', (given, field) => {
    const parsed = AddWorksheetInput.safeParse({ ...FIT, of: '', ...given });
    expect(parsed.error?.issues.map(({ path }) => path[0])).toContain(field);
  });
});

describe('keeping, changing, deleting and bringing back a worksheet', () => {
  const verbs = {
    keeping: (context: TestWorkshop['owner']) => addWorksheet(context, { ...FIT, build }),
    changing: (context: TestWorkshop['owner'], worksheet: string) =>
      changeWorksheet(context, { ...FIT, build, worksheet, version: 1 }),
    deleting: (context: TestWorkshop['owner'], worksheet: string) =>
      deleteWorksheet(context, { build, worksheet, version: 1 }),
    'bringing back': (context: TestWorkshop['owner'], worksheet: string) =>
      restoreWorksheet(context, { build, worksheet, version: 1 }),
  };

  test.each(Object.entries(verbs))(
    '%s refuses a moderator, and is not there for a viewer',
    async (_name, run) => {
      await aBuild();
      const { id } = await addWorksheet(shed.owner, { ...FIT, build });
      await expect(run(shed.moderator, id)).rejects.toThrow(Forbidden);
      await expect(run(shed.viewer, id)).rejects.toThrow(NotFound);
    },
  );

  test.each(Object.entries(verbs))('%s does not find another workshop’s', async (_name, run) => {
    await aBuild();
    const { id } = await addWorksheet(shed.owner, { ...FIT, build });
    await expect(run(other.owner, id)).rejects.toThrow(NotFound);
  });
});

test('the mass of a build is that of the sections in its parts list', async () => {
  await aBuild();
  const bar = PartInput.parse({
    number: '101',
    name: 'rail',
    kind: 'made',
    quantity: 2,
    material: '50 x 12 flat',
    size: '1000 mm',
  });
  await addPart(shed.owner, { ...bar, build });
  const mass = await getBuildMass(shed.editor, { build });
  expect(mass.kg).toBeCloseTo(9.42, 2);
  await expect(getBuildMass(other.owner, { build })).rejects.toThrow(NotFound);
});
