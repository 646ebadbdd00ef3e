import { eq } from 'drizzle-orm';
import { describe, expect, test } from 'vitest';
import { files } from '../../../src/db/schema/files.ts';
import { fileJobs } from '../../../src/features/files/jobs.ts';
import { deleteFile } from '../../../src/features/files/server/delete-file.ts';
import { keepStorageClean } from '../../../src/features/files/server/keep-storage-clean.ts';
import { restoreFile } from '../../../src/features/files/server/restore-file.ts';
import { startUpload } from '../../../src/features/files/server/start-upload.ts';
import { workQueue } from '../../../src/server/jobs/queue.ts';
import { INCOMING, keyOf } from '../../../src/server/storage/storage.ts';
import { makeFilm, makePhoto } from '../../support/media-samples.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { aBuild, announcementOf, rowOf, upload, uploadAndCheck } from '../../support/uploads.ts';

const services = await storageServices();
const workshop = await aWorkshop(services);
const build = (await aBuild(services, workshop.id)).slug;
const { editor } = workshop;
const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000);

describe('The janitor', () => {
  test('gives an upload up after seven days, and leaves a younger one alone', async () => {
    const begin = (name: string) =>
      startUpload(editor, announcementOf(Buffer.from(name), name, build)).then(({ id }) => id);
    const [old, young] = [await begin('old.mp4'), await begin('young.mp4')];
    await services.db
      .update(files)
      .set({ createdAt: daysAgo(8) })
      .where(eq(files.id, old));
    await keepStorageClean(services, {});
    await expect(rowOf(services, old)).rejects.toThrow('no file');
    expect((await rowOf(services, young)).state).toBe('uploading');
    const left = await services.storage.uploads.listUnfinished(INCOMING);
    expect(left.map(({ key }) => key.endsWith(young))).toEqual([true]);
  });

  test('erases what was deleted thirty days ago, objects and all', async () => {
    const { file } = await uploadAndCheck(editor, build, 'gone.jpg', await makePhoto());
    const address = { build, file: file.id };
    await deleteFile(editor, address);
    await keepStorageClean(services, {});
    await restoreFile(editor, address);
    await deleteFile(editor, address);
    await services.db
      .update(files)
      .set({ deletedAt: daysAgo(31) })
      .where(eq(files.id, file.id));
    await keepStorageClean(services, {});
    await expect(rowOf(services, file.id)).rejects.toThrow('no file');
    for (const variant of ['original', 'thumb', 'large'])
      expect(await services.storage.sizeOf(keyOf(workshop.id, file.id, variant))).toBeNull();
  });
});

test('The queue takes a film from upload to ready, and a check that was lost is taken up again', async () => {
  const id = await upload(editor, build, 'C0043.mp4', await makeFilm());
  const lost = await upload(editor, build, 'lost.jpg', await makePhoto());
  // As if its event had been worked off by a worker that died of it.
  await services.jobs.boss.purgeQueue('events');
  await services.db
    .update(files)
    .set({ updatedAt: daysAgo(1) })
    .where(eq(files.state, 'checking'));
  await keepStorageClean(services, {});
  await workQueue(services.jobs, fileJobs, async (definition, ids) => {
    await (
      await definition.load()
    )(services, ids);
  });
  await expect.poll(async () => (await rowOf(services, lost)).state, { timeout: 80_000 }).toBe('ready');
  await expect.poll(async () => (await rowOf(services, id)).state, { timeout: 80_000 }).toBe('ready');
}, 180_000);
