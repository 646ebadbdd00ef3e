import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, test } from 'vitest';
import { builds, stages } from '../../../src/db/schema/builds.ts';
import { diaryEntries } from '../../../src/db/schema/diary.ts';
import { episodes } from '../../../src/db/schema/episodes.ts';
import { anchors, appearances, chapters, notes } from '../../../src/db/schema/notes.ts';
import { parts } from '../../../src/db/schema/parts.ts';
import { questionParts, questions } from '../../../src/db/schema/questions.ts';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { deleteBuild } from '../../../src/features/builds/server/delete-build.ts';
import { deleteStage } from '../../../src/features/builds/server/delete-stage.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { addEntry } from '../../../src/features/diary/server/add-entry.ts';
import { AddEntryInput } from '../../../src/features/diary/diary.ts';
import { deleteEntry } from '../../../src/features/diary/server/delete-entry.ts';
import { deleteChapter } from '../../../src/features/episodes/server/delete-chapter.ts';
import { deleteEpisode } from '../../../src/features/episodes/server/delete-episode.ts';
import { eraseDeleted } from '../../../src/features/episodes/server/erase-deleted.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { withdrawEpisode } from '../../../src/features/episodes/server/withdraw-episode.ts';
import { deleteNote } from '../../../src/features/notes/server/delete-note.ts';
import { deletePart } from '../../../src/features/parts/server/delete-part.ts';
import { keyOf } from '../../../src/server/storage/storage.ts';
import { aKeptVideo, aShownBuild, aShownEpisode, BUILD } from '../../support/companion.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { rowOf } from '../../support/uploads.ts';

const services = await storageServices();
const { db } = services;
const ref = { build: BUILD };
const inDays = (days: number) => new Date(Date.now() + days * 86_400_000);
let shed: TestWorkshop;
let partIds: Map<string, string>;
let buildId: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
  partIds = await aShownBuild(shed.owner);
  buildId = (await getBuild(shed.owner, ref)).id;
});

const anEntry = (given: Record<string, string> = {}, { owner } = shed) =>
  addEntry(owner, {
    ...ref,
    ...AddEntryInput.parse({ day: '2026-03-14', text: 'Sawed.', visibility: 'private', ...given }),
  });

/** A film of the build with its object, as one of an episode. */
const aFilm = () => aKeptVideo(shed.owner, buildId, { seconds: 60, bytes: new Uint8Array(100) });

/** What a viewer asked, about a note or a part. */
async function aQuestion(about: { noteId?: string | undefined; partId?: string }, { owner } = shed) {
  const build = await getBuild(owner, ref);
  const tenant = { workshopId: owner.workshop.id };
  const asked = { text: 'How deep?', source: 'mail', askerName: 'Ida', noteId: about.noteId } as const;
  const [row] = await db
    .insert(questions)
    .values({ ...tenant, ...asked, buildId: build.id })
    .returning({ id: questions.id });
  const id = row?.id ?? '';
  const { partId } = about;
  if (partId !== undefined)
    await db.insert(questionParts).values({ ...tenant, questionId: id, partId, position: 0 });
  return id;
}

const has = async (
  table:
    | typeof notes
    | typeof stages
    | typeof diaryEntries
    | typeof parts
    | typeof episodes
    | typeof chapters
    | typeof questions,
  id: string,
) => (await db.select({ id: table.id }).from(table).where(eq(table.id, id))).length === 1;

describe('what was deleted', () => {
  test('can be brought back for thirty days, and is erased after them with all that was its own', async () => {
    const fileId = await aFilm();
    const episode = await aShownEpisode(shed.owner, partIds, { fileId });
    const of = { ...ref, episode };
    const stage = await addStage(shed.owner, { ...ref, name: 'Frame', about: '' });
    const kept = await anEntry({ stage: stage.id });
    const gone = await anEntry();
    const [note] = await db.select({ id: notes.id, anchorId: notes.anchorId }).from(notes);
    const [chapter] = (await getDesk(shed.owner, of)).chapters;
    const asked = await aQuestion({ noteId: note?.id });
    await deleteNote(shed.owner, { ...of, note: note?.id ?? '', version: 1 });
    await deleteChapter(shed.owner, { ...of, chapter: chapter?.id ?? '', version: 1 });
    await deleteStage(shed.owner, { ...ref, stage: stage.id, version: 1, entries: 'none' });
    await deleteEntry(shed.owner, { ...ref, entry: gone.id, version: 1 });

    await eraseDeleted(services, inDays(29));
    expect(await has(notes, note?.id ?? '')).toBe(true);
    expect(await has(stages, stage.id)).toBe(true);
    await eraseDeleted(services, inDays(31));
    expect(await has(notes, note?.id ?? '')).toBe(false);
    expect(await has(questions, asked)).toBe(true);
    expect(
      await db
        .select()
        .from(anchors)
        .where(eq(anchors.id, note?.anchorId ?? '')),
    ).toEqual([]);
    expect(await has(chapters, chapter?.id ?? '')).toBe(false);
    expect(await has(stages, stage.id)).toBe(false);
    expect(await has(diaryEntries, gone.id)).toBe(false);
    const [entry] = await db.select().from(diaryEntries).where(eq(diaryEntries.id, kept.id));
    expect(entry).toMatchObject({ text: 'Sawed.', stageId: null });

    const { version } = (await getDesk(shed.owner, of)).episode;
    await withdrawEpisode(shed.owner, { ...of, version });
    await deleteEpisode(shed.owner, { ...of, version: version + 1 });
    await eraseDeleted(services, inDays(31));
    expect(await has(episodes, episode)).toBe(false);
    expect((await rowOf(services, fileId)).state).toBe('ready');
    expect(await db.select().from(notes)).toEqual([]);
  });

  test('stays while something refers to it, and the rest goes all the same', async () => {
    const [named, unnamed] = [partIds.get('117') ?? '', partIds.get('118') ?? ''];
    await deletePart(shed.owner, { ...ref, part: named, version: 1 });
    await deletePart(shed.owner, { ...ref, part: unnamed, version: 1 });
    const third = partIds.get('125') ?? '';
    await aQuestion({ partId: third });
    await db.update(parts).set({ deletedAt: new Date() }).where(eq(parts.id, third));
    const tenant = { workshopId: shed.id };
    const [anchor] = await db
      .insert(anchors)
      .values({ ...tenant, buildId, clock: 'shop', shopAt: new Date() })
      .returning({ id: anchors.id });
    await db.insert(appearances).values({ ...tenant, anchorId: anchor?.id ?? '', partId: named });
    await eraseDeleted(services, inDays(31));
    expect(await has(parts, named)).toBe(true);
    expect(await has(parts, third)).toBe(true);
    expect(await has(parts, unnamed)).toBe(false);
  });

  test('a build goes with its episodes, its diary and the objects of its files; another’s stay', async () => {
    const other = await aWorkshop(services);
    const ids = await aShownBuild(other.owner);
    const gone = await getBuild(other.owner, ref);
    const film = { seconds: 60, bytes: new Uint8Array(100) };
    const fileId = await aKeptVideo(other.owner, gone.id, film);
    const stays = await aFilm();
    await aShownEpisode(other.owner, ids, { fileId });
    await aQuestion({ partId: ids.get('117') ?? '' }, other);
    const stage = await addStage(other.owner, { ...ref, name: 'Mill', about: '' });
    await anEntry({ stage: stage.id }, other);
    await deleteBuild(other.owner, { ...ref, version: gone.version });

    await eraseDeleted(services, inDays(29));
    expect(await services.storage.sizeOf(keyOf(other.id, fileId, 'video'))).toBe(100);
    await eraseDeleted(services, inDays(31));
    expect(await services.storage.sizeOf(keyOf(other.id, fileId, 'video'))).toBeNull();
    await expect(rowOf(services, fileId)).rejects.toThrow('no file');
    expect(await services.storage.sizeOf(keyOf(shed.id, stays, 'video'))).toBe(100);
    expect(await db.select({ id: builds.id }).from(builds)).toEqual([{ id: buildId }]);
    await eraseDeleted(services, inDays(31));
  });
});
