import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { builds } from '../../../src/db/schema/builds.ts';
import { cameras, clipParts, clips, slates, workStretches } from '../../../src/db/schema/footage.ts';
import { anchors, notes } from '../../../src/db/schema/notes.ts';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { deleteBuild } from '../../../src/features/builds/server/delete-build.ts';
import { deleteStage } from '../../../src/features/builds/server/delete-stage.ts';
import { eraseDeleted } from '../../../src/features/episodes/server/erase-deleted.ts';
import { addSlate } from '../../../src/features/footage/server/add-slate.ts';
import { deleteCamera } from '../../../src/features/footage/server/delete-camera.ts';
import { deleteClip } from '../../../src/features/footage/server/delete-clip.ts';
import { removeSlate } from '../../../src/features/footage/server/remove-slate.ts';
import { startStretch } from '../../../src/features/footage/server/start-stretch.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { aBuildToFilm, aCamera, aClip } from '../../support/footage.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';

const services = await storageServices();
const { db } = services;
const { owner, id: workshopId } = await aWorkshop(services);
const after = (days: number) => eraseDeleted(services, new Date(Date.now() + days * 86_400_000));
const slate = { frame: 0, moment: '', shows: '', shopMs: 1, readBy: 'hand' } as const;
const at = { clock: 'clip', frame: 1, rateNum: 25, rateDen: 1 } as const;

async function aNote(buildId: string, clipId: string): Promise<void> {
  const [anchor] = await db
    .insert(anchors)
    .values({ workshopId, buildId, clipId, ...at })
    .returning();
  const said = { kind: 'step', text: 'Faced.' } as const;
  await db.insert(notes).values({ workshopId, buildId, anchorId: anchor?.id ?? '', ...said });
}

test('what was deleted of the footage is erased after thirty days, not before', async () => {
  const { build, buildId } = await aBuildToFilm(owner);
  const camera = await aCamera(owner, build);
  const clip = await aClip(owner, build);
  const kept = await aClip(owner, build, { name: 'C0002.MP4' });
  const { id } = await addSlate(owner, { build, clip: kept, ...slate });
  await removeSlate(owner, { build, clip: kept, slate: id });
  await deleteClip(owner, { build, clip, version: 1 });
  await deleteCamera(owner, { build, camera, version: 1 });
  const left = async () => [
    (await db.select().from(clips).where(eq(clips.buildId, buildId))).length,
    (await db.select().from(slates).where(eq(slates.id, id))).length,
    (await db.select().from(cameras).where(eq(cameras.id, camera))).length,
  ];
  await after(29);
  expect(await left()).toEqual([2, 1, 1]);
  await after(31);
  expect(await left()).toEqual([1, 0, 0]);
});

test('a deleted clip that a note has come to stand on stays', async () => {
  const { build, buildId } = await aBuildToFilm(owner);
  const clip = await aClip(owner, build);
  await deleteClip(owner, { build, clip, version: 1 });
  await aNote(buildId, clip);
  await after(31);
  expect(await db.select().from(clips).where(eq(clips.id, clip))).toHaveLength(1);
});

test('clips and hours stay when their stage is erased', async () => {
  const { build, buildId } = await aBuildToFilm(owner);
  const { id: stage } = await addStage(owner, { build, name: 'Drum', about: '' });
  const clip = await aClip(owner, build);
  await db.update(clips).set({ stageId: stage }).where(eq(clips.id, clip));
  await startStretch(owner, { build, sign: 'timer', stage, text: '' });
  await deleteStage(owner, { build, stage, version: 1, entries: undefined });
  await after(31);
  expect(await db.select().from(clips).where(eq(clips.id, clip))).toMatchObject([{ stageId: null }]);
  const hours = await db.select().from(workStretches).where(eq(workStretches.buildId, buildId));
  expect(hours).toMatchObject([{ stageId: null }]);
});

test('a deleted build is erased with its footage, and what stands on that', async () => {
  const { build, buildId } = await aBuildToFilm(owner);
  const before = await aClip(owner, build);
  const clip = await aClip(owner, build, { name: 'C0002.MP4' });
  await db.update(clips).set({ continuesId: before }).where(eq(clips.id, clip));
  await addSlate(owner, { build, clip, ...slate });
  const fields = { name: 'Shaft', kind: 'made', quantity: 1, material: '', size: '', remark: '' } as const;
  const part = await addPart(owner, { build, number: '117', aliases: [], inPlans: true, ...fields });
  await db.insert(clipParts).values({ workshopId, clipId: clip, partId: part.id });
  await aNote(buildId, clip);
  await deleteBuild(owner, { build, version: 1 });
  await after(31);
  expect(await db.select().from(builds).where(eq(builds.id, buildId))).toEqual([]);
});
