import { eq } from 'drizzle-orm';
import { beforeEach, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { editions } from '../../../src/db/schema/episodes.ts';
import { clips, workStretches } from '../../../src/db/schema/footage.ts';
import { addChapter } from '../../../src/features/episodes/server/add-chapter.ts';
import { getCompanion } from '../../../src/features/episodes/server/get-companion.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { lookAtDesk } from '../../../src/features/episodes/server/look-at-desk.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { placeFootage } from '../../../src/features/episodes/server/place-footage.ts';
import { reportEdit } from '../../../src/features/episodes/server/report-edit.ts';
import { isInEdit, type Note, type PlacedAnchor } from '../../../src/features/notes/note.ts';
import { changeNote } from '../../../src/features/notes/server/change-note.ts';
import { deleteNote } from '../../../src/features/notes/server/delete-note.ts';
import { placeNote } from '../../../src/features/notes/server/place-note.ts';
import { restoreNote } from '../../../src/features/notes/server/restore-note.ts';
import { setAppearance } from '../../../src/features/notes/server/set-appearance.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { aShownBuild, aShownEpisode, BUILD, noteAt, RATE } from '../../support/companion.ts';
import { Forbidden, NotFound } from '../../../src/server/errors.ts';
import { aClip, editOf, noteMade, takeEdit } from '../../support/placed.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let parts: Map<string, string>;
let buildId: string;
let episode: string;
let A: string;
let B: string;

beforeEach(async () => {
  shed = await aWorkshop(services);
  parts = await aShownBuild(shed.owner);
  buildId = (await getBuild(shed.owner, { build: BUILD })).id;
  A = await aClip(shed.owner, buildId, 'C0043.MP4');
  B = await aClip(shed.owner, buildId, 'C0044.MP4');
  episode = (await makeEpisode(shed.owner, { build: BUILD, title: 'The shaft' })).id;
});

const NAMES = () => ({ A, B });
/** Ten seconds of A from its second 20 on, then ten of B from its beginning. */
const FIRST = editOf('1 A V C 500 750 0 250', '2 B V C 0 250 250 500');
/** B comes first, and A a second earlier; its end is gone. */
const SECOND = editOf('1 B V C 0 100 0 100', '2 A V C 475 640 100 265');

const look = () => lookAtDesk(shed.owner, { build: BUILD, episode });
const told = (notes: readonly Note[]) =>
  notes.map((note) => [
    note.text,
    isInEdit(note) ? note.position.frame : (note.place?.dropped ?? 'not in this edit'),
  ]);
async function atDesk() {
  return told((await look()).notes);
}
async function theNote(text: string): Promise<Note> {
  const found = (await look()).notes.find((note) => note.text === text);
  if (!found) throw new Error(`No note “${text}” at the desk.`);
  return found;
}

describe('a note made on a clip', () => {
  test('turns up at the desk of the episode that uses its moment, and follows the next edit', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 520 });
    await noteMade(shed.owner, buildId, 'Elsewhere.', { clipId: A, frame: 5000 });
    expect(await atDesk()).toEqual([]);
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await atDesk()).toEqual([['Face it.', 20]]);
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await atDesk()).toEqual([['Face it.', 145]]);
  });

  test('that the next edit drops is told at the desk with the segment, and comes back with a later one', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 740 });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    await takeEdit(shed.owner, episode, editOf('1 B V C 0 250 0 250'), NAMES());
    expect(await atDesk()).toEqual([['Face it.', 'C0043.MP4 from 0:20 to 0:30']]);
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await atDesk()).toEqual([['Face it.', 240]]);
  });

  test('added while there is an edit has its place at once', async () => {
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: B, frame: 50 });
    expect(await atDesk()).toEqual([['Face it.', 300]]);
  });

  test('used twice has its main place in the longest use and says where else', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 520 });
    await takeEdit(shed.owner, episode, editOf('1 A V C 510 535 0 25', '2 A V C 500 750 25 275'), NAMES());
    const note = await theNote('Face it.');
    expect([note.position.frame, note.place?.also]).toEqual([45, [10 / 25]]);
  });

  test('just outside a used stretch is moved to the nearest and says so', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 760 });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    const note = await theNote('Face it.');
    expect([note.position.frame, note.place?.status]).toEqual([249, 'snapped']);
  });

  test('about a sound that has no track in this edit is placed by the picture and says so', async () => {
    await noteMade(shed.owner, buildId, 'Hear it.', { clipId: A, frame: 520, of: 'sound' });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    const note = await theNote('Hear it.');
    expect([note.position.frame, note.place?.byPicture]).toEqual([20, true]);
  });

  test('with a name that two cameras gave lies on the clip that the name was matched to', async () => {
    const other = await aClip(shed.owner, buildId, 'C0043.MP4');
    await noteMade(shed.owner, buildId, 'Not this.', { clipId: other, frame: 520 });
    await noteMade(shed.owner, buildId, 'This.', { clipId: A, frame: 520 });
    await takeEdit(shed.owner, episode, editOf('1 C0043 V C 500 750 0 250'), { C0043: A });
    expect(await atDesk()).toEqual([['This.', 20]]);
  });
});

describe('a note made in the shop', () => {
  test('lands on the clip that ran, and moves when it becomes known when that was', async () => {
    const T = new Date('2026-11-12T14:20:00Z');
    await noteMade(shed.owner, buildId, 'Face it.', { shopAt: new Date(T.getTime() + 22_000) });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await atDesk()).toEqual([]);
    await shed.owner.db.update(clips).set({ startSetAt: T }).where(eq(clips.id, A));
    await placeFootage(services, { build: buildId });
    expect(await atDesk()).toEqual([['Face it.', 50]]);
    await shed.owner.db
      .update(clips)
      .set({ startSetAt: new Date(T.getTime() + 1000) })
      .where(eq(clips.id, A));
    await placeFootage(services, { build: buildId });
    expect(await atDesk()).toEqual([['Face it.', 25]]);
  });

  test('within five minutes of a clip of the edit is offered that clip at the desk', async () => {
    const T = new Date('2026-11-12T14:20:00Z');
    await shed.owner.db.update(clips).set({ startSetAt: T }).where(eq(clips.id, A));
    await noteMade(shed.owner, buildId, 'Near.', { shopAt: new Date(T.getTime() - 60_000) });
    await noteMade(shed.owner, buildId, 'Far.', { shopAt: new Date(T.getTime() - 600_000) });
    await noteMade(shed.owner, buildId, 'Just before.', { shopAt: new Date(T.getTime() - 5000) });
    await takeEdit(shed.owner, episode, editOf('1 A V C 0 250 0 250'), NAMES());
    expect(await atDesk()).toEqual([
      ['Near.', 'not in this edit'],
      ['Just before.', 0],
    ]);
    expect((await theNote('Near.')).place).toMatchObject({
      status: 'no-footage',
      on: { id: A, clip: 'C0043.MP4', at: 0 },
    });
    expect((await theNote('Just before.')).place?.toEdge).toBe(true);
  });
});

describe('a note that is not in this edit', () => {
  const place = async (text: string, anchor: PlacedAnchor) => {
    const { id, version } = await theNote(text);
    return placeNote(shed.editor, { build: BUILD, episode, note: id, version, anchor });
  };

  test('is placed by hand on this edit, a clip or another episode, and put back', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 520 });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    await takeEdit(shed.owner, episode, editOf('1 B V C 0 250 0 250'), NAMES());
    const isLost = ['Face it.', 'C0043.MP4 from 0:20 to 0:30'];
    expect(await atDesk()).toEqual([isLost]);
    const position = { frame: 30, endFrame: null, rate: RATE };
    const here = await place('Face it.', { clock: 'episode', episode, position });
    expect(await atDesk()).toEqual([['Face it.', 30]]);
    await place('Face it.', here.before!);
    expect(await atDesk()).toEqual([isLost]);
    await place('Face it.', { clock: 'clip', clip: B, position });
    expect(await atDesk()).toEqual([['Face it.', 30]]);
    const other = await makeEpisode(shed.owner, { build: BUILD, title: 'The next one' });
    await place('Face it.', { clock: 'episode', episode: other.id, position });
    expect(await atDesk()).toEqual([]);
    const there = await lookAtDesk(shed.owner, { build: BUILD, episode: other.id });
    expect(told(there.notes)).toEqual([['Face it.', 30]]);
  });

  test('is not placed by a moderator, nor on another workshop’s clip or episode', async () => {
    const other = await aWorkshop(services);
    await aShownBuild(other.owner);
    const theirs = await getBuild(other.owner, { build: BUILD });
    const clip = await aClip(other.owner, theirs.id, 'C0001.MP4');
    const away = await makeEpisode(other.owner, { build: BUILD, title: 'Elsewhere' });
    const id = await noteAt(shed.owner, episode, 1, { text: 'Face it.' });
    const position = { frame: 30, endFrame: null, rate: RATE };
    await expect(place('Face it.', { clock: 'clip', clip, position })).rejects.toThrow(NotFound);
    await expect(place('Face it.', { clock: 'episode', episode: away.id, position })).rejects.toThrow(
      NotFound,
    );
    const input = { build: BUILD, episode, note: id, version: 1 };
    const anchor = { clock: 'episode' as const, episode, position };
    await expect(placeNote(shed.moderator, { ...input, anchor })).rejects.toThrow(Forbidden);
    await expect(placeNote(other.owner, { ...input, anchor })).rejects.toThrow(NotFound);
  });
});

describe('what was typed at the desk', () => {
  test('before there was an edit stays where it was typed when the first is taken, and moves with the next', async () => {
    await noteAt(shed.owner, episode, 1, { text: 'Face it.' });
    await noteAt(shed.owner, episode, 12, { text: 'Drill it.' });
    await noteAt(shed.owner, episode, 9, { text: 'Cut.' });
    await addChapter(shed.owner, {
      id: newId(),
      build: BUILD,
      episode,
      title: 'Housing',
      position: { frame: 250, endFrame: null, rate: RATE },
    });
    await setAppearance(shed.owner, {
      id: newId(),
      build: BUILD,
      episode,
      partId: parts.get('117') ?? '',
      position: { frame: 100, endFrame: 300, rate: RATE },
    });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await atDesk()).toEqual([
      ['Face it.', 25],
      ['Cut.', 225],
      ['Drill it.', 300],
    ]);
    const desk = await look();
    expect(desk.chapters[0]?.position).toMatchObject({ frame: 250 });
    expect(desk.appearances[0]?.position).toMatchObject({ frame: 100, endFrame: 300 });
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await atDesk()).toEqual([
      ['Cut.', 'C0043.MP4 from 0:20 to 0:30'],
      ['Drill it.', 50],
      ['Face it.', 150],
    ]);
  });

  test('while there is an edit is kept on the clip beneath it', async () => {
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    await noteAt(shed.owner, episode, 2, { text: 'Face it.' });
    expect(await atDesk()).toEqual([['Face it.', 50]]);
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await atDesk()).toEqual([['Face it.', 175]]);
  });

  test('in black stays an episode time', async () => {
    await takeEdit(shed.owner, episode, editOf('1 A V C 500 750 0 250'), NAMES());
    await noteAt(shed.owner, episode, 20, { text: 'The end.' });
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await atDesk()).toEqual([['The end.', 500]]);
  });

  test('is moved, deleted and brought back as ever', async () => {
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    const id = await noteAt(shed.owner, episode, 2, { text: 'Face it.' });
    const ref = { build: BUILD, episode, note: id };
    const note = await theNote('Face it.');
    const form = { ...note, askedId: null };
    const moved = await changeNote(shed.owner, {
      ...form,
      ...ref,
      position: { frame: 260, endFrame: 270, rate: RATE },
    });
    expect(moved.position).toEqual({ frame: 260, endFrame: 270, rate: RATE });
    const back = await changeNote(shed.owner, {
      ...form,
      ...ref,
      version: moved.version,
      position: note.position,
    });
    expect(back.position).toEqual(note.position);
    const gone = await deleteNote(shed.owner, { ...ref, version: back.version });
    expect(await atDesk()).toEqual([]);
    await restoreNote(shed.owner, { ...ref, version: gone.version });
    expect(await atDesk()).toEqual([['Face it.', 50]]);
  });

  test('changed only in its words keeps the moment that it was made at', async () => {
    await noteMade(shed.owner, buildId, 'Face it.', { clipId: A, frame: 760 });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    const note = await theNote('Face it.');
    await changeNote(shed.owner, {
      ...note,
      text: 'Face it off.',
      askedId: null,
      build: BUILD,
      episode,
      note: note.id,
    });
    await takeEdit(shed.owner, episode, editOf('1 A V C 500 800 0 300'), NAMES());
    expect(await atDesk()).toEqual([['Face it off.', 260]]);
  });
});

describe('the report before an edit is taken', () => {
  const report = (edit: typeof FIRST) =>
    reportEdit(shed.owner.db, { id: episode, buildId }, { edit, clipIds: new Map(Object.entries(NAMES())) });

  test('says what stays, moves by how much, is lost with its segment, comes back and is brought in', async () => {
    await noteAt(shed.owner, episode, 1, { text: 'Face it.' });
    await noteAt(shed.owner, episode, 9.9, { text: 'Cut.' });
    await noteAt(shed.owner, episode, 12, { text: 'Drill it.' });
    await noteMade(shed.owner, buildId, 'From the shed.', { clipId: B, frame: 10 });
    expect(await report(FIRST)).toEqual({ stays: 3, moves: null, lost: [], back: [], brought: 1 });
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await report(FIRST)).toEqual({ stays: 4, moves: null, lost: [], back: [], brought: 0 });
    const cut = { what: 'note', text: 'Cut.', at: null };
    // A frame of A at 1 s is at 6 s now; of B at 10.4 and 12 s at 0.4 and 2 s.
    expect(await report(SECOND)).toEqual({
      stays: 0,
      moves: { count: 3, least: 5, most: 10 },
      lost: [{ ...cut, dropped: 'C0043.MP4 from 0:20 to 0:30' }],
      back: [],
      brought: 0,
    });
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await report(FIRST)).toMatchObject({ lost: [], back: [{ ...cut, dropped: null, at: 9.92 }] });
    expect(await atDesk()).toHaveLength(4);
  });
});

describe('work with the camera off', () => {
  test('is told at the cut where it is missing, to viewers without what was written of it', async () => {
    const T = new Date('2026-11-12T14:00:00Z');
    const at = (minutes: number) => new Date(T.getTime() + minutes * 60_000);
    const { db, workshop } = shed.owner;
    await db.update(clips).set({ startSetAt: T }).where(eq(clips.id, A));
    await db
      .update(clips)
      .set({ startSetAt: at(90) })
      .where(eq(clips.id, B));
    const work = { workshopId: workshop.id, buildId, sign: 'timer' as const };
    await db.insert(workStretches).values({ ...work, fromAt: at(0), untilAt: at(80), text: 'Welded it.' });
    const video = { address: 'https://video.example/1', length: '1:00' };
    const shownEpisode = await aShownEpisode(shed.owner, parts, video);
    const { episode: row } = await getDesk(shed.owner, { build: BUILD, episode: shownEpisode });
    const edit = await takeEdit(shed.owner, shownEpisode, FIRST, NAMES());
    // A ran for 400 s, of which the work's first seven minutes are in the footage, used or not.
    const cut = { at: 10, minutes: 73 };
    const desk = await lookAtDesk(shed.owner, { build: BUILD, episode: shownEpisode });
    expect(desk.offCamera).toEqual([{ ...cut, texts: ['Welded it.'] }]);
    const page = () => getCompanion(shed.viewer, { build: BUILD, number: row.number });
    expect((await page()).offCamera).toEqual([]);
    await db.update(editions).set({ editId: edit }).where(eq(editions.episodeId, shownEpisode));
    expect((await page()).offCamera).toEqual([{ ...cut, texts: [] }]);
  });
});

describe('a published page', () => {
  const ref = { build: BUILD, number: 1 };
  const shown = async () => {
    const { notes, chapters, appearances } = await getCompanion(shed.viewer, { ...ref, number });
    return JSON.stringify([notes, chapters, appearances]);
  };
  let number: number;

  beforeEach(async () => {
    const video = { address: 'https://video.example/1', length: '1:00' };
    episode = await aShownEpisode(shed.owner, parts, video);
    number = (await getDesk(shed.owner, { build: BUILD, episode })).episode.number;
  });

  test('shows the same after a first edit, a second one, and what is moved on the new timeline', async () => {
    const before = await shown();
    await takeEdit(shed.owner, episode, FIRST, NAMES());
    expect(await shown()).toBe(before);
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await shown()).toBe(before);
    const note = await theNote('Seats came out at 1-1/2 in.');
    await changeNote(shed.owner, {
      ...note,
      askedId: null,
      build: BUILD,
      episode,
      note: note.id,
      position: { frame: 5, endFrame: null, rate: RATE },
    });
    expect(await shown()).toBe(before);
  });

  test('with an edit shows what that edit has, whatever later ones do', async () => {
    const edit = await takeEdit(shed.owner, episode, FIRST, NAMES());
    await shed.owner.db.update(editions).set({ editId: edit }).where(eq(editions.episodeId, episode));
    const before = await shown();
    await takeEdit(shed.owner, episode, SECOND, NAMES());
    expect(await shown()).toBe(before);
    await noteMade(shed.owner, buildId, 'From the shed.', { clipId: A, frame: 700 });
    expect((await getCompanion(shed.viewer, { ...ref, number })).notes.map(({ text }) => text)).toContain(
      'From the shed.',
    );
  });
});
