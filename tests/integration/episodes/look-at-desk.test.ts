import { beforeAll, describe, expect, test } from 'vitest';
import { DeskAnswer } from '../../../src/features/episodes/desk.ts';
import { changeEpisode } from '../../../src/features/episodes/server/change-episode.ts';
import { deleteChapter } from '../../../src/features/episodes/server/delete-chapter.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { answerNote } from '../../../src/features/notes/server/answer-note.ts';
import { deleteNote } from '../../../src/features/notes/server/delete-note.ts';
import { removeAppearance } from '../../../src/features/notes/server/remove-appearance.ts';
import { setAppearance } from '../../../src/features/notes/server/set-appearance.ts';
import { deletePart } from '../../../src/features/parts/server/delete-part.ts';
import { newId } from '../../../src/db/columns.ts';
import { GET } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/desk.ts';
import { callRoute } from '../../support/call-route.ts';
import { aShownBuild, BUILD, captionsOf, chapterAt, noteAt, RATE } from '../../support/companion.ts';
import { aWorkshop, type TestPerson, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let parts: Map<string, string>;
let episode: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
  parts = await aShownBuild(shed.owner);
  episode = (await makeEpisode(shed.owner, { build: BUILD, title: 'The shaft' })).id;
});

function look(actor: TestPerson, tag = '', workshop = shed.slug) {
  const params = { workshop, build: BUILD, episode };
  return callRoute(services, GET, { params, actor, headers: { 'if-none-match': tag } });
}

describe('an open desk that asks again', () => {
  test('is answered in full once, and with nothing while nothing has changed', async () => {
    await noteAt(shed.owner, episode, 3, { text: 'Face it.' });
    const answer = await look(shed.people.editor);
    expect(DeskAnswer.parse(answer.json).notes.map(({ text }) => text)).toEqual(['Face it.']);
    const tag = answer.headers.get('etag') ?? '';
    expect((await look(shed.people.editor, tag)).status).toBe(304);
  });

  test('is answered anew after every change to what it shows', async () => {
    const { editor, owner, people } = shed;
    const ref = { build: BUILD, episode };
    const partId = parts.get('117') ?? '';
    const stretch = { frame: 25, endFrame: 50, rate: RATE };
    const ids = { note: '', asked: '', appearance: newId(), chapter: '' };
    let tag = '';
    const changes: Record<string, () => Promise<unknown>> = {
      'a note': async () => (ids.note = await noteAt(editor, episode, 4, { text: 'Turn it.' })),
      'a question to one person': async () =>
        (ids.asked = await noteAt(editor, episode, 5, {
          text: '14 or 40?',
          audience: 'person',
          askedId: people.owner.id,
        })),
      'its answer': () => answerNote(owner, { ...ref, note: ids.asked, version: 1, answer: '14' }),
      'a note less': () => deleteNote(editor, { ...ref, note: ids.note, version: 1 }),
      'a chapter': () => chapterAt(editor, episode, 0, 'Shaft'),
      'a chapter less': async () => {
        const [chapter] = (await getDesk(editor, ref)).chapters;
        return deleteChapter(editor, { ...ref, chapter: chapter?.id ?? '', version: 1 });
      },
      'a part on the bench': () =>
        setAppearance(editor, { ...ref, id: ids.appearance, partId, position: stretch }),
      'a part off the bench': () => removeAppearance(editor, { ...ref, appearance: ids.appearance }),
      'the video': () =>
        setVideo(editor, { ...ref, fileId: null, address: 'https://video.example/1', length: '1:00' }),
      'the captions': () => captionsOf(editor, episode),
      'the title': () =>
        changeEpisode(editor, { ...ref, title: 'The long shaft', number: 1, about: '', version: 1 }),
      'a part less in the list': () =>
        deletePart(owner, { build: BUILD, part: parts.get('125') ?? '', version: 1 }),
    };
    tag = (await look(people.editor)).headers.get('etag') ?? '';
    for (const [what, change] of Object.entries(changes)) {
      await change();
      const answer = await look(people.editor, tag);
      expect(answer.status, what).toBe(200);
      tag = answer.headers.get('etag') ?? '';
      expect((await look(people.editor, tag)).status, what).toBe(304);
    }
  });

  test('learns of the checks as they stand now', async () => {
    const holds = async () =>
      DeskAnswer.parse((await look(shed.people.editor)).json).checks.find(({ id }) => id === 'asks')?.holds;
    expect(await holds()).toBe(true);
    const question = { text: 'Which rod?', audience: 'person', askedId: shed.people.owner.id } as const;
    await noteAt(shed.editor, episode, 6, question);
    expect(await holds()).toBe(false);
  });

  test('does not find another workshop’s episode', async () => {
    expect((await look(shed.people.outsider, '', shed.otherSlug)).status).toBe(404);
    expect((await look(shed.people.outsider)).status).toBe(404);
  });
});
