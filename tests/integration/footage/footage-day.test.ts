import { beforeAll, beforeEach, expect, test } from 'vitest';
import { ChangeClipInput } from '../../../src/features/footage/footage.ts';
import { addSlate } from '../../../src/features/footage/server/add-slate.ts';
import { changeClip } from '../../../src/features/footage/server/change-clip.ts';
import { getClip } from '../../../src/features/footage/server/get-clip.ts';
import { getFootageDay } from '../../../src/features/footage/server/get-footage-day.ts';
import { listCameras } from '../../../src/features/footage/server/list-cameras.ts';
import { NotFound } from '../../../src/server/errors.ts';
import { aBuildToFilm, aClip, filmADay } from '../../support/footage.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  ({ build } = await aBuildToFilm(shed.owner));
});

test('clips stand on the day of the shop they began on, in its order, with what is not filmed', async () => {
  await filmADay(shed.owner, build);
  // Half past midnight in summer, by the shop’s clock.
  await aClip(shed.owner, build, { name: 'L.MP4', createdWall: '2026-07-02T23:30:00' });
  const day = await getFootageDay(shed.moderator, { build });
  expect(day.days).toEqual([
    { day: '2026-11-02', clips: 3 },
    { day: '2026-07-03', clips: 1 },
  ]);
  expect(day.day).toBe('2026-11-02');
  expect(day.clips.map(({ name }) => name)).toEqual(['C0001.MP4', 'TL_0012.MP4', 'C0002.MP4']);
  expect(day.stretches).toMatchObject([{ sign: 'diary', text: 'Filing the keyway.' }]);
  expect(day).toMatchObject({ unknown: 1, total: 5 });
  const unknown = await getFootageDay(shed.owner, { build, day: 'unknown' });
  expect(unknown.clips.map(({ name, problem }) => [name, problem])).toEqual([
    ['C0003.MP4', expect.stringContaining('1904')],
  ]);
});

test('only the clips of a camera or a stage are shown when they are asked for', async () => {
  await filmADay(shed.owner, build);
  const { cameras, gaps } = await getFootageDay(shed.owner, { build });
  const small = cameras.find(({ name }) => name === 'Small camera');
  const shown = await getFootageDay(shed.owner, { build, camera: small?.id });
  expect(shown.clips.map(({ name }) => name)).toEqual(['TL_0012.MP4']);
  // What another camera filmed is filmed, whether it is shown or not.
  expect(gaps.length).toBeGreaterThan(0);
  expect(shown.gaps).toEqual(gaps);
});

test('a camera says how far its clock is off, and by how much more each day', async () => {
  const camera = { camera: 'Drifter' };
  const slate = async (name: string, createdWall: string, shopMs: number) => {
    const clip = await aClip(shed.owner, build, { ...camera, name, createdWall });
    await addSlate(shed.owner, { build, clip, frame: 0, moment: '', shows: '', shopMs, readBy: 'code' });
  };
  const off = async () =>
    (await listCameras(shed.owner, { build })).items.find(({ name }) => name === 'Drifter');
  await slate('1.MP4', '2026-11-02T12:00:00', Date.UTC(2026, 10, 2, 12, 0, 12, 400));
  expect(await off()).toMatchObject({ offset: 12.4, drift: null, clips: 1 });
  await slate('2.MP4', '2026-11-03T12:00:00', Date.UTC(2026, 10, 3, 12, 0, 13, 200));
  expect(await off()).toMatchObject({ offset: 13.2, drift: 0.8, clips: 2 });
});

test('a clip that its camera split is offered to be joined to the one before', async () => {
  const camera = { camera: 'Splitter two' };
  const first = await aClip(shed.owner, build, camera);
  const second = await aClip(shed.owner, build, {
    ...camera,
    name: 'C0002.MP4',
    createdWall: '2026-11-02T14:23:07',
  });
  expect((await getClip(shed.owner, { build, clip: second })).proposedBefore?.id).toBe(first);
  await changeClip(shed.owner, { build, clip: first, ...ChangeClipInput.parse({ version: 1 }) });
  expect((await getClip(shed.owner, { build, clip: second })).proposedBefore).toBeNull();
});

test('another workshop does not find them', async () => {
  const clip = await filmADay(shed.owner, build);
  const other = await aWorkshop(services);
  await expect(getFootageDay(other.owner, { build })).rejects.toThrow(NotFound);
  await expect(listCameras(other.owner, { build })).rejects.toThrow(NotFound);
  const elsewhere = await aBuildToFilm(other.owner);
  await expect(getClip(other.owner, { build: elsewhere.build, clip })).rejects.toThrow(NotFound);
});
