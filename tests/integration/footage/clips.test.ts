import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { cameras, clipParts, clips } from '../../../src/db/schema/footage.ts';
import { shopStretch } from '../../../src/domain/footage/place-on-clips.ts';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { ChangeClipInput, ImportClipsInput, TagClipsInput } from '../../../src/features/footage/footage.ts';
import { addClips } from '../../../src/features/footage/server/add-clips.ts';
import { addSlate } from '../../../src/features/footage/server/add-slate.ts';
import { changeCamera } from '../../../src/features/footage/server/change-camera.ts';
import { changeClip } from '../../../src/features/footage/server/change-clip.ts';
import { deleteCamera } from '../../../src/features/footage/server/delete-camera.ts';
import { deleteClip } from '../../../src/features/footage/server/delete-clip.ts';
import { getThumbnail } from '../../../src/features/footage/server/get-thumbnail.ts';
import { giveCamera } from '../../../src/features/footage/server/give-camera.ts';
import { importClips } from '../../../src/features/footage/server/import-clips.ts';
import { joinClip } from '../../../src/features/footage/server/join-clip.ts';
import { keepThumbnail } from '../../../src/features/footage/server/keep-thumbnail.ts';
import { loadFilmedClips } from '../../../src/features/footage/server/load-filmed-clips.ts';
import { partClip } from '../../../src/features/footage/server/part-clip.ts';
import { removeSlate } from '../../../src/features/footage/server/remove-slate.ts';
import { restoreCamera } from '../../../src/features/footage/server/restore-camera.ts';
import { restoreClip } from '../../../src/features/footage/server/restore-clip.ts';
import { setClipStart } from '../../../src/features/footage/server/set-clip-start.ts';
import { tagClips } from '../../../src/features/footage/server/tag-clips.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aBuildToFilm, aCamera, aClip } from '../../support/footage.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';
import sharp from 'sharp';

const services = await testServices();
const { db } = services;
let shed: TestWorkshop;
let build: string;
let buildId: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  ({ build, buildId } = await aBuildToFilm(shed.owner));
});

const kept = () => db.select().from(clips).where(eq(clips.buildId, buildId));
const versionOf = async (id: string) =>
  (await db.select({ version: clips.version }).from(clips).where(eq(clips.id, id)))[0]?.version ?? 0;
const change = (given: object) => ChangeClipInput.parse({ version: 1, ...given });

async function beginnings(): Promise<Record<string, string | null>> {
  const loaded = await loadFilmedClips(db, buildId, shed.owner.now);
  return Object.fromEntries(
    loaded.map((clip) => {
      if (clip.start === null) return [clip.name, null];
      const [from] = shopStretch({ ...clip, start: clip.start, length: clip.length ?? clip.pace });
      return [clip.name, new Date(from.valueOf()).toISOString()];
    }),
  );
}

async function aPart(): Promise<string> {
  const fields = { name: 'Shaft', kind: 'made', quantity: 1, material: '', size: '' } as const;
  return (
    await addPart(shed.owner, { build, number: '117', aliases: [], inPlans: true, remark: '', ...fields })
  ).id;
}

describe('clips that are named', () => {
  test('are kept once when they are sent again, and take what is new', async () => {
    const first = await aClip(shed.owner, build, { camera: 'Big camera' });
    const again = await aClip(shed.editor, build, { camera: 'big camera', startLabel: 90_000 });
    expect(again).toBe(first);
    expect(await kept()).toMatchObject([{ startLabel: 90_000, version: 2 }]);
  });

  test('of one name are other clips when camera, length or start differ', async () => {
    await aClip(shed.owner, build, { camera: 'Big camera' });
    await aClip(shed.owner, build, { camera: 'Small camera' });
    await aClip(shed.owner, build, { camera: 'Big camera', frames: 1501 });
    await aClip(shed.owner, build, { camera: 'Big camera', createdWall: '2026-11-03T14:22:07' });
    expect(await kept()).toHaveLength(4);
  });

  test('make the cameras they name', async () => {
    await aClip(shed.owner, build, { camera: 'Head camera' });
    const made = await db.select().from(cameras).where(eq(cameras.name, 'Head camera'));
    expect(made).toMatchObject([{ creationMeans: 'start', workshopId: shed.id }]);
  });

  test('that name no useful time are kept, and said', async () => {
    const at = { num: 25, den: 1 };
    const plain = { camera: null, frames: 10, rate: at, startLabel: null, drop: false, frameTimes: null };
    const { added, problems } = await addClips(shed.owner, {
      build,
      clips: [
        { ...plain, name: 'A.MP4', createdWall: null, createdOffset: null },
        { ...plain, name: 'B.MP4', createdWall: '1904-01-01T00:00:00', createdOffset: 0 },
        { ...plain, name: 'C.MP4', createdWall: '2036-02-07T06:28:15', createdOffset: 0 },
      ],
    });
    expect(added).toBe(3);
    expect(problems.map(({ line, text }) => [line, /not say|1904|2036/.exec(text)?.[0]])).toEqual([
      [1, 'not say'],
      [2, '1904'],
      [3, '2036'],
    ]);
    expect(await beginnings()).toEqual({ 'A.MP4': null, 'B.MP4': null, 'C.MP4': null });
  });
});

describe('a list of clips', () => {
  const take = (text: string) => importClips(shed.owner, { build, ...ImportClipsInput.parse({ text }) });

  test('is taken, with stage and parts by name, and what is wrong told by its line', async () => {
    const { id: stageId } = await addStage(shed.owner, { build, name: 'Drum', about: '' });
    await aPart();
    const answer = await take(
      [
        'name,camera,filmed,length,rate,pace,stage,parts',
        'C0001.MP4,Big,2026-11-02 14:22:07Z,1:00,25,,drum,117 999',
        'C0002.MP4,Big,yesterday,00:00:10:05,29.97,1:20,,',
        ',Big,,,,,,',
        'C0003.MP4,Big,2026-11-02 15:00,0,,,,',
      ].join('\r\n'),
    );
    expect(answer).toMatchObject({ added: 2, updated: 0 });
    expect([...new Set(answer.problems.map(({ line }) => line))]).toEqual([2, 3, 4, 5]);
    const rows = await kept();
    expect(rows).toMatchObject([
      { name: 'C0001.MP4', frames: 1500, stageId, createdWall: '2026-11-02 14:22:07' },
      { name: 'C0002.MP4', frames: 305, rateNum: 30_000, paceNum: 20, createdWall: null },
    ]);
    const tagged = await db
      .select()
      .from(clipParts)
      .where(eq(clipParts.clipId, rows[0]?.id ?? ''));
    expect(tagged).toHaveLength(1);
  });

  test.each([
    ['', 'file'],
    ['clip one\nclip two', 'text'],
    ['name\n', 'text'],
  ])('that reads %j is refused at %s', async (text, field) => {
    await expect(take(text)).rejects.toHaveProperty(`fields.${field}`);
    expect(await kept()).toEqual([]);
  });
});

describe('a clip', () => {
  test('takes a camera, a stage, parts and a pace', async () => {
    const clip = await aClip(shed.owner, build);
    const [camera, part] = [await aCamera(shed.owner, build), await aPart()];
    const { id: stage } = await addStage(shed.owner, { build, name: 'Drum', about: '' });
    await changeClip(shed.editor, { build, clip, ...change({ camera, stage, parts: part, pace: '1:20' }) });
    expect(await kept()).toMatchObject([{ cameraId: camera, stageId: stage, paceNum: 20, paceDen: 1 }]);
    await expect(changeClip(shed.owner, { build, clip, ...change({}) })).rejects.toThrow(Conflict);
  });

  test('refuses a stage, a part or a camera of elsewhere', async () => {
    const clip = await aClip(shed.owner, build);
    const part = await aPart();
    ({ build } = await aBuildToFilm(shed.owner));
    const other = await aClip(shed.owner, build);
    await expect(
      changeClip(shed.owner, { build, clip: other, ...change({ parts: part }) }),
    ).rejects.toHaveProperty('fields.parts');
    await expect(
      changeClip(shed.owner, { build, clip: other, ...change({ stage: clip }) }),
    ).rejects.toHaveProperty('fields.stage');
    await expect(
      changeClip(shed.owner, { build, clip: other, ...change({ camera: clip }) }),
    ).rejects.toHaveProperty('fields.camera');
  });

  test('is tagged together with others, and keeps the parts it has', async () => {
    const [one, two] = [await aClip(shed.owner, build), await aClip(shed.owner, build, { name: 'C2.MP4' })];
    const part = await aPart();
    const { id: stage } = await addStage(shed.owner, { build, name: 'Drum', about: '' });
    await tagClips(shed.owner, { build, ...TagClipsInput.parse({ clips: [one], parts: part }) });
    await tagClips(shed.owner, { build, ...TagClipsInput.parse({ clips: [one, two], stage }) });
    expect((await kept()).map(({ stageId }) => stageId)).toEqual([stage, stage]);
    expect(await db.select().from(clipParts).where(eq(clipParts.clipId, one))).toHaveLength(1);
  });

  test('begins when it is set or nudged by hand, and goes back to its camera', async () => {
    const clip = await aClip(shed.owner, build, { createdWall: '2026-07-02T14:22:07' });
    const set = (given: object) =>
      setClipStart(shed.owner, { build, clip, at: '', by: 0, version: 1, ...given });
    await set({ at: '2026-07-02 09:00:00' });
    expect(await beginnings()).toEqual({ 'C0001.MP4': '2026-07-02T08:00:00.000Z' });
    await set({ by: -1.5, version: 2 });
    expect(await beginnings()).toEqual({ 'C0001.MP4': '2026-07-02T07:59:58.500Z' });
    await set({ version: 3 });
    expect(await beginnings()).toEqual({ 'C0001.MP4': '2026-07-02T14:22:07.000Z' });
    await expect(set({ at: 'noon', version: 4 })).rejects.toHaveProperty('fields.at');
  });

  test('that nothing says the start of cannot be nudged', async () => {
    const clip = await aClip(shed.owner, build, { createdWall: null });
    await expect(setClipStart(shed.owner, { build, clip, at: '', by: 2, version: 1 })).rejects.toHaveProperty(
      'fields.by',
    );
  });

  test('is deleted and brought back', async () => {
    const clip = await aClip(shed.owner, build);
    const { version } = await deleteClip(shed.owner, { build, clip, version: 1 });
    expect(await beginnings()).toEqual({});
    await restoreClip(shed.owner, { build, clip, version });
    expect(Object.keys(await beginnings())).toEqual(['C0001.MP4']);
  });

  test('that was split goes on where the one before it ends', async () => {
    const camera = { camera: 'Splitter' };
    const before = await aClip(shed.owner, build, camera);
    const clip = await aClip(shed.owner, build, { ...camera, name: 'C0002.MP4' });
    await joinClip(shed.owner, { build, clip, before, version: 1 });
    expect((await beginnings())['C0002.MP4']).toBe('2026-11-02T14:23:07.000Z');
    await expect(
      joinClip(shed.owner, { build, clip: before, before: clip, version: 1 }),
    ).rejects.toHaveProperty('fields.before');
    await expect(deleteClip(shed.owner, { build, clip: before, version: 1 })).rejects.toThrow(Invalid);
    await partClip(shed.owner, { build, clip, version: 2 });
    expect((await beginnings())['C0002.MP4']).toBe('2026-11-02T14:22:07.000Z');
  });

  test('keeps a small picture, made anew', async () => {
    const clip = await aClip(shed.owner, build);
    await expect(getThumbnail(shed.owner, { build, clip })).rejects.toThrow(NotFound);
    const picture = sharp({ create: { width: 400, height: 225, channels: 3, background: '#888' } });
    const jpeg = (await picture.jpeg().toBuffer()).toString('base64');
    await keepThumbnail(shed.owner, { build, clip, jpeg });
    const { jpeg: stored } = await getThumbnail(shed.moderator, { build, clip });
    expect(await sharp(stored).metadata()).toMatchObject({ format: 'jpeg', width: 320 });
    await expect(
      keepThumbnail(shed.owner, { build, clip, jpeg: Buffer.from('shavings').toString('base64') }),
    ).rejects.toHaveProperty('fields.jpeg');
  });
});

describe('a camera', () => {
  test('sets all its clips right when its times are said to mean something else', async () => {
    const camera = await aCamera(shed.owner, build, { name: 'Old one' });
    await aClip(shed.owner, build, { camera: 'old one', createdWall: '2026-07-02T14:22:07' });
    const fields = { name: 'Old one', timeZone: null };
    await changeCamera(shed.owner, {
      build,
      camera,
      ...fields,
      creationMeans: 'end',
      localAsUtc: true,
      version: 1,
    });
    expect(await beginnings()).toEqual({ 'C0001.MP4': '2026-07-02T13:21:07.000Z' });
  });

  test('has a name of its own, and stays while clips are of it', async () => {
    const camera = await aCamera(shed.owner, build, { name: 'Phone' });
    await expect(aCamera(shed.owner, build, { name: 'PHONE' })).rejects.toHaveProperty('fields.name');
    const clip = await aClip(shed.owner, build, { camera: 'Phone' });
    await expect(deleteCamera(shed.owner, { build, camera, version: 1 })).rejects.toThrow(Invalid);
    await deleteClip(shed.owner, { build, clip, version: 1 });
    const { version } = await deleteCamera(shed.owner, { build, camera, version: 1 });
    await restoreCamera(shed.owner, { build, camera, version });
    await expect(deleteCamera(shed.owner, { build, camera, version: 1 })).rejects.toThrow(Conflict);
  });

  test('is set right by slates on its clips, and goes back when they are taken away', async () => {
    const camera = { camera: 'Slated' };
    const clip = await aClip(shed.owner, build, camera);
    await aClip(shed.owner, build, { ...camera, name: 'C0002.MP4', createdWall: '2026-11-02T15:00:00' });
    const shopMs = Date.UTC(2026, 10, 2, 14, 22, 21, 400);
    const { id: slate } = await addSlate(shed.owner, {
      build,
      clip,
      frame: 50,
      moment: '',
      shows: '',
      shopMs,
      readBy: 'code',
    });
    expect((await beginnings())['C0002.MP4']).toBe('2026-11-02T15:00:12.400Z');
    await removeSlate(shed.owner, { build, clip, slate });
    expect((await beginnings())['C0002.MP4']).toBe('2026-11-02T15:00:00.000Z');
  });

  test('reads a slate that was typed, and refuses what is no moment or no time', async () => {
    const clip = await aClip(shed.owner, build);
    const typed = (moment: string, shows: string) =>
      addSlate(shed.owner, { build, clip, moment, shows, readBy: 'hand' });
    await expect(typed('2:00', '2026-11-02 14:22:09')).rejects.toHaveProperty('fields.moment');
    await expect(typed('0:02', 'noon')).rejects.toHaveProperty('fields.shows');
    await typed('0:02', '2026-11-02 14:22:10');
    expect(await beginnings()).toEqual({ 'C0001.MP4': '2026-11-02T14:22:08.000Z' });
  });
});

describe('who may not', () => {
  const attempts = (who: TestWorkshop['owner'], on: { clip: string; camera: string; slate: string }) => {
    const { clip, camera, slate } = on;
    const ref = { build, clip, version: 1 };
    return {
      addCamera: () => aCamera(who, build),
      changeCamera: () =>
        changeCamera(who, {
          build,
          camera,
          version: 1,
          name: 'x',
          creationMeans: 'start',
          localAsUtc: false,
          timeZone: null,
        }),
      deleteCamera: () => deleteCamera(who, { build, camera, version: 1 }),
      restoreCamera: () => restoreCamera(who, { build, camera, version: 1 }),
      addClips: () => aClip(who, build),
      importClips: () => importClips(who, { build, ...ImportClipsInput.parse({ text: 'name\nA' }) }),
      changeClip: () => changeClip(who, { build, clip, ...change({}) }),
      tagClips: () => tagClips(who, { build, ...TagClipsInput.parse({ clips: [clip] }) }),
      setClipStart: () => setClipStart(who, { ...ref, at: '', by: 0 }),
      deleteClip: () => deleteClip(who, ref),
      restoreClip: () => restoreClip(who, ref),
      joinClip: () => joinClip(who, { ...ref, before: clip }),
      partClip: () => partClip(who, ref),
      giveCamera: () => giveCamera(who, ref),
      keepThumbnail: () => keepThumbnail(who, { build, clip, jpeg: '' }),
      addSlate: () =>
        addSlate(who, { build, clip, frame: 0, moment: '', shows: '', shopMs: 1, readBy: 'hand' }),
      removeSlate: () => removeSlate(who, { build, clip, slate }),
    };
  };

  async function aFilmedBuild(owner: TestWorkshop['owner']) {
    const clip = await aClip(owner, build, { camera: 'Of them' });
    const camera = await aCamera(owner, build);
    const slate = await addSlate(owner, {
      build,
      clip,
      frame: 0,
      moment: '',
      shows: '',
      shopMs: 1,
      readBy: 'hand',
    });
    return { clip, camera, slate: slate.id };
  }

  test('a moderator is refused', async () => {
    const on = await aFilmedBuild(shed.owner);
    for (const attempt of Object.values(attempts(shed.moderator, on)))
      await expect(attempt()).rejects.toThrow(Forbidden);
  });

  test('another workshop does not find them, nor its own things with their ids', async () => {
    const on = await aFilmedBuild(shed.owner);
    const other = await aWorkshop(services);
    for (const attempt of Object.values(attempts(other.owner, on)))
      await expect(attempt()).rejects.toThrow(NotFound);
    ({ build } = await aBuildToFilm(other.owner));
    const own = attempts(other.owner, on);
    const { addCamera: _a, addClips: _b, importClips: _c, ...others } = own;
    for (const attempt of Object.values(others)) await expect(attempt()).rejects.toThrow(NotFound);
    expect(await versionOf(on.clip)).toBe(1);
  });
});
