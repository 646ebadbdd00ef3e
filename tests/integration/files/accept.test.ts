import { buffer } from 'node:stream/consumers';
import { PDFDocument } from 'pdf-lib';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { incomingKey, keyOf } from '../../../src/server/storage/storage.ts';
import { look, makeFilm, makeHeic, makeMedia, makePhoto, makeSound } from '../../support/media-samples.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { aBuild, check, rowOf, upload, uploadAndCheck } from '../../support/uploads.ts';

const services = await storageServices();
const workshop = await aWorkshop(services);
const build = (await aBuild(services, workshop.id)).slug;
const { editor } = workshop;

async function kept(id: string, variant: string): Promise<Buffer> {
  return buffer(await services.storage.read(keyOf(workshop.id, id, variant)));
}

describe('A photo', () => {
  test.each(['jpeg', 'png', 'webp'] as const)(
    'in %s is kept in three sizes without place or device',
    async (format) => {
      const original = await makePhoto(format, 3000, 1500);
      expect((await sharp(original).metadata()).exif).toBeDefined();
      const { file, variants } = await uploadAndCheck(editor, build, `bearing.${format}`, original);
      expect(file).toMatchObject({ state: 'ready', kind: 'photo', width: 3000, height: 1500, failure: null });
      expect(Object.keys(variants).sort()).toEqual(['large', 'medium', 'original', 'thumb']);
      for (const [variant, edge] of [
        ['thumb', 320],
        ['medium', 960],
        ['large', 2048],
      ] as const) {
        const { width, exif, xmp, iptc } = await sharp(await kept(file.id, variant)).metadata();
        expect([width, exif, xmp, iptc]).toEqual([edge, undefined, undefined, undefined]);
      }
      expect(await kept(file.id, 'original')).toEqual(original);
      expect(await services.storage.sizeOf(incomingKey(workshop.id, file.id))).toBeNull();
    },
  );

  test("keeps the camera's wall clock, the zone assumed and no offset apart", async () => {
    const { file } = await uploadAndCheck(editor, build, 'seat.jpg', await makePhoto());
    expect(file.probe).toEqual({
      camera: { wallTime: '2026-03-14T14:22:07', offset: null, assumedZone: 'Europe/London' },
    });
  });

  test('is turned upright', async () => {
    const turned = await sharp(await makePhoto('jpeg', 640, 320))
      .withMetadata({ orientation: 6 })
      .toBuffer();
    const { file } = await uploadAndCheck(editor, build, 'upright.jpg', turned);
    expect([file.width, file.height]).toEqual([320, 640]);
    const { width, height } = await sharp(await kept(file.id, 'large')).metadata();
    expect([width, height]).toEqual([320, 640]);
  });

  test('of a phone in HEIC is unpacked and turned upright once', async () => {
    const turned = await sharp(await makePhoto('jpeg', 640, 320))
      .withMetadata({ orientation: 6 })
      .toBuffer();
    const { file, variants } = await uploadAndCheck(editor, build, 'IMG_0101.HEIC', await makeHeic(turned));
    expect(file).toMatchObject({ state: 'ready', kind: 'photo', contentType: 'image/heic', failure: null });
    expect(Object.keys(variants).sort()).toEqual(['large', 'medium', 'original', 'thumb']);
    expect((await sharp(await kept(file.id, 'large')).metadata()).exif).toBeUndefined();
    const half = (await makeHeic(turned)).subarray(0, 300);
    expect((await uploadAndCheck(editor, build, 'half.HEIC', half)).file).toMatchObject({ state: 'failed' });
  });

  test('that carries a web page behind its picture gives copies without it', async () => {
    const evil = Buffer.concat([await makePhoto(), Buffer.from('<script>alert(1)</script>')]);
    const { file } = await uploadAndCheck(editor, build, 'gusset.jpg', evil);
    expect(file.state).toBe('ready');
    for (const variant of ['thumb', 'medium', 'large'])
      expect((await kept(file.id, variant)).includes('<script>')).toBe(false);
  });
});

describe('A film', () => {
  test('that plays as it is keeps its streams, and loses place, device and chapters', async () => {
    const place = [
      '-metadata',
      'location=+52.65+001.28/',
      '-metadata',
      'com.apple.quicktime.make=Marram',
      '-metadata',
      'creation_time=2026-03-14T14:22:07Z',
    ];
    const original = await makeFilm(
      'C0043.mov',
      ...place,
      '-movflags',
      'use_metadata_tags',
      '-timecode',
      '01:00:00:00',
    );
    expect(original.includes('+52.65')).toBe(true);
    const { file, variants } = await uploadAndCheck(editor, build, 'C0043.mov', original);
    expect(file).toMatchObject({
      state: 'ready',
      kind: 'video',
      width: 320,
      height: 180,
      durationFrames: 50,
      rateNum: 25,
      rateDen: 1,
    });
    expect(file.probe).toMatchObject({
      copied: true,
      videoCodec: 'h264',
      timecode: '01:00:00:00',
      camera: { wallTime: '2026-03-14T14:22:07', offset: null, assumedZone: 'UTC' },
    });
    const made = ['filmstrip', 'original', 'poster', 'thumb', 'video', 'waveform'];
    expect(Object.keys(variants).sort()).toEqual(made);
    expect(variants['filmstrip']).toMatchObject({ frames: 2, height: 90, width: 320 });
    const video = await kept(file.id, 'video');
    const traces = ['+52.65', 'Marram', 'Lavf', 'Lavc', 'x264'];
    expect(traces.filter((trace) => video.includes(trace))).toEqual([]);
    const seen = await look(video);
    expect(seen.streams.map((stream) => stream['codec_name'])).toEqual(['h264', 'aac']);
    expect(seen.chapters).toEqual([]);
    // The index stands before the pictures: it starts at once.
    expect(video.indexOf('moov')).toBeLessThan(video.indexOf('mdat'));
  });

  test.each([
    ['H.265', 'C1.mp4', ['-c:v', 'libx265', '-x265-params', 'log-level=none']],
    ['4:2:2', 'C2.mp4', ['-pix_fmt', 'yuv422p']],
    ['VP9 in WebM', 'C3.webm', ['-c:v', 'libvpx-vp9', '-deadline', 'realtime', '-c:a', 'libopus']],
  ])('in %s is made anew in H.264 and AAC', async (_what, name, options) => {
    const { file } = await uploadAndCheck(editor, build, name, await makeFilm(name, ...options));
    expect(file).toMatchObject({ state: 'ready', kind: 'video', durationFrames: 50 });
    expect(file.probe).toMatchObject({ copied: false });
    const { streams } = await look(await kept(file.id, 'video'));
    expect(streams.map((stream) => [stream['codec_name'], stream['pix_fmt']])).toEqual([
      ['h264', 'yuv420p'],
      ['aac', undefined],
    ]);
  });

  test('counts at 30000/1001 when it was filmed so', async () => {
    const bytes = await makeMedia(
      'ntsc.mp4',
      '-f',
      'lavfi',
      '-i',
      'testsrc2=size=160x90:rate=30000/1001:duration=2.002',
    );
    const { file } = await uploadAndCheck(editor, build, 'ntsc.mp4', bytes);
    expect(file).toMatchObject({ state: 'ready', durationFrames: 60, rateNum: 30_000, rateDen: 1001 });
  });
});

describe('A sound', () => {
  test.each([
    ['memo.wav', []],
    ['memo.mp3', []],
    ['memo.m4a', []],
  ] as const)('%s becomes AAC to play', async (name, options) => {
    const { file, variants } = await uploadAndCheck(editor, build, name, await makeSound(name, ...options));
    expect(file).toMatchObject({ state: 'ready', kind: 'sound', rateNum: 1000, rateDen: 1 });
    expect(Math.abs((file.durationFrames ?? 0) - 2000)).toBeLessThan(60);
    expect(Object.keys(variants).sort()).toEqual(['original', 'sound', 'waveform']);
    expect((await look(await kept(file.id, 'sound'))).streams[0]).toMatchObject({ codec_name: 'aac' });
  });
});

describe('A PDF', () => {
  async function makePdf(): Promise<Buffer> {
    const pdf = await PDFDocument.create();
    pdf.setAuthor('Wren Hallam');
    pdf.setProducer('Shed CAD 9');
    const page = pdf.addPage([400, 300]);
    page.drawImage(await pdf.embedJpg(await makePhoto()), { x: 0, y: 0, width: 100, height: 80 });
    await pdf.attach(Buffer.from('a secret'), 'secret.txt');
    return Buffer.from(await pdf.save({ useObjectStreams: false }));
  }

  test('is written anew without who, what with, and where its photos were taken', async () => {
    const original = await makePdf();
    expect(original.includes('Marram Optics')).toBe(true);
    const { file } = await uploadAndCheck(editor, build, 'plans.pdf', original, 'plan');
    expect(file).toMatchObject({ state: 'ready', kind: 'document', contentType: 'application/pdf' });
    const written = await kept(file.id, 'document');
    expect(written.includes('Marram Optics')).toBe(false);
    const pdf = await PDFDocument.load(written, { updateMetadata: false });
    expect([pdf.getAuthor(), pdf.getProducer(), pdf.getPageCount()]).toEqual([undefined, undefined, 1]);
    expect(
      pdf.context.enumerateIndirectObjects().some(([, object]) => object.toString().includes('secret')),
    ).toBe(false);
  });

  test('that was cut off is refused', async () => {
    const whole = await makePdf();
    const { file } = await uploadAndCheck(editor, build, 'plans.pdf', whole.subarray(0, whole.length - 400));
    expect(file).toMatchObject({ state: 'failed' });
    expect(file.failure).toContain('cut off');
  });
});

describe('A list', () => {
  test.each([
    [
      'edit.edl',
      'TITLE: EP4\nFCM: NON-DROP FRAME\n001  C0043 V C 01:00:00:00 01:00:02:00 00:00:00:00 00:00:02:00\n',
      'edl',
    ],
    ['edit.otio', '{"OTIO_SCHEMA": "Timeline.1", "name": "ep4"}', 'otio'],
    ['ep4.vtt', 'WEBVTT\n\n00:00.000 --> 00:02.000\nso with the shaft done\n', 'vtt'],
    ['ep4.srt', '1\n00:00:00,000 --> 00:00:02,000\nso with the shaft done\n', 'srt'],
    ['parts.csv', 'number,name\n101,base rail\n', 'csv'],
  ])('%s is taken as it is', async (name, text, format) => {
    const { file, variants } = await uploadAndCheck(editor, build, name, Buffer.from(text));
    expect(file).toMatchObject({ state: 'ready', kind: 'text', probe: { format } });
    expect(Object.keys(variants)).toEqual(['original']);
  });
});

describe('Refused with a sentence is', () => {
  const playlist = '#EXTM3U\n#EXT-X-TARGETDURATION:2\nhttp://127.0.0.1:1/secret.ts\n';
  test.each([
    ['a playlist named as a film', 'C0044.mp4', () => Buffer.from(playlist), 'playlist'],
    [
      'a list of films named as one',
      'C0044.mp4',
      () => Buffer.from("ffconcat version 1.0\nfile '/etc/passwd'\n"),
      'playlist',
    ],
    [
      'a web page named as a photo',
      'bearing.jpg',
      () => Buffer.from('<!doctype html><script>1</script>'),
      'web page',
    ],
    ['a drawing in SVG', 'plan.svg', () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'SVG'],
    ['a program', 'setup.exe', () => Buffer.from('MZ\x90\0\x03\0\0\0', 'latin1'), 'no kind of file'],
    ['a GIF', 'dance.gif', () => Buffer.from('GIF89a\x01\0\x01\0', 'latin1'), 'JPEG or PNG'],
    ['something else called .csv', 'parts.csv', () => Buffer.from('one line only'), 'Export it again'],
    ['a film without its end', 'C0045.mp4', async () => (await makeFilm()).subarray(0, 20_000), 'cut off'],
    [
      'a film cut off behind its index',
      'C0046.mp4',
      async () => (await makeFilm('a.mp4', '-movflags', '+faststart')).subarray(0, -5_000),
      'cut off',
    ],
    [
      'a photo without its end',
      'half.jpg',
      async () => (await makePhoto('jpeg', 2000, 2000)).subarray(0, 9_000),
      'cut off',
    ],
    [
      'a film that is noise',
      'C0047.mp4',
      () => Buffer.concat([Buffer.from('\0\0\0\x10ftypisom\0\0\0\0', 'latin1'), Buffer.alloc(5000, 7)]),
      'cut off',
    ],
  ])('%s', async (_what, name, make, said) => {
    const { file, variants } = await uploadAndCheck(editor, build, name, await make());
    expect(file).toMatchObject({ state: 'failed', kind: null });
    expect(file.failure).toContain(said);
    expect(variants).toEqual({});
    expect(await services.storage.sizeOf(incomingKey(workshop.id, file.id))).toBeNull();
    expect(await services.storage.sizeOf(keyOf(workshop.id, file.id, 'original'))).toBeNull();
  });
});

describe('The worker', () => {
  test('may be killed at any step: the job runs again and does no harm', async () => {
    const id = await upload(editor, build, 'again.jpg', await makePhoto());
    const { file, variants } = await check(services, id);
    // Killed after the row was written and before the upload was cleared away.
    await services.storage.put(incomingKey(workshop.id, id), 'image/jpeg', await kept(id, 'original'));
    const again = await check(services, id);
    expect(again).toEqual({ file, variants });
    expect(await services.storage.sizeOf(incomingKey(workshop.id, id))).toBeNull();
  });

  test('tries again when the storage is away, and says nothing of it to the owner', async () => {
    const id = await upload(editor, build, 'later.jpg', await makePhoto());
    const away = {
      ...services,
      storage: { ...services.storage, copy: () => Promise.reject(new Error('away')) },
    };
    await expect(check(away, id)).rejects.toThrow('away');
    expect(await rowOf(services, id)).toMatchObject({ state: 'checking', checkTries: 0, failure: null });
    expect((await check(services, id)).file.state).toBe('ready');
  });
});
