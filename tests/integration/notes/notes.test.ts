import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { videos } from '../../../src/db/schema/episodes.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../../src/features/episodes/server/publish-edition.ts';
import { AddNoteInput } from '../../../src/features/notes/note.ts';
import { addNote } from '../../../src/features/notes/server/add-note.ts';
import { answerNote } from '../../../src/features/notes/server/answer-note.ts';
import { changeNote } from '../../../src/features/notes/server/change-note.ts';
import { deleteNote } from '../../../src/features/notes/server/delete-note.ts';
import { listAppearances } from '../../../src/features/notes/server/list-appearances.ts';
import { listNotes } from '../../../src/features/notes/server/list-notes.ts';
import { listWaitingAsks } from '../../../src/features/notes/server/list-waiting-asks.ts';
import { removeAppearance } from '../../../src/features/notes/server/remove-appearance.ts';
import { restoreNote } from '../../../src/features/notes/server/restore-note.ts';
import { setAppearance } from '../../../src/features/notes/server/set-appearance.ts';
import { takeProposal } from '../../../src/features/notes/server/take-proposal.ts';
import { PartInput } from '../../../src/features/parts/part.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { type WorkshopContext } from '../../../src/server/context.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const rate = { num: 25, den: 1 };
let shed: TestWorkshop;
let ref: { build: string; episode: string };
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

async function anEpisode(): Promise<{ build: string; episode: string }> {
  count += 1;
  const build = `press-${String(count)}`;
  await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
  const { id } = await makeEpisode(shed.owner, { build, title: 'The shaft' });
  return { build, episode: id };
}

beforeEach(async () => {
  ref = await anEpisode();
});

function fields(given: Record<string, unknown> = {}) {
  const base = { id: newId(), kind: 'step', text: 'Face it.', position: { frame: 100, rate } };
  return AddNoteInput.parse({ ...base, ...given });
}

const add = (context: WorkshopContext, given: Record<string, unknown> = {}) =>
  addNote(context, { ...ref, ...fields(given) });

const change = (
  context: WorkshopContext,
  note: { id: string; version: number },
  given: Record<string, unknown> = {},
) => changeNote(context, { ...ref, ...fields(given), note: note.id, version: note.version });

async function publish(): Promise<void> {
  await services.db.insert(videos).values({
    workshopId: shed.id,
    episodeId: ref.episode,
    address: 'https://video.example/press',
    durationFrames: 600_000,
    rateNum: 1000,
    rateDen: 1,
  });
  await publishEdition(shed.owner, { ...ref, version: 1 });
}

async function aPart(build = ref.build): Promise<string> {
  const part = await addPart(shed.owner, { ...PartInput.parse({ number: '118', name: 'housing' }), build });
  return part.id;
}

const texts = async (context: WorkshopContext) =>
  (await listNotes(context, ref)).items.map(({ text }) => text);

describe('a note', () => {
  test('is kept with its place, its parts in order, and who wrote it', async () => {
    const part = await aPart();
    const position = { frame: 50, endFrame: 75, rate };
    const note = await add(shed.editor, { kind: 'size', standing: 'as-made', partIds: [part], position });
    expect(note).toMatchObject({
      version: 1,
      standing: 'as-made',
      partIds: [part],
      position,
      proposed: false,
    });
    expect(note.writtenBy).toBe(shed.people.editor.name);
  });

  test('that is sent twice is kept once', async () => {
    const note = fields();
    await addNote(shed.owner, { ...ref, ...note });
    await expect(addNote(shed.owner, { ...ref, ...note })).resolves.toMatchObject({ version: 1 });
    expect(await texts(shed.owner)).toEqual(['Face it.']);
  });

  test('is refused from a moderator', async () => {
    const note = await add(shed.owner);
    await expect(add(shed.moderator)).rejects.toThrow(Forbidden);
    await expect(change(shed.moderator, note)).rejects.toThrow(Forbidden);
    const target = { ...ref, note: note.id, version: 1 };
    for (const verb of [deleteNote, restoreNote, takeProposal])
      await expect(verb(shed.moderator, target)).rejects.toThrow(Forbidden);
  });

  test('of another episode or workshop is not found', async () => {
    const note = await add(shed.owner);
    const target = { note: note.id, version: 1 };
    const other = await anEpisode();
    for (const verb of [deleteNote, restoreNote, takeProposal]) {
      await expect(verb(shed.owner, { ...other, ...target })).rejects.toThrow(NotFound);
      await expect(verb(shed.outsider, { ...ref, ...target })).rejects.toThrow(NotFound);
    }
    await expect(addNote(shed.outsider, { ...ref, ...fields() })).rejects.toThrow(NotFound);
    await expect(changeNote(shed.owner, { ...other, ...fields(), ...target })).rejects.toThrow(NotFound);
    await expect(answerNote(shed.owner, { ...other, ...target, answer: 'a' })).rejects.toThrow(NotFound);
  });

  test('names no part of another build', async () => {
    const { build } = await anEpisode();
    const part = await aPart(build);
    await expect(add(shed.owner, { partIds: [part] })).rejects.toMatchObject({
      fields: { partIds: expect.stringContaining('not in the parts list') as string },
    });
  });

  test('that someone else saved meanwhile answers with what is stored, and whether it is deleted', async () => {
    const note = await add(shed.owner);
    await change(shed.editor, note, { text: 'Theirs' });
    const first = await change(shed.owner, note, { text: 'Mine' }).catch((error: unknown) => error);
    expect(first).toBeInstanceOf(Conflict);
    expect((first as Conflict).stored).toMatchObject({ text: 'Theirs', version: 2, deleted: false });
    await deleteNote(shed.editor, { ...ref, note: note.id, version: 2 });
    const second = await change(shed.owner, note).catch((error: unknown) => error);
    expect((second as Conflict).stored).toMatchObject({ deleted: true, version: 3 });
    await expect(change(shed.owner, { ...note, version: 3 })).rejects.toThrow(NotFound);
  });

  test('is deleted and brought back as the next versions', async () => {
    const note = await add(shed.owner);
    const gone = await deleteNote(shed.owner, { ...ref, note: note.id, version: 1 });
    expect(await texts(shed.owner)).toEqual([]);
    const back = await restoreNote(shed.owner, { ...ref, note: note.id, version: gone.version });
    expect(back.version).toBe(3);
    expect(await texts(shed.owner)).toEqual(['Face it.']);
  });
});

describe('a note that asks one person', () => {
  const ask = (context: WorkshopContext, askedId: string) =>
    add(context, { text: '14 or 40?', audience: 'person', askedId });

  const waiting = async () =>
    (await listWaitingAsks(shed.moderator, {})).filter(({ href }) => href.includes(ref.episode));

  test('is seen by them, by who asked and by the owner', async () => {
    await ask(shed.owner, shed.people.moderator.id);
    expect(await texts(shed.owner)).toEqual(['14 or 40?']);
    expect(await texts(shed.moderator)).toEqual(['14 or 40?']);
    expect(await texts(shed.editor)).toEqual([]);
  });

  test('does not exist for others, whatever they ask', async () => {
    const note = await ask(shed.owner, shed.people.moderator.id);
    await expect(change(shed.editor, note)).rejects.toThrow(NotFound);
    await expect(change(shed.editor, { ...note, version: 9 })).rejects.toThrow(NotFound);
    await expect(deleteNote(shed.editor, { ...ref, note: note.id, version: 1 })).rejects.toThrow(NotFound);
  });

  test('waits for them until it is answered', async () => {
    const note = await ask(shed.owner, shed.people.moderator.id);
    expect(await waiting()).toMatchObject([{ urgency: 'soon' }]);
    const answered = await answerNote(shed.moderator, { ...ref, note: note.id, version: 1, answer: '40.' });
    expect(answered).toMatchObject({ answer: '40.', version: 2 });
    expect(await waiting()).toEqual([]);
  });

  test('keeps its answer when it turns to viewers, and waits for nobody then', async () => {
    const note = await ask(shed.owner, shed.people.moderator.id);
    const answered = await answerNote(shed.moderator, { ...ref, note: note.id, version: 1, answer: '40.' });
    const shown = await change(shed.owner, answered, { text: '40 long.', audience: 'viewers' });
    expect(shown).toMatchObject({ answer: '40.', audience: 'viewers' });
    const other = await ask(shed.owner, shed.people.moderator.id);
    await change(shed.owner, other, { audience: 'team' });
    expect(await waiting()).toEqual([]);
  });

  test('is answered by nobody else, except the owner', async () => {
    const note = await ask(shed.editor, shed.people.moderator.id);
    const answer = { ...ref, note: note.id, version: 1, answer: '40.' };
    await expect(answerNote(shed.editor, answer)).rejects.toThrow(Forbidden);
    await expect(answerNote(shed.owner, answer)).resolves.toMatchObject({ answer: '40.' });
  });

  test('asks nobody outside the team', async () => {
    await expect(ask(shed.owner, shed.people.viewer.id)).rejects.toThrow(Invalid);
  });
});

describe('on a published episode', () => {
  test('an editor proposes a number, and the owner takes it', async () => {
    await publish();
    const note = await add(shed.editor, { kind: 'size', audience: 'viewers' });
    expect(note.proposed).toBe(true);
    const target = { ...ref, note: note.id, version: 1 };
    await expect(takeProposal(shed.editor, target)).rejects.toThrow(Forbidden);
    await expect(takeProposal(shed.owner, target)).resolves.toMatchObject({ proposed: false });
    await expect(takeProposal(shed.owner, { ...target, version: 2 })).rejects.toThrow(Invalid);
  });

  test('an editor changes no number of the owner’s, by no road', async () => {
    const size = await add(shed.owner, { kind: 'size' });
    const step = await add(shed.owner);
    await publish();
    await expect(change(shed.editor, size, { kind: 'size' })).rejects.toThrow(Forbidden);
    await expect(change(shed.editor, size, { kind: 'step' })).rejects.toThrow(Forbidden);
    await expect(change(shed.editor, step, { kind: 'caution' })).rejects.toThrow(Forbidden);
    const target = { ...ref, note: size.id, version: 1 };
    await expect(deleteNote(shed.editor, target)).rejects.toThrow(Forbidden);
    await expect(change(shed.editor, step, { text: 'Turn it.' })).resolves.toMatchObject({ proposed: false });
  });
});

describe('a part on the bench by hand', () => {
  const position = { frame: 10, endFrame: 60, rate };

  test('is put on, taken off, and comes back under its id', async () => {
    const input = { ...ref, id: newId(), partId: await aPart(), position };
    await setAppearance(shed.editor, input);
    expect((await listAppearances(shed.owner, ref)).items).toMatchObject([{ id: input.id, position }]);
    await removeAppearance(shed.owner, { ...ref, appearance: input.id });
    expect((await listAppearances(shed.owner, ref)).items).toEqual([]);
    await expect(setAppearance(shed.owner, input)).resolves.toMatchObject({ version: 2 });
    expect((await listAppearances(shed.owner, ref)).items).toHaveLength(1);
  });

  test('has an end, and is a part of this build', async () => {
    const partId = await aPart();
    const endless = { ...ref, id: newId(), partId, position: { ...position, endFrame: null } };
    await expect(setAppearance(shed.owner, endless)).rejects.toThrow(Invalid);
    const { build, episode } = await anEpisode();
    const elsewhere = { build, episode, id: newId(), partId, position };
    await expect(setAppearance(shed.owner, elsewhere)).rejects.toThrow(Invalid);
  });

  test('of another episode is not taken over, nor found', async () => {
    const input = { ...ref, id: newId(), partId: await aPart(), position };
    await setAppearance(shed.owner, input);
    const other = await anEpisode();
    const theirs = { ...other, id: input.id, partId: await aPart(other.build), position };
    await expect(setAppearance(shed.owner, theirs)).rejects.toThrow(Invalid);
    const remove = { ...other, appearance: input.id };
    await expect(removeAppearance(shed.owner, remove)).rejects.toThrow(NotFound);
    await expect(setAppearance(shed.outsider, input)).rejects.toThrow(NotFound);
    await expect(setAppearance(shed.moderator, input)).rejects.toThrow(Forbidden);
    await expect(removeAppearance(shed.moderator, { ...ref, appearance: input.id })).rejects.toThrow(
      Forbidden,
    );
  });
});
