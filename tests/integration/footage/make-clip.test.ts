import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { files } from '../../../src/db/schema/files.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { makeClip } from '../../../src/features/footage/server/make-clip.ts';
import { aBuildToFilm, aClip } from '../../support/footage.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let buildId: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  ({ build, buildId } = await aBuildToFilm(shed.owner));
});

async function aFile(given: Partial<typeof files.$inferInsert> = {}): Promise<string> {
  const id = newId();
  const film = { name: 'C0001.MP4', bytes: 9, state: 'ready', kind: 'video', purpose: 'footage' } as const;
  const length = { durationFrames: 1500, rateNum: 25, rateDen: 1 };
  await services.db.insert(files).values({ id, workshopId: shed.id, buildId, ...film, ...length, ...given });
  return id;
}
const made = () => services.db.select().from(clips).where(eq(clips.buildId, buildId));
const utc = { wallTime: '2026-11-02T14:22:07', offset: null, assumedZone: 'UTC' };

test('a film that was sent makes its clip, once', async () => {
  const fileId = await aFile({ probe: { camera: utc, timecode: '01:00:00:00' } });
  await makeClip(services, { fileId });
  await makeClip(services, { fileId });
  expect(await made()).toMatchObject([
    {
      fileId,
      frames: 1500,
      startLabel: 90_000,
      createdWall: '2026-11-02 14:22:07',
      createdOffset: 0,
    },
  ]);
});

test.each([
  ['the camera’s own zone', { ...utc, offset: '+01:00', assumedZone: null }, 60],
  ['no zone', { ...utc, assumedZone: 'Europe/London' }, null],
])('with %s the clip keeps what it says', async (_, camera, createdOffset) => {
  await makeClip(services, { fileId: await aFile({ probe: { camera } }) });
  expect(await made()).toMatchObject([{ createdOffset }]);
});

test('a clip that was named before takes its file', async () => {
  const clip = await aClip(shed.owner, build);
  const fileId = await aFile({ probe: { camera: utc } });
  await makeClip(services, { fileId });
  expect(await made()).toMatchObject([{ id: clip, fileId }]);
});

test('a photo, or a film of an episode, makes none', async () => {
  await makeClip(services, { fileId: await aFile({ purpose: 'episode' }) });
  await makeClip(services, { fileId: await aFile({ kind: 'photo' }) });
  await makeClip(services, { fileId: newId() });
  expect(await made()).toEqual([]);
});
