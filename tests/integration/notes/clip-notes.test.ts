import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { anchors, notes, noteVersions } from '../../../src/db/schema/notes.ts';
import { AddClipNoteInput } from '../../../src/features/notes/clip-note.ts';
import { addClipNote } from '../../../src/features/notes/server/add-clip-note.ts';
import { changeClipNote } from '../../../src/features/notes/server/change-clip-note.ts';
import { deleteClipNote } from '../../../src/features/notes/server/delete-clip-note.ts';
import { listClipNotes } from '../../../src/features/notes/server/list-clip-notes.ts';
import { listShopNotes } from '../../../src/features/notes/server/list-shop-notes.ts';
import { restoreClipNote } from '../../../src/features/notes/server/restore-clip-note.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aBuildToFilm, aClip } from '../../support/footage.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let clip: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  ({ build } = await aBuildToFilm(shed.owner));
  clip = await aClip(shed.owner, build);
});

const add = (given: object = {}, who = shed.editor, on = clip) =>
  addClipNote(who, {
    build,
    clip: on,
    ...AddClipNoteInput.parse({ id: newId(), text: 'Faced both ends.', frame: 250, ...given }),
  });
const listed = async () => (await listClipNotes(shed.owner, { build, clip })).items;

test('a note stands on its clip, and by the shop’s clock on the day', async () => {
  await add({ frame: 500, text: 'Second.' });
  await add({ text: 'First.' });
  expect(await listed()).toMatchObject([
    { text: 'First.', seconds: 10, at: Date.UTC(2026, 10, 2, 14, 22, 17) },
    { text: 'Second.', seconds: 20 },
  ]);
  expect((await listShopNotes(shed.owner, { build, day: '2026-11-02' })).items).toHaveLength(2);
  expect((await listShopNotes(shed.owner, { build, day: '2026-11-03' })).items).toEqual([]);
});

test('a note sent twice is kept once, and none after the end of its clip', async () => {
  const id = newId();
  await add({ id });
  await add({ id });
  expect(await listed()).toHaveLength(1);
  await expect(add({ frame: 1500 })).rejects.toThrow(Invalid);
});

test('on a clip of uneven frames a note is kept in milliseconds', async () => {
  await services.db
    .update(clips)
    .set({ frameTimes: [0, 33, 90] })
    .where(eq(clips.id, clip));
  await add({ frame: 1240 });
  expect(await listed()).toMatchObject([{ seconds: 1.24 }]);
  const [anchor] = await services.db.select().from(anchors).where(eq(anchors.clipId, clip));
  expect(anchor).toMatchObject({ clock: 'clip', frame: 1240, rateNum: 1000, rateDen: 1 });
});

test('what a note said is kept when it changes; it is deleted and brought back', async () => {
  const { id: note } = await add();
  const change = (version: number) =>
    changeClipNote(shed.owner, { build, clip, note, kind: 'tip', text: 'Faced one end.', version });
  await change(1);
  await expect(change(1)).rejects.toThrow(Conflict);
  const kept = await services.db.select().from(noteVersions).where(eq(noteVersions.noteId, note));
  expect(kept).toMatchObject([{ version: 1, fields: { text: 'Faced both ends.' } }]);
  const { version } = await deleteClipNote(shed.owner, { build, clip, note, version: 2 });
  expect(await listed()).toEqual([]);
  await restoreClipNote(shed.owner, { build, clip, note, version });
  expect(await listed()).toMatchObject([{ kind: 'tip', text: 'Faced one end.' }]);
});

test('what is asked of one person is not shown to others', async () => {
  const { id } = await add();
  await services.db
    .update(notes)
    .set({ audience: 'person', askedId: shed.people.owner.id, writtenBy: shed.people.owner.id })
    .where(eq(notes.id, id));
  expect((await listClipNotes(shed.editor, { build, clip })).items).toEqual([]);
  expect(await listed()).toHaveLength(1);
});

test('a moderator is refused, and another workshop does not find them', async () => {
  const { id: note } = await add();
  const other = await aWorkshop(services);
  for (const [who, error] of [
    [shed.moderator, Forbidden],
    [other.owner, NotFound],
  ] as const) {
    const ref = { build, clip, note, version: 1 };
    await expect(add({}, who)).rejects.toThrow(error);
    await expect(changeClipNote(who, { ...ref, kind: 'tip', text: 'x' })).rejects.toThrow(error);
    await expect(deleteClipNote(who, ref)).rejects.toThrow(error);
    await expect(restoreClipNote(who, ref)).rejects.toThrow(error);
  }
});
