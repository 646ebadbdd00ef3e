import { createHash, randomInt } from 'node:crypto';
import { buffer } from 'node:stream/consumers';
import { describe, expect, test } from 'vitest';
import { partLength, PART_BYTES } from '../../../src/features/files/file.ts';
import { abandonUpload } from '../../../src/features/files/server/abandon-upload.ts';
import { completeUpload } from '../../../src/features/files/server/complete-upload.ts';
import { deleteFile } from '../../../src/features/files/server/delete-file.ts';
import { dropOriginals } from '../../../src/features/files/server/drop-originals.ts';
import { eraseOriginal } from '../../../src/features/files/server/erase-original.ts';
import { listFiles } from '../../../src/features/files/server/list-files.ts';
import { listParts } from '../../../src/features/files/server/list-parts.ts';
import { measureBuilds } from '../../../src/features/files/server/measure-builds.ts';
import { restoreFile } from '../../../src/features/files/server/restore-file.ts';
import { signParts } from '../../../src/features/files/server/sign-parts.ts';
import { startUpload } from '../../../src/features/files/server/start-upload.ts';
import { type WorkshopContext } from '../../../src/server/context.ts';
import { incomingKey, keyOf } from '../../../src/server/storage/storage.ts';
import { makePhoto } from '../../support/media-samples.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { aBuild, announcementOf, rowOf, sendParts, upload, uploadAndCheck } from '../../support/uploads.ts';

const MiB = 2 ** 20;
const services = await storageServices({ UPLOAD_MAX: 70 * MiB, WORKSHOP_QUOTA: 200 * MiB });
const workshop = await aWorkshop(services);
const build = (await aBuild(services, workshop.id)).slug;
const { editor, moderator, outsider } = workshop;

/** Bytes in which a part at a wrong place shows. */
function bytesOf(length: number): Buffer {
  const bytes = Buffer.alloc(length, createHash('sha512').update(String(length)).digest());
  for (let at = 0; at + 4 <= length; at += 4096) bytes.writeUInt32BE(at, at);
  return bytes;
}

const sha = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

async function begun(length: number, name: string) {
  const bytes = bytesOf(length);
  const { id } = await startUpload(editor, announcementOf(bytes, name, build));
  return { bytes, address: { build, file: id } };
}

describe('A part', () => {
  test('is signed for exactly as many bytes as it has: the storage refuses a longer and a shorter one', async () => {
    const { bytes, address } = await begun(PART_BYTES + 1000, 'exact.mp4');
    const { parts } = await signParts(editor, { ...address, numbers: [2] });
    const put = (body: Uint8Array) => fetch(parts[0]!.url, { method: 'PUT', body: Buffer.from(body) });
    expect((await put(bytes.subarray(0, 1001))).status).toBe(403);
    expect((await put(bytes.subarray(0, 999))).status).toBe(403);
    expect((await put(bytes.subarray(0, 1000))).status).toBe(200);
    expect(partLength(bytes.length, 2)).toBe(1000);
    await abandonUpload(editor, address);
  });

  test('that the file does not have is not signed', async () => {
    const { address } = await begun(2000, 'short.mp4');
    await expect(signParts(editor, { ...address, numbers: [2] })).rejects.toMatchObject({ code: 'invalid' });
    await abandonUpload(editor, address);
  });
});

describe('An upload', () => {
  test('with a part missing is not completed, and what was sent stays', async () => {
    const { bytes, address } = await begun(PART_BYTES * 2 + 5, 'gap.mp4');
    await sendParts(editor, address, bytes, [1, 3]);
    await expect(completeUpload(editor, address)).rejects.toMatchObject({ code: 'invalid' });
    expect((await listParts(editor, address)).parts.map(({ number }) => number)).toEqual([1, 3]);
    await sendParts(editor, address, bytes, [2]);
    await completeUpload(editor, address);
    expect(await rowOf(services, address.file)).toMatchObject({ state: 'checking', uploadId: null });
  });

  test('cut off at random goes on with the missing parts alone, byte for byte', async () => {
    const { bytes, address } = await begun(PART_BYTES * 3 + randomInt(1, PART_BYTES), 'cut.mp4');
    const cut = new AbortController();
    const { parts } = await signParts(editor, { ...address, numbers: [1, 2, 3, 4] });
    const sending = parts.map(({ number, url }) =>
      fetch(url, {
        method: 'PUT',
        body: Buffer.from(bytes.subarray((number - 1) * PART_BYTES, number * PART_BYTES)),
        signal: cut.signal,
      }),
    );
    await Promise.any(sending);
    cut.abort();
    await Promise.allSettled(sending);
    const again = await startUpload(editor, announcementOf(bytes, 'cut.mp4', build));
    expect(again).toMatchObject({ id: address.file, resumed: true });
    const there = (await listParts(editor, address)).parts.map(({ number }) => number);
    expect(there.length).toBeGreaterThan(0);
    await sendParts(
      editor,
      address,
      bytes,
      [1, 2, 3, 4].filter((number) => !there.includes(number)),
    );
    await completeUpload(editor, address);
    const stored = await buffer(await services.storage.read(incomingKey(workshop.id, address.file)));
    expect(sha(stored)).toBe(sha(bytes));
  });

  test('that was put together though its answer was lost is complete when asked again', async () => {
    const { bytes, address } = await begun(1000, 'lost-answer.mp4');
    await sendParts(editor, address, bytes, [1]);
    const { uploads } = services.storage;
    const key = incomingKey(workshop.id, address.file);
    const { uploadId } = await rowOf(services, address.file);
    await uploads.complete(key, uploadId!, (await uploads.listParts(key, uploadId!))!);
    await completeUpload(editor, address);
    expect((await rowOf(services, address.file)).state).toBe('checking');
    expect(await completeUpload(editor, address)).toEqual({ id: address.file });
  });

  test('of the same file by another name or content begins by itself', async () => {
    const bytes = bytesOf(3000);
    const one = await startUpload(editor, announcementOf(bytes, 'a.mp4', build));
    const other = await startUpload(editor, announcementOf(bytes, 'b.mp4', build));
    bytes.writeUInt8(9, 5);
    const changed = await startUpload(editor, announcementOf(bytes, 'a.mp4', build));
    expect(new Set([one.id, other.id, changed.id]).size).toBe(3);
    for (const { id } of [one, other, changed]) await abandonUpload(editor, { build, file: id });
  });
});

describe('Space', () => {
  test('is not given to a file larger than a file may be', async () => {
    const input = { ...announcementOf(bytesOf(10), 'huge.mp4', build), bytes: 71 * MiB };
    await expect(startUpload(editor, input)).rejects.toMatchObject({
      fields: { bytes: expect.stringContaining('at most 70.0 MiB is taken') as string },
    });
  });

  test('cannot be taken twice by announcements at the same time', async () => {
    const own = await aWorkshop(services);
    const { slug } = await aBuild(services, own.id);
    const input = (index: number) => ({
      ...announcementOf(bytesOf(10 + index), `clip-${String(index)}.mp4`, slug),
      bytes: 50 * MiB,
    });
    const answers = await Promise.allSettled(
      Array.from({ length: 7 }, (_none, index) => startUpload(own.editor, input(index))),
    );
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(4);
    const [given] = (await listFiles(own.editor, { build: slug })).items;
    await abandonUpload(own.editor, { build: slug, file: given!.id });
    await startUpload(own.editor, input(8));
  });
});

describe('What is kept', () => {
  test('adds up by build and kind, and originals can go while copies stay', async () => {
    const own = await aWorkshop(services);
    const { slug } = await aBuild(services, own.id);
    const photo = await makePhoto('jpeg', 1600, 1200);
    const { file, variants } = await uploadAndCheck(own.editor, slug, 'seat.jpg', photo);
    const sum = Object.values(variants).reduce((total, { bytes }) => total + bytes, 0);
    const before = await measureBuilds(own.editor, undefined);
    expect(before).toMatchObject({ kept: sum, announced: 0 });
    expect(before.builds[0]).toMatchObject({
      files: 1,
      bytes: sum,
      byKind: { photo: sum },
      droppable: { files: 1, bytes: photo.length },
    });
    expect(await dropOriginals(own.owner, { build: slug })).toEqual({ files: 1, bytes: photo.length });
    await eraseOriginal(services, { fileId: file.id });
    expect(await services.storage.sizeOf(keyOf(own.id, file.id, 'original'))).toBeNull();
    expect(await services.storage.sizeOf(keyOf(own.id, file.id, 'large'))).not.toBeNull();
    const after = await measureBuilds(own.editor, undefined);
    expect(after).toMatchObject({ kept: sum - photo.length });
    expect(after.builds[0]).toMatchObject({ droppable: { files: 0, bytes: 0 } });
    expect(await dropOriginals(own.owner, { build: slug })).toEqual({ files: 0, bytes: 0 });
  });

  test('is deleted and brought back', async () => {
    const { file } = await uploadAndCheck(editor, build, 'gone.jpg', await makePhoto());
    const address = { build, file: file.id };
    const ids = async () => (await listFiles(editor, { build })).items.map(({ id }) => id);
    await deleteFile(editor, address);
    expect(await ids()).not.toContain(file.id);
    await restoreFile(editor, address);
    expect(await ids()).toContain(file.id);
  });
});

describe('Every write', () => {
  type Write = (context: WorkshopContext, address: { build: string; file: string }) => Promise<unknown>;
  const writes: Record<string, Write> = {
    startUpload: (context, address) =>
      startUpload(context, announcementOf(bytesOf(100), 'other.mp4', address.build)),
    signParts: (context, address) => signParts(context, { ...address, numbers: [1] }),
    completeUpload,
    abandonUpload,
    deleteFile,
    restoreFile,
    dropOriginals,
  };

  test.each(Object.entries(writes))('%s refuses a moderator', async (_name, write) => {
    const { address } = await begun(500, 'mine.mp4');
    await expect(write(moderator, address)).rejects.toMatchObject({ code: 'forbidden' });
  });

  test.each(Object.entries(writes))("%s does not find another workshop's", async (_name, write) => {
    const { address } = await begun(500, 'mine.mp4');
    await expect(write(outsider, address)).rejects.toMatchObject({ code: 'not_found' });
    const theirs = await aWorkshop(services);
    const { slug } = await aBuild(services, theirs.id);
    // Their own build, and an id of ours in it.
    const named =
      write === writes['startUpload'] ? null : write(theirs.editor, { build: slug, file: address.file });
    if (named) await expect(named).rejects.toMatchObject({ code: 'not_found' });
  });

  test('of a build that has no such file finds nothing', async () => {
    const { slug } = await aBuild(services, workshop.id, { slug: 'second' });
    const id = await upload(editor, build, 'first.jpg', await makePhoto());
    await expect(deleteFile(editor, { build: slug, file: id })).rejects.toMatchObject({ code: 'not_found' });
  });
});
