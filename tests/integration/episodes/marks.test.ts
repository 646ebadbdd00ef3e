import { beforeAll, describe, expect, it } from 'vitest';
import { getEdits } from '../../../src/features/episodes/server/get-edits.ts';
import { listChapters } from '../../../src/features/episodes/server/list-chapters.ts';
import { readMarkFile } from '../../../src/features/episodes/server/read-mark-file.ts';
import { takeMarks } from '../../../src/features/episodes/server/take-marks.ts';
import { listNotes } from '../../../src/features/notes/server/list-notes.ts';
import { POST as marksRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/marks/index.ts';
import { Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { UploadedFile } from '../../../src/server/http/uploaded-file.ts';
import { callRoute } from '../../support/call-route.ts';
import { aShownBuild, BUILD } from '../../support/companion.ts';
import { anUncutEpisode, takeList } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  await aShownBuild(workshop.owner);
});

async function aCutEpisode(): Promise<string> {
  const episode = await anUncutEpisode(workshop.owner);
  await takeList(workshop.owner, episode);
  return episode;
}

const fileOf = (text: string) => new UploadedFile('marks.csv', new TextEncoder().encode(text));
const read = (context: TestWorkshop['owner'], episode: string, text: string) =>
  readMarkFile(context, { build: BUILD, episode, file: fileOf(text) });

const ROWS = [
  { as: 'note', frame: 50, kind: 'size', parts: '117', text: 'Face it to 412 mm, as in the file.' },
  { as: 'chapter', frame: 300, kind: 'step', parts: '', text: 'Housings' },
  { as: 'leave', frame: 310, kind: 'step', parts: '', text: 'Left.' },
] as const;

describe('Marks of an editing program', () => {
  it('are offered from the newest edit, and not from an older one', async () => {
    const episode = await aCutEpisode();
    const ref = { build: BUILD, episode };
    expect((await getEdits(workshop.owner, ref)).marks).toMatchObject([
      { frame: 50, label: '00:00:02:00', as: 'note', kind: 'step', text: 'SHAFT IN', there: false },
    ]);
    await takeList(workshop.owner, episode);
    expect((await getEdits(workshop.owner, { ...ref, version: 1 })).marks).toEqual([]);
  });

  it('become notes for the team and chapters, and are known again', async () => {
    const episode = await aCutEpisode();
    await takeMarks(workshop.editor, { build: BUILD, episode, rows: [...ROWS] });
    const { items: notes } = await listNotes(workshop.editor, { build: BUILD, episode });
    const own = notes.filter(({ text }) => text === ROWS[0].text);
    expect(own).toMatchObject([{ kind: 'size', audience: 'team', position: { frame: 50 } }]);
    expect(own[0]?.partIds).toHaveLength(1);
    const { items: chapters } = await listChapters(workshop.editor, { build: BUILD, episode });
    expect(chapters).toMatchObject([{ title: 'Housings', position: { frame: 300 } }]);
    const { marks } = await read(workshop.editor, episode, 'seconds,text\n12,chapter: Housings\n3,New\n');
    expect(marks.map(({ as, frame, there }) => [as, frame, there])).toEqual([
      ['chapter', 300, true],
      ['note', 75, false],
    ]);
  });

  it('come through the form, which says when none is chosen', async () => {
    const episode = await aCutEpisode();
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const send = (as: string) =>
      callRoute(services, marksRoute, {
        params,
        actor: workshop.people.editor,
        form: { 'as-0': as, 'frame-0': '25', 'kind-0': 'tip', 'parts-0': '', 'text-0': 'Wipe the seat.' },
      });
    expect((await send('leave')).page?.form.message).toBe('Choose at least one mark to take.');
    expect(await send('note')).toMatchObject({ status: 303 });
  });

  it.each([
    ['at;words\n1;2\n', 'The list needs a column “text”, and one “timecode” or “seconds”.'],
    ['seconds,text\n', 'There is no mark in this file.'],
    ['seconds,text\nsoon,A\n', 'Line 2: There is no time that can be read.'],
  ])('say what is wrong with the file %j', async (text, sentence) => {
    const episode = await aCutEpisode();
    await expect(read(workshop.editor, episode, text)).rejects.toMatchObject({ fields: { file: sentence } });
  });

  it('need an edit to stand on', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await expect(read(workshop.owner, episode, 'seconds,text\n1,A\n')).rejects.toThrow(Invalid);
    await expect(takeMarks(workshop.owner, { build: BUILD, episode, rows: [...ROWS] })).rejects.toThrow(
      Invalid,
    );
  });

  it('refuse a moderator, and another workshop finds no episode', async () => {
    const episode = await aCutEpisode();
    const input = { build: BUILD, episode, rows: [...ROWS] };
    await expect(takeMarks(workshop.moderator, input)).rejects.toThrow(Forbidden);
    await expect(takeMarks(workshop.outsider, input)).rejects.toThrow(NotFound);
    await expect(read(workshop.moderator, episode, 'seconds,text\n1,A\n')).rejects.toThrow(Forbidden);
    await expect(read(workshop.outsider, episode, 'seconds,text\n1,A\n')).rejects.toThrow(NotFound);
  });
});
