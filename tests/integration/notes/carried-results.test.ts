import { beforeAll, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../../src/features/episodes/server/publish-edition.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { addNote } from '../../../src/features/notes/server/add-note.ts';
import { carryResult } from '../../../src/features/notes/server/carry-result.ts';
import { dropResult } from '../../../src/features/notes/server/drop-result.ts';
import { listCarryingNotes } from '../../../src/features/notes/server/list-carrying-notes.ts';
import { loadShownResults } from '../../../src/features/notes/server/load-shown-results.ts';
import { addWorksheet } from '../../../src/features/worksheets/server/add-worksheet.ts';
import { changeWorksheet } from '../../../src/features/worksheets/server/change-worksheet.ts';
import { type AddWorksheet } from '../../../src/features/worksheets/worksheet.ts';
import { Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const build = 'press';
const FIT: AddWorksheet = {
  sheet: 'fits',
  title: 'Bearing seat',
  inputs: { size: '35', shaft: 'k6' },
  of: null,
  visibility: 'public',
};
let shed: TestWorkshop;
let other: TestWorkshop;
let episode: string;
let worksheet: string;
let note: string;

async function aNote(): Promise<string> {
  const id = newId();
  await addNote(shed.editor, {
    build,
    episode,
    id,
    kind: 'size',
    text: 'Bearing seats are turned to k6.',
    audience: 'viewers',
    askedId: null,
    standing: 'plan',
    topic: null,
    partIds: [],
    position: { frame: 100, endFrame: null, rate: { num: 25, den: 1 } },
  });
  return id;
}

beforeAll(async () => {
  shed = await aWorkshop(services);
  other = await aWorkshop(services);
  await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
  episode = (await makeEpisode(shed.owner, { build, title: 'The drum' })).id;
  worksheet = (await addWorksheet(shed.owner, { ...FIT, build })).id;
  note = await aNote();
});

const list = () => listCarryingNotes(shed.owner, { build, worksheet });

describe('a note that carries a result of a worksheet', () => {
  test('says it as it was, and is listed with what the worksheet says now', async () => {
    await carryResult(shed.editor, { build, worksheet, note, what: 'Shaft k6' });
    expect((await list()).items).toMatchObject([
      { note, what: 'Shaft k6', said: '+18 / +2 µm', now: '+18 / +2 µm', episode: { number: 1 } },
    ]);
    const inputs = { size: '25', shaft: 'k6' };
    await changeWorksheet(shed.owner, { ...FIT, inputs, build, worksheet, version: 1 });
    expect((await list()).items).toMatchObject([{ said: '+18 / +2 µm', now: '+15 / +2 µm' }]);
    const shown = await loadShownResults(services.db, [note]);
    expect(shown.get(note)).toMatchObject({ said: '+18 / +2 µm', worksheet: { title: FIT.title } });
  });

  test('takes the new one when it is told to, and none once it is taken off', async () => {
    await carryResult(shed.owner, { build, worksheet, note, what: 'Shaft k6' });
    expect((await list()).items).toMatchObject([{ said: '+15 / +2 µm' }]);
    await dropResult(shed.owner, { build, worksheet, note });
    expect((await list()).items).toEqual([]);
    await expect(dropResult(shed.owner, { build, worksheet, note })).rejects.toThrow(NotFound);
  });

  test('is of the build, and the result one of the worksheet’s', async () => {
    await expect(
      carryResult(shed.owner, { build, worksheet, note: newId(), what: 'Shaft k6' }),
    ).rejects.toHaveProperty('fields.note');
    await expect(carryResult(shed.owner, { build, worksheet, note, what: 'Hole H7' })).rejects.toThrow(
      Invalid,
    );
  });

  test('of a published episode is the owner’s to give', async () => {
    const ref = { build, episode };
    await setVideo(shed.owner, {
      ...ref,
      fileId: null,
      address: 'https://video.example/watch/drum',
      length: '10:00',
    });
    const { version } = (await getDesk(shed.owner, ref)).episode;
    await publishEdition(shed.owner, { ...ref, version });
    const given = { build, worksheet, note, what: 'Shaft k6' };
    await expect(carryResult(shed.editor, given)).rejects.toThrow(Forbidden);
    await carryResult(shed.owner, given);
    await expect(dropResult(shed.editor, { build, worksheet, note })).rejects.toThrow(Forbidden);
  });

  test('refuses a moderator, and is not there for another workshop', async () => {
    const given = { build, worksheet, note, what: 'Shaft k6' };
    await expect(carryResult(shed.moderator, given)).rejects.toThrow(Forbidden);
    await expect(dropResult(shed.moderator, given)).rejects.toThrow(Forbidden);
    await expect(carryResult(other.owner, given)).rejects.toThrow(NotFound);
    await expect(dropResult(other.owner, given)).rejects.toThrow(NotFound);
    await expect(listCarryingNotes(other.owner, { build, worksheet })).rejects.toThrow(NotFound);
  });
});
