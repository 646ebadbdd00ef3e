import { eq } from 'drizzle-orm';
import { buffer } from 'node:stream/consumers';
import sharp from 'sharp';
import { beforeEach, describe, expect, test } from 'vitest';
import { clips, slates } from '../../../src/db/schema/footage.ts';
import { addSlate } from '../../../src/features/footage/server/add-slate.ts';
import { getClip } from '../../../src/features/footage/server/get-clip.ts';
import { giveCamera } from '../../../src/features/footage/server/give-camera.ts';
import { loadFilmedClips } from '../../../src/features/footage/server/load-filmed-clips.ts';
import { makeClip } from '../../../src/features/footage/server/make-clip.ts';
import { Conflict } from '../../../src/server/errors.ts';
import { keyOf } from '../../../src/server/storage/storage.ts';
import { aBuildToFilm, aCamera, aClip } from '../../support/footage.ts';
import { makeFilm, makeMedia, makeSound } from '../../support/media-samples.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { uploadAndCheck } from '../../support/uploads.ts';

const services = await storageServices();
const shed = await aWorkshop(services);
let build: string;
let buildId: string;

beforeEach(async () => {
  ({ build, buildId } = await aBuildToFilm(shed.owner));
});

/** Sends a film as footage and lets the worker read it and make its clip. */
async function send(name: string, bytes: Uint8Array) {
  const { file, variants } = await uploadAndCheck(shed.owner, build, name, bytes);
  await makeClip(services, { fileId: file.id });
  const made = await services.db.select().from(clips).where(eq(clips.buildId, buildId));
  return { file, variants, made, clip: made.find(({ fileId }) => fileId === file.id) };
}

const QUICK = ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p'];
/** Fifty pictures whose times are moved. @param times of frame N in seconds @param turned so many are decoded out of order */
const uneven = (name: string, times: string, turned = 0) =>
  makeMedia(
    name,
    '-f',
    'lavfi',
    '-i',
    `testsrc2=size=160x90:rate=25:duration=2,settb=1/1000,setpts='(${times})*1000'`,
    '-vsync',
    'vfr',
    '-enc_time_base',
    '1/1000',
    ...QUICK,
    '-bf',
    String(turned),
  );

describe('a film whose frames come unevenly', () => {
  test.each(['phone.mp4', 'phone.mkv'])(
    '(%s) keeps when each begins, and counts in milliseconds where its average is no listed rate',
    async (name) => {
      const { clip, file } = await send(name, await uneven(name, 'if(lt(N,25),N/25,1+(N-25)/10)', 2));
      expect(file).toMatchObject({ state: 'ready', probe: { variableRate: true } });
      expect(clip).toMatchObject({ rateNum: 1000, rateDen: 1 });
      // A slate is read from the picture that stands at its moment.
      const slate = { moment: '1.07', shows: '2026-11-02 14:22:09', readBy: 'hand' } as const;
      await addSlate(shed.owner, { build, clip: clip?.id ?? '', ...slate });
      const read = await services.db
        .select()
        .from(slates)
        .where(eq(slates.clipId, clip?.id ?? ''));
      expect(read).toMatchObject([{ frame: 1000 }]);
      expect(clip?.frameTimes).toHaveLength(50);
      expect(clip?.frameTimes?.slice(23, 28)).toEqual([920, 960, 1000, 1100, 1200]);
      expect(Math.abs((clip?.frames ?? 0) - 3400)).toBeLessThanOrEqual(100);
    },
  );

  test('counts frames where its average is a listed rate, and they keep their own times', async () => {
    const { clip } = await send('cut.mp4', await uneven('cut.mp4', 'if(lt(N,25),N/50,0.54+(N-25)*0.06)'));
    expect(clip).toMatchObject({ rateNum: 25, rateDen: 1, frames: 50 });
    expect(clip?.frameTimes?.slice(23, 27)).toEqual([460, 480, 540, 600]);
    const [loaded] = await loadFilmedClips(services.db, buildId);
    expect(loaded?.frameTimes?.[26]).toBe(600);
  });

  test('is told from one whose frames come evenly, which keeps none', async () => {
    const { clip, variants, file } = await send('C1.mp4', await makeFilm('C1.mp4'));
    expect(clip?.frameTimes).toBeNull();
    expect(Object.keys(variants)).not.toContain('frame-times');
    expect(file.probe).toMatchObject({ variableRate: false });
  });
});

describe('what a camera wrote into its film', () => {
  const tagged = (name: string, ...tags: string[]) =>
    makeFilm(name, ...tags.flatMap((tag) => ['-metadata', tag]), '-movflags', 'use_metadata_tags');
  const MARRAM = ['com.apple.quicktime.make=Marram', 'com.apple.quicktime.model=Shed One'];

  test('gives the clip the camera that the workshop knows by that name', async () => {
    const camera = await aCamera(shed.owner, build, { name: 'marram SHED one' });
    const { clip } = await send('C2.mov', await tagged('C2.mov', ...MARRAM));
    expect(clip?.cameraId).toBe(camera);
  });

  test('is kept where no camera has that name, and none is made', async () => {
    const { clip, file } = await send('C3.mov', await tagged('C3.mov', 'make=Tarn', 'model=Tarn Two'));
    expect(file.probe).toMatchObject({ filmedWith: 'Tarn Two' });
    expect(clip?.cameraId).toBeNull();
    const ref = { build, clip: clip?.id ?? '' };
    expect(await getClip(shed.owner, ref)).toMatchObject({ filmedWith: 'Tarn Two', camera: null });
    await giveCamera(shed.owner, { ...ref, version: 1 });
    expect(await getClip(shed.owner, ref)).toMatchObject({ camera: { name: 'Tarn Two' } });
    await expect(giveCamera(shed.owner, { ...ref, version: 1 })).rejects.toThrow(Conflict);
    const silent = await aClip(shed.owner, build);
    const attempt = giveCamera(shed.owner, { build, clip: silent, version: 1 });
    await expect(attempt).rejects.toHaveProperty('fields.camera');
  });

  test('gives the first label with drop frame, and the moment with the camera’s own zone', async () => {
    const ntsc = ['-r', '30000/1001', '-timecode', '01:00:00;02'];
    const written = 'com.apple.quicktime.creationdate=2026-11-02T14:22:07+0100';
    const tags = ['-metadata', written, '-metadata', 'creation_time=2026-11-02T13:22:07Z'];
    const bytes = await makeFilm('C4.mov', ...ntsc, ...tags, '-movflags', 'use_metadata_tags');
    const { clip } = await send('C4.mov', bytes);
    expect(clip).toMatchObject({
      startLabel: 107_894,
      drop: true,
      createdWall: '2026-11-02 14:22:07',
      createdOffset: 60,
    });
  });

  test('in UTC is kept as UTC', async () => {
    const bytes = await tagged('C5.mp4', 'creation_time=2026-11-02T13:22:07.000000Z');
    const { clip } = await send('C5.mp4', bytes);
    expect(clip).toMatchObject({ createdWall: '2026-11-02 13:22:07', createdOffset: 0 });
  });

  test('finds the clip that was named before with its camera and in another zone', async () => {
    const named = { name: 'C6.mov', frames: 50, createdWall: '2026-11-02T13:22:07', camera: 'Big camera' };
    const clip = await aClip(shed.owner, build, named);
    const written = 'com.apple.quicktime.creationdate=2026-11-02T14:22:07+0100';
    const { made, file } = await send('C6.mov', await tagged('C6.mov', written, ...MARRAM));
    expect(made).toMatchObject([{ id: clip, fileId: file.id }]);
  });
});

describe('the sound of footage', () => {
  test.each([
    ['C7.mp4', () => makeFilm('C7.mp4')],
    ['memo.wav', () => makeSound('memo.wav')],
  ])('of %s is drawn small, in one colour on nothing', async (name, make) => {
    const { file, variants } = await send(name, await make());
    expect(variants['waveform']).toMatchObject({ contentType: 'image/webp', width: 960, height: 60 });
    expect(variants['waveform']?.bytes).toBeLessThan(40 * 1024);
    const picture = await buffer(await services.storage.read(keyOf(shed.id, file.id, 'waveform')));
    const pixels = await sharp(picture).raw().toBuffer();
    const colours = new Set<string>();
    for (let at = 0; at < pixels.length; at += 4)
      colours.add(pixels[at + 3] === 0 ? 'nothing' : pixels.subarray(at, at + 3).toString('hex'));
    expect([...colours].sort()).toEqual(['76858c', 'nothing']);
  });

  test('is not drawn where there is none', async () => {
    const { variants } = await send('dumb.mp4', await makeFilm('dumb.mp4', '-an'));
    expect(Object.keys(variants)).not.toContain('waveform');
  });
});
