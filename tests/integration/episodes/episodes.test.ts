import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { addChapter } from '../../../src/features/episodes/server/add-chapter.ts';
import { askToPublish } from '../../../src/features/episodes/server/ask-to-publish.ts';
import { bringInEpisodes } from '../../../src/features/episodes/server/bring-in-episodes.ts';
import { changeChapter } from '../../../src/features/episodes/server/change-chapter.ts';
import { changeEpisode } from '../../../src/features/episodes/server/change-episode.ts';
import { deleteChapter } from '../../../src/features/episodes/server/delete-chapter.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { getDraftCompanion } from '../../../src/features/episodes/server/get-draft-companion.ts';
import { listEpisodes } from '../../../src/features/episodes/server/list-episodes.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../../src/features/episodes/server/publish-edition.ts';
import { restoreChapter } from '../../../src/features/episodes/server/restore-chapter.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { withdrawEpisode } from '../../../src/features/episodes/server/withdraw-episode.ts';
import { AddNoteInput } from '../../../src/features/notes/note.ts';
import { addNote } from '../../../src/features/notes/server/add-note.ts';
import { answerNote } from '../../../src/features/notes/server/answer-note.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const rate = { num: 1000, den: 1 };
let shed: TestWorkshop;
let build: string;
let ref: { build: string; episode: string };
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

beforeEach(async () => {
  count += 1;
  build = `mill-${String(count)}`;
  await makeBuild(shed.owner, { name: 'Mill', slug: build, about: '', plannedEpisodes: null });
  ref = { build, episode: (await makeEpisode(shed.owner, { build, title: 'The frame' })).id };
});

const elsewhere = { fileId: null, address: 'https://video.example/mill', length: '10:00' };
const note = (given: Record<string, unknown>) =>
  AddNoteInput.parse({
    id: newId(),
    kind: 'step',
    text: 'Face it.',
    position: { frame: 100, rate },
    ...given,
  });

describe('an episode', () => {
  test('keeps its old number from every other', async () => {
    const change = { ...ref, title: 'The frame', about: '' };
    await changeEpisode(shed.editor, { ...change, number: 5, version: 1 });
    await expect(makeEpisode(shed.owner, { build, title: 'Another', number: 1 })).rejects.toThrow(Invalid);
    await expect(changeEpisode(shed.owner, { ...change, number: 1, version: 2 })).resolves.toMatchObject({
      number: 1,
    });
  });

  test('that someone else changed meanwhile is not written over', async () => {
    const change = { ...ref, title: 'Mine', about: '', number: 1, version: 1 };
    await changeEpisode(shed.editor, change);
    await expect(changeEpisode(shed.owner, change)).rejects.toThrow(Conflict);
  });

  test('is changed by no moderator, and is not found from elsewhere', async () => {
    const change = { ...ref, title: 'Mine', about: '', number: 1, version: 1 };
    await expect(changeEpisode(shed.moderator, change)).rejects.toThrow(Forbidden);
    await expect(changeEpisode(shed.outsider, change)).rejects.toThrow(NotFound);
    await expect(setVideo(shed.moderator, { ...ref, ...elsewhere })).rejects.toThrow(Forbidden);
    await expect(setVideo(shed.outsider, { ...ref, ...elsewhere })).rejects.toThrow(NotFound);
    await expect(publishEdition(shed.editor, { ...ref, version: 1 })).rejects.toThrow(Forbidden);
    await expect(withdrawEpisode(shed.editor, { ...ref, version: 1 })).rejects.toThrow(Forbidden);
    await expect(getDesk(shed.outsider, ref)).rejects.toThrow(NotFound);
  });

  test('is published, replaced and withdrawn', async () => {
    await setVideo(shed.editor, { ...ref, ...elsewhere });
    await publishEdition(shed.owner, { ...ref, version: 1 });
    expect((await getDesk(shed.owner, ref)).shown).toMatchObject({ number: 1, video: { seconds: 600 } });
    await setVideo(shed.editor, { ...ref, ...elsewhere, length: '9:00' });
    expect((await getDesk(shed.owner, ref)).shown).toMatchObject({ number: 1, video: { seconds: 600 } });
    await publishEdition(shed.owner, { ...ref, version: 2 });
    expect((await getDesk(shed.owner, ref)).shown).toMatchObject({ number: 2, video: { seconds: 540 } });
    await withdrawEpisode(shed.owner, { ...ref, version: 3 });
    expect((await getDesk(shed.owner, ref)).shown).toBeNull();
    await expect(withdrawEpisode(shed.owner, { ...ref, version: 4 })).rejects.toThrow(Invalid);
  });

  test('is not ready while somebody is asked something', async () => {
    await setVideo(shed.editor, { ...ref, ...elsewhere });
    const asked = { audience: 'person', askedId: shed.people.owner.id };
    const { id } = await addNote(shed.editor, { ...ref, ...note(asked) });
    await expect(askToPublish(shed.editor, { ...ref, version: 1 })).rejects.toThrow(Invalid);
    await answerNote(shed.owner, { ...ref, note: id, version: 1, answer: '40' });
    await expect(askToPublish(shed.editor, { ...ref, version: 1 })).resolves.toEqual({ id: ref.episode });
  });

  test('shows its team beforehand what viewers would see', async () => {
    expect(await getDraftCompanion(shed.owner, ref)).toBeNull();
    await setVideo(shed.editor, { ...ref, ...elsewhere });
    await addNote(shed.owner, { ...ref, ...note({ audience: 'viewers', text: 'Shown' }) });
    await addNote(shed.owner, { ...ref, ...note({ audience: 'team', text: 'Ours' }) });
    const companion = await getDraftCompanion(shed.editor, ref);
    expect(companion?.notes.map(({ text }) => text)).toEqual(['Shown']);
    await expect(getDraftCompanion(shed.outsider, ref)).rejects.toThrow(NotFound);
  });
});

describe('a chapter', () => {
  const at = (frame: number) => ({ frame, endFrame: null, rate });

  test('is added once, renamed, moved, deleted and brought back', async () => {
    const input = { ...ref, id: newId(), title: 'Shaft', position: at(0) };
    await addChapter(shed.editor, input);
    await expect(addChapter(shed.editor, input)).resolves.toMatchObject({ version: 1 });
    const target = { ...ref, chapter: input.id };
    const moved = await changeChapter(shed.owner, {
      ...target,
      title: 'Drum shaft',
      position: at(900),
      version: 1,
    });
    expect(moved).toMatchObject({ title: 'Drum shaft', version: 2, position: at(900) });
    await deleteChapter(shed.owner, { ...target, version: 2 });
    expect((await getDesk(shed.owner, ref)).chapters).toEqual([]);
    await restoreChapter(shed.owner, { ...target, version: 3 });
    expect((await getDesk(shed.owner, ref)).chapters).toMatchObject([{ title: 'Drum shaft', version: 4 }]);
  });

  test('conflicts with the stored one, and is kept from others', async () => {
    const input = { ...ref, id: newId(), title: 'Shaft', position: at(0) };
    await addChapter(shed.owner, input);
    const change = { ...ref, chapter: input.id, title: 'Mine', position: at(0), version: 1 };
    await changeChapter(shed.editor, { ...change, title: 'Theirs' });
    const error = await changeChapter(shed.owner, change).catch((thrown: unknown) => thrown);
    expect((error as Conflict).stored).toMatchObject({ title: 'Theirs', deleted: false });
    await expect(changeChapter(shed.moderator, change)).rejects.toThrow(Forbidden);
    await expect(changeChapter(shed.outsider, change)).rejects.toThrow(NotFound);
    await expect(addChapter(shed.moderator, { ...input, id: newId() })).rejects.toThrow(Forbidden);
    await expect(deleteChapter(shed.outsider, { ...change, version: 2 })).rejects.toThrow(NotFound);
  });
});

describe('episodes that are out already', () => {
  const row = (number: number, address = `https://video.example/${String(number)}`) => ({
    number,
    address,
    title: `Episode ${String(number)}`,
    publishedOn: '2026-10-01',
  });

  test('are brought in all together', async () => {
    await bringInEpisodes(shed.owner, { build, episodes: [row(7), row(8)] });
    const { items } = await listEpisodes(shed.owner, { build });
    expect(items.map(({ number, state }) => [number, state])).toEqual(
      expect.arrayContaining([
        [7, 'published'],
        [8, 'published'],
      ]),
    );
  });

  test('are brought in not at all when one cannot be', async () => {
    for (const bad of [row(1), row(7), row(9, 'not an address')])
      await expect(bringInEpisodes(shed.owner, { build, episodes: [row(7), bad] })).rejects.toThrow(Invalid);
    expect((await listEpisodes(shed.owner, { build })).items).toHaveLength(1);
  });

  test('are brought in by the owner alone', async () => {
    await expect(bringInEpisodes(shed.editor, { build, episodes: [row(7)] })).rejects.toThrow(Forbidden);
    await expect(bringInEpisodes(shed.outsider, { build, episodes: [row(7)] })).rejects.toThrow(NotFound);
  });
});
