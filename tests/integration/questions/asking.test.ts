import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, test } from 'vitest';
import { questions } from '../../../src/db/schema/questions.ts';
import { type CompanionNote } from '../../../src/features/episodes/companion.ts';
import { getCompanion } from '../../../src/features/episodes/server/get-companion.ts';
import { withdrawEpisode } from '../../../src/features/episodes/server/withdraw-episode.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { POST as byMailRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/questions/by-mail.ts';
import { POST as askRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/questions/index.ts';
import { POST as pasteRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/questions/paste.ts';
import { POST as confirmRoute } from '../../../src/pages/api/questions/[question]/confirm.ts';
import { answerQuestion } from '../../../src/features/questions/server/answer-question.ts';
import { barAsker } from '../../../src/features/questions/server/bar-asker.ts';
import { eraseUnconfirmed } from '../../../src/features/questions/server/erase-unconfirmed.ts';
import { getAskSheet } from '../../../src/features/questions/server/get-ask-sheet.ts';
import { getQuestion } from '../../../src/features/questions/server/get-question.ts';
import { listQuestions } from '../../../src/features/questions/server/list-questions.ts';
import { sendQuestionLink } from '../../../src/features/questions/server/send-question-link.ts';
import { Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aShownBuild, aShownEpisode, BUILD } from '../../support/companion.ts';
import { callRoute, codeOf, fieldsOf } from '../../support/call-route.ts';
import { aPerson, aWorkshop, contextFor, inWorkshop, type TestWorkshop } from '../../support/people.ts';
import { ask, askFrom, openLink, questionToken, versionOf } from '../../support/questions.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let parts: ReadonlyMap<string, string>;
let note: CompanionNote;

beforeAll(async () => {
  shed = await aWorkshop(services);
  parts = await aShownBuild(shed.owner);
  await aShownEpisode(shed.owner, parts, { address: 'https://video.example/1', length: '1:00' });
  const { notes } = await getCompanion(shed.anyone, { build: BUILD, number: 1 });
  note = notes.find(({ topic }) => topic === 'pressure')!;
});

const part = (number: string) => parts.get(number) ?? '';
const params = () => ({ workshop: shed.slug, build: BUILD });

describe('the form for a question', () => {
  test('offers the moment, the parts on the bench then and what is said there', async () => {
    const sheet = await getAskSheet(shed.anyone, {
      build: BUILD,
      episode: '1',
      t: '22',
      part: '',
      note: '',
      like: '',
    });
    expect(sheet).toMatchObject({
      episode: { number: 1 },
      at: 22,
      parts: [{ number: '118', chosen: true }],
      notes: [{ text: 'The housing goes on.', chosen: false }],
    });
  });

  test('takes a part, or a note with its own moment', async () => {
    const nothing = { build: BUILD, episode: '', t: '', part: '', note: '', like: '' };
    expect((await getAskSheet(shed.anyone, { ...nothing, part: part('117') })).parts).toMatchObject([
      { number: '117', chosen: true },
    ]);
    const sheet = await getAskSheet(shed.anyone, { ...nothing, episode: '1', note: note.id });
    expect(sheet).toMatchObject({ at: 40, notes: [{ id: note.id, chosen: true }] });
  });

  test('does not know a part of elsewhere or an episode that is not on show', async () => {
    const nothing = { build: BUILD, episode: '', t: '', part: '', note: '', like: '' };
    for (const odd of [
      { part: note.id },
      { part: 'x' },
      { episode: '9' },
      { episode: '-1' },
      { build: 'nowhere' },
    ])
      await expect(getAskSheet(shed.anyone, { ...nothing, ...odd })).rejects.toThrow(NotFound);
  });
});

describe('somebody signed in', () => {
  test('asks at a moment with the parts on the bench, and the question waits', async () => {
    const id = await ask(shed.viewer, { text: 'Which grease?', episode: 1, t: 22.5, parts: [part('118')] });
    expect(await getQuestion(shed.moderator, { question: id })).toMatchObject({
      state: 'waiting',
      answerState: 'unanswered',
      source: 'account',
      text: 'Which grease?',
      askerName: shed.people.viewer.name,
      moment: { number: 1, at: 22.5 },
      parts: [{ number: '118' }],
      risky: false,
    });
  });

  test('asks about a note, whose caution makes it risky, and stands where the note stands', async () => {
    const id = await ask(shed.viewer, { text: 'How long?', episode: 1, t: 3, note: note.id });
    expect(await getQuestion(shed.moderator, { question: id })).toMatchObject({
      moment: { at: 40 },
      note: { id: note.id },
      risky: true,
      risks: ['pressure'],
    });
  });

  test('is offered a like question that is answered, and may ask all the same', async () => {
    const id = await ask(shed.viewer, { text: 'Which steel is the drum shaft made of?' });
    await answerQuestion(shed.owner, { question: id, text: 'Bright bar.', send: 'answer', version: 0 });
    const body = { text: 'What steel is the drum shaft?' };
    const offered = await callRoute(services, askRoute, {
      params: params(),
      actor: shed.people.viewer,
      body,
    });
    expect(fieldsOf(offered)).toHaveProperty('like');
    const sheet = await getAskSheet(shed.anyone, {
      build: BUILD,
      episode: '',
      t: '',
      part: '',
      note: '',
      like: body.text,
    });
    expect(sheet.like.map((one) => one.id)).toEqual([id]);
    const sent = await callRoute(services, askRoute, {
      params: params(),
      actor: shed.people.viewer,
      body: { ...body, anyway: true },
    });
    expect(sent.status).toBe(200);
    const other = await callRoute(services, askRoute, {
      params: params(),
      actor: shed.people.viewer,
      body: { text: 'Who painted the frame?' },
    });
    expect(other.status).toBe(200);
  });

  test('who was barred is told so, and may ask again when let', async () => {
    const person = await aPerson(services);
    const context = await inWorkshop(services, person, shed.slug);
    const question = await ask(context, { text: 'First one?' });
    await barAsker(shed.moderator, { question, barred: true });
    await expect(ask(context, { text: 'Second one?' })).rejects.toThrow(Forbidden);
    expect((await getQuestion(shed.moderator, { question })).barred).toBe(true);
    await barAsker(shed.moderator, { question, barred: false });
    await ask(context, { text: 'Third one?' });
  });

  test('is told by a script to sign in, when they are not', async () => {
    const answer = await callRoute(services, askRoute, { params: params(), body: { text: 'Why?' } });
    expect(codeOf(answer)).toBe('sign_in_needed');
  });
});

describe('what is wrong with a question is said at its field', () => {
  test.each([
    [{ text: '' }, 'text'],
    [{ text: ' \n ' }, 'text'],
    [{ text: 'x'.repeat(1001) }, 'text'],
    [{ text: '\u0007\u0008' }, 'text'],
    [{ text: 'a\u0000b' }, 'text'],
    [{ text: 'Why?', episode: 1, t: '1:00' }, 't'],
    [{ text: 'Why?', episode: 1, t: '99:59:00' }, 't'],
    [{ text: 'Why?', episode: 1, t: 'soon' }, 't'],
    [{ text: 'Why?', episode: 1, t: '-3' }, 't'],
    [{ text: 'Why?', t: '0:10' }, 'episode'],
    [{ text: 'Why?', episode: 'one' }, 'episode'],
    [{ text: 'Why?', note: 'x' }, 'note'],
    [{ text: 'Why?', note: '01890a5d-ac96-774b-bcce-b302099a8057' }, 'note'],
    [{ text: 'Why?', parts: ['01890a5d-ac96-774b-bcce-b302099a8057'] }, 'parts'],
    [
      { text: 'Why?', parts: Array.from({ length: 9 }, () => '01890a5d-ac96-774b-bcce-b302099a8057') },
      'parts',
    ],
  ])('%j: %s', async (body, field) => {
    const answer = await callRoute(services, askRoute, { params: params(), actor: shed.people.viewer, body });
    expect(answer.status).toBe(422);
    expect(Object.keys(fieldsOf(answer))).toContain(field);
  });

  test.each([
    [{ email: 'nobody' }, 'email'],
    [{ email: '' }, 'email'],
    [{ name: '' }, 'name'],
    [{ name: 'a\u202eb' }, 'name'],
    [{ name: '<b>' }, 'name'],
    [{ name: 'x'.repeat(81) }, 'name'],
  ])('with an address: %j: %s', async (given, field) => {
    const body = { text: 'Why?', name: 'Pia', email: 'pia@example.com', ...given };
    const answer = await callRoute(services, byMailRoute, { params: params(), body });
    expect(Object.keys(fieldsOf(answer))).toEqual([field]);
  });

  test('a part of another workshop is not known, nor is a build or an episode that is not on show', async () => {
    const other = await aWorkshop(services);
    const theirs = await aShownBuild(other.owner);
    const foreign = ask(shed.viewer, { text: 'Why?', parts: [theirs.get('117') ?? ''] });
    await expect(foreign).rejects.toThrow(Invalid);
    await expect(ask(other.viewer, { text: 'Why?', episode: 1, t: 1 })).rejects.toThrow(NotFound);
    await expect(ask(other.viewer, { text: 'Why?', note: note.id })).rejects.toThrow(Invalid);
    await expect(
      callRoute(services, askRoute, {
        params: { workshop: shed.slug, build: 'nowhere' },
        actor: shed.people.viewer,
        body: { text: 'Why?' },
      }).then(codeOf),
    ).resolves.toBe('not_found');
  });

  test('a plain form comes back with what was written, at its moment', async () => {
    const form = { text: '', episode: '1', t: '0:10', [`part-${part('117')}`]: 'on' };
    const answer = await callRoute(services, askRoute, { params: params(), actor: shed.people.viewer, form });
    expect(answer.status).toBe(422);
    expect(answer.page?.path).toBe(`/w/${shed.slug}/press/ask?episode=1&t=0%3A10&note=`);
    expect(answer.page?.form.values).toEqual(form);
  });
});

describe('somebody who gives an address', () => {
  test('gets the same answer for an address that is known, unknown or barred', async () => {
    const barred = await askFrom(shed.anyone, { text: 'One?', email: 'barred@example.com' });
    await openLink(await contextFor(services, null, null), barred);
    await barAsker(shed.moderator, { question: barred, barred: true });
    const answers = await Promise.all(
      ['barred@example.com', 'unknown@example.com', shed.people.viewer.email, shed.people.owner.email].map(
        async (email) => {
          const { status, json } = await callRoute(services, byMailRoute, {
            params: params(),
            body: { text: 'Two?', name: 'Pia', email, anyway: true },
          });
          return { status, json };
        },
      ),
    );
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(answers[0]).toEqual({ status: 200, json: { done: true } });
  });

  test('is mailed a link, and only once it is opened does the question wait', async () => {
    const id = await askFrom(shed.anyone, { text: 'Which oil?', email: 'pia@example.com' });
    const isListed = async () =>
      (await listQuestions(shed.moderator, { list: 'waiting' })).items.some((one) => one.id === id);
    await sendQuestionLink(services, { questionId: id });
    const message = await services.outbox.messageTo('pia@example.com');
    expect(message.messageId).toBe(`<question.${id}@shed.test>`);
    expect(message.links).toEqual([`http://shed.test/questions/${id}?token=${questionToken(services, id)}`]);
    expect(await isListed()).toBe(false);
    await expect(getQuestion(shed.owner, { question: id })).rejects.toThrow(NotFound);
    const confirm = () =>
      callRoute(services, confirmRoute, {
        params: { question: id },
        form: { token: questionToken(services, id) },
      });
    expect((await confirm()).page?.form.result).toEqual({ done: true });
    expect(await isListed()).toBe(true);
    expect((await confirm()).status).toBe(200);
    expect((await getQuestion(shed.owner, { question: id })).askerEmail).toBe('pia@example.com');
    expect((await getQuestion(shed.editor, { question: id })).askerEmail).toBeNull();
    expect((await getQuestion(shed.moderator, { question: id })).askerEmail).toBeNull();
  });

  test('cannot confirm with another link, one that is not whole, or one that is too old', async () => {
    const id = await askFrom(shed.anyone, { text: 'Which oil?', email: 'pia@example.com' });
    const other = await askFrom(shed.anyone, { text: 'Which belt?', email: 'pia@example.com' });
    for (const token of [questionToken(services, other), 'x', '']) {
      const answer = await callRoute(services, confirmRoute, { params: { question: id }, body: { token } });
      expect(answer.status).toBe(422);
    }
    const old = new Date(Date.now() - 8 * 24 * 3600 * 1000);
    await services.db.update(questions).set({ createdAt: old }).where(eq(questions.id, id));
    await expect(openLink(await contextFor(services, null, null), id)).rejects.toThrow(Invalid);
    await eraseUnconfirmed(services, {});
    const left = await services.db.select({ id: questions.id }).from(questions).where(eq(questions.id, id));
    expect(left).toEqual([]);
    await openLink(await contextFor(services, null, null), other);
  });

  test('nothing in the database opens the link', async () => {
    const id = await askFrom(shed.anyone, { text: 'Which oil?', email: 'pia@example.com' });
    const [row] = await services.db.select().from(questions).where(eq(questions.id, id));
    expect(JSON.stringify(row)).not.toContain(questionToken(services, id));
  });

  test('who was barred is mailed nothing, and a link from before does nothing', async () => {
    const first = await askFrom(shed.anyone, { text: 'One?', email: 'gone@example.com' });
    const second = await askFrom(shed.anyone, { text: 'Two?', email: 'gone@example.com' });
    await openLink(await contextFor(services, null, null), first);
    await barAsker(shed.moderator, { question: first, barred: true });
    expect(await openLink(await contextFor(services, null, null), second)).toEqual({ done: true });
    await expect(getQuestion(shed.owner, { question: second })).rejects.toThrow(NotFound);
    await sendQuestionLink(services, { questionId: second });
    expect(await services.outbox.messages({ to: 'gone@example.com' })).toEqual([]);
  });

  test('may ask five times an hour with one address', async () => {
    const body = { text: 'Again?', name: 'Pia', email: 'eager@example.com', anyway: true };
    const statuses: number[] = [];
    for (let turn = 0; turn < 6; turn += 1) {
      const clientAddress = `192.0.2.${String(50 + turn)}`;
      statuses.push(
        (await callRoute(services, byMailRoute, { params: params(), body, clientAddress })).status,
      );
    }
    expect(statuses).toEqual([200, 200, 200, 200, 200, 429]);
  });
});

describe('a comment that is pasted in', () => {
  const body = { text: 'What belt is that?', name: 'shed_cat', foundAt: 'https://video.example/watch/1#c9' };

  test('waits like any other, with where it was found', async () => {
    const given = { ...body, episode: 1, t: '0:20' };
    const answer = await callRoute(services, pasteRoute, {
      params: params(),
      actor: shed.people.moderator,
      body: given,
    });
    const { id } = answer.json as { id: string };
    expect(await getQuestion(shed.moderator, { question: id })).toMatchObject({
      state: 'waiting',
      source: 'pasted',
      askerName: 'shed_cat',
      foundAt: body.foundAt,
      moment: { at: 20 },
      canBeBarred: false,
    });
    await expect(barAsker(shed.moderator, { question: id, barred: true })).rejects.toThrow(Invalid);
  });

  test.each(['javascript:alert(1)', 'nowhere', 'https://', 'ftp://files.example/x'])(
    'from %s is refused',
    async (foundAt) => {
      const answer = await callRoute(services, pasteRoute, {
        params: params(),
        actor: shed.people.moderator,
        body: { ...body, foundAt },
      });
      expect(Object.keys(fieldsOf(answer))).toEqual(['foundAt']);
    },
  );

  test('is not for viewers to bring in', async () => {
    for (const actor of [shed.people.viewer, shed.people.outsider])
      expect(codeOf(await callRoute(services, pasteRoute, { params: params(), actor, body }))).toBe(
        'not_found',
      );
  });
});

test('a moment of an episode that was withdrawn leads nowhere any more', async () => {
  const other = await aWorkshop(services);
  const episode = await aShownEpisode(other.owner, await aShownBuild(other.owner), {
    address: 'https://video.example/2',
    length: '1:00',
  });
  const id = await ask(other.viewer, { text: 'Which grease?', episode: 1, t: 2 });
  const { episode: shown } = await getDesk(other.owner, { build: BUILD, episode });
  await withdrawEpisode(other.owner, { build: BUILD, episode, version: shown.version });
  expect((await getQuestion(other.owner, { question: id })).moment).toBeNull();
  expect(await versionOf(other.owner, id)).toBe(1);
});
