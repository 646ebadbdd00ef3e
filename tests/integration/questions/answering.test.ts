import { beforeAll, describe, expect, test } from 'vitest';
import { getCompanion } from '../../../src/features/episodes/server/get-companion.ts';
import { listPartPlaces } from '../../../src/features/episodes/server/list-part-places.ts';
import { getPublicPart } from '../../../src/features/parts/server/get-public-part.ts';
import { AnswerInput } from '../../../src/features/questions/question.ts';
import { answerQuestion } from '../../../src/features/questions/server/answer-question.ts';
import { assignQuestion } from '../../../src/features/questions/server/assign-question.ts';
import { barAsker } from '../../../src/features/questions/server/bar-asker.ts';
import { clearRisky } from '../../../src/features/questions/server/clear-risky.ts';
import { getPublicQuestion } from '../../../src/features/questions/server/get-public-question.ts';
import { getQuestion } from '../../../src/features/questions/server/get-question.ts';
import { listMergeChoices } from '../../../src/features/questions/server/list-merge-choices.ts';
import { listOwnQuestions } from '../../../src/features/questions/server/list-own-questions.ts';
import { listPublicQuestions } from '../../../src/features/questions/server/list-public-questions.ts';
import { listQuestions } from '../../../src/features/questions/server/list-questions.ts';
import { listWaitingQuestions } from '../../../src/features/questions/server/list-waiting-questions.ts';
import { markRisky } from '../../../src/features/questions/server/mark-risky.ts';
import { markUrgent } from '../../../src/features/questions/server/mark-urgent.ts';
import { mergeQuestion } from '../../../src/features/questions/server/merge-question.ts';
import { pasteQuestion } from '../../../src/features/questions/server/paste-question.ts';
import { sendAnswer } from '../../../src/features/questions/server/send-answer.ts';
import { sendUrgent } from '../../../src/features/questions/server/send-urgent.ts';
import { setQuestionState } from '../../../src/features/questions/server/set-state.ts';
import { type Context, type WorkshopContext } from '../../../src/server/context.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { type Ruled } from '../../../src/server/verb.ts';
import { aShownBuild, aShownEpisode, BUILD } from '../../support/companion.ts';
import {
  aPerson,
  aWorkshop,
  contextFor,
  inWorkshop,
  type TestPerson,
  type TestWorkshop,
} from '../../support/people.ts';
import { ask, askFrom, openLink, versionOf } from '../../support/questions.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let parts: ReadonlyMap<string, string>;
let buildId: string;
let episodeId: string;

const PLAIN = 'Which grease is on it?';
const RISKY = 'Is it strong enough for 12 tonnes?';

beforeAll(async () => {
  shed = await aWorkshop(services);
  parts = await aShownBuild(shed.owner);
  episodeId = await aShownEpisode(shed.owner, parts, { address: 'https://video.example/1', length: '1:00' });
  buildId = (await getCompanion(shed.anyone, { build: BUILD, number: 1 })).build.id;
});

const part = (number: string) => parts.get(number) ?? '';
const look = (question: string) => getQuestion(shed.moderator, { question });
const open = (question: string) => getPublicQuestion(shed.anyone, { build: BUILD, question });
const answer = (
  who: WorkshopContext,
  question: string,
  given: Partial<Parameters<typeof answerQuestion>[1]> = {},
) => answerQuestion(who, { question, text: 'Lithium.', send: 'answer', version: 0, ...given });
async function setState(who: WorkshopContext, question: string, state: 'waiting' | 'shown' | 'hidden') {
  return setQuestionState(who, {
    question,
    state,
    version: await versionOf(shed.owner, question),
    back: 'queue',
  });
}
async function merge(who: WorkshopContext, question: string, into: string) {
  return mergeQuestion(who, { question, into, version: await versionOf(shed.owner, question) });
}

describe('the rule that', () => {
  /** Every write on a question, as far as its rule is concerned. */
  const writes = (question: string): [string, Ruled<never, unknown>, object][] => [
    [
      'shows and hides',
      setQuestionState as Ruled<never, unknown>,
      { state: 'shown', version: 1, back: 'queue' },
    ],
    ['marks risky', markRisky as Ruled<never, unknown>, { back: 'queue' }],
    ['marks urgent', markUrgent as Ruled<never, unknown>, { back: 'queue' }],
    ['clears the mark', clearRisky as Ruled<never, unknown>, { version: 1 }],
    ['assigns', assignQuestion as Ruled<never, unknown>, { to: null, version: 1 }],
    ['merges', mergeQuestion as Ruled<never, unknown>, { into: question, version: 1 }],
    ['bars', barAsker as Ruled<never, unknown>, { barred: true }],
    ['answers', answerQuestion as Ruled<never, unknown>, { text: 'No.', send: 'answer', version: 0 }],
  ];

  test('no viewer sorts or answers, and nobody in another workshop finds the question', async () => {
    const question = await ask(shed.viewer, { text: PLAIN });
    const other = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    for (const [what, write, input] of writes(question)) {
      const call = (context: Context) => write(context, { question, ...input } as never);
      await expect(call(shed.viewer), what).rejects.toThrow(NotFound);
      await expect(call(shed.outsider), what).rejects.toThrow(NotFound);
      await expect(call(shed.anyone), what).rejects.toThrow('Sign in');
      if (what !== 'merges') await expect(call(other), what).rejects.toThrow(NotFound);
    }
    expect(await look(question)).toMatchObject({ state: 'waiting', version: 1, answer: null });
    await expect(getQuestion(other, { question })).rejects.toThrow(NotFound);
    expect((await listQuestions(other, { list: 'waiting' })).items).toEqual([]);
    expect((await listMergeChoices(other, { question })).items).toEqual([]);
    await expect(listQuestions(shed.viewer, { list: 'waiting' })).rejects.toThrow(NotFound);
  });

  test.each(['owner', 'editor', 'moderator'] as const)(
    'a question is shown, hidden and answered by the %s',
    async (who) => {
      const question = await ask(shed.viewer, { text: PLAIN });
      await expect(open(question)).rejects.toThrow(NotFound);
      await setState(shed[who], question, 'shown');
      expect(await open(question)).toMatchObject({ text: PLAIN, answer: null });
      await setState(shed[who], question, 'hidden');
      await expect(open(question)).rejects.toThrow(NotFound);
      await expect(answer(shed[who], question)).rejects.toThrow(Invalid);
      await setState(shed[who], question, 'shown');
      await answer(shed[who], question);
      expect((await open(question)).answer).toMatchObject({
        html: '<p>Lithium.</p>',
        by: shed.people[who].name,
      });
    },
  );

  test.each(['editor', 'moderator'] as const)(
    'a risky one is only drafted by the %s, and answered by the owner',
    async (who) => {
      const question = await ask(shed.viewer, { text: RISKY });
      expect(await look(question)).toMatchObject({ risky: true, risks: ['load'] });
      await expect(answer(shed[who], question)).rejects.toThrow(Forbidden);
      await answer(shed[who], question, { send: 'draft', text: 'I think so.' });
      await setState(shed[who], question, 'shown');
      expect((await open(question)).answer).toBeNull();
      expect(await look(question)).toMatchObject({ answerState: 'drafted' });
      await answer(shed.owner, question, { text: 'No.', version: 1 });
      expect((await open(question)).answer).toMatchObject({ html: '<p>No.</p>' });
      await expect(answer(shed[who], question, { text: 'Yes.', version: 2 })).rejects.toThrow(Forbidden);
      await expect(answer(shed[who], question, { text: 'Yes.', version: 2, send: 'draft' })).rejects.toThrow(
        Forbidden,
      );
      expect((await open(question)).answer).toMatchObject({ html: '<p>No.</p>' });
    },
  );

  test('only the owner takes the mark off', async () => {
    const question = await ask(shed.viewer, { text: RISKY });
    for (const who of [shed.editor, shed.moderator])
      await expect(clearRisky(who, { question, version: 1 })).rejects.toThrow(Forbidden);
    await clearRisky(shed.owner, { question, version: 1 });
    await answer(shed.moderator, question);
    expect((await open(question)).answer).not.toBeNull();
  });
});

describe('an answer that is out', () => {
  test('is a draft again once its question is marked risky, unless the owner sent it', async () => {
    const theirs = await ask(shed.viewer, { text: PLAIN });
    const owners = await ask(shed.viewer, { text: PLAIN });
    await answer(shed.editor, theirs);
    await answer(shed.owner, owners);
    for (const question of [theirs, owners]) await markRisky(shed.moderator, { question, back: 'queue' });
    expect((await open(theirs)).answer).toBeNull();
    expect((await look(theirs)).answer).toMatchObject({ text: 'Lithium.', answeredAt: null });
    expect((await open(owners)).answer).not.toBeNull();
  });

  test('is changed by whoever saw it last; both texts stay, and earlier ones are kept', async () => {
    const question = await ask(shed.viewer, { text: PLAIN });
    await answer(shed.moderator, question, { text: 'One.' });
    await answer(shed.editor, question, { text: 'Two.', version: 1 });
    const late = answer(shed.moderator, question, { text: 'Three.', version: 1 });
    await expect(late).rejects.toThrow(Conflict);
    await late.catch((error: unknown) => {
      expect((error as Conflict).stored).toMatchObject({ text: 'Two.', version: 2 });
    });
    expect((await look(question)).earlier).toMatchObject([{ text: 'One.', by: shed.people.editor.name }]);
    await expect(answer(shed.owner, question, { send: 'draft', version: 2 })).rejects.toThrow(Invalid);
  });

  test('is a subset of Markdown, and nothing that hurts', async () => {
    const question = await ask(shed.viewer, { text: '<img src=x onerror=alert(1)>' });
    await answer(shed.owner, question, {
      text: '**Yes** <script>alert(1)</script> [x](javascript:alert(1))',
    });
    const { answer: shown } = await open(question);
    expect(shown?.html).toContain('<strong>Yes</strong>');
    expect(shown?.html).not.toMatch(/script|javascript/);
  });

  test.each([
    { text: '' },
    { text: 'x'.repeat(10_001) },
    { text: 'a', send: 'soon' },
    { text: 'a', version: -1 },
  ])('is not taken as %j', (given) => {
    expect(AnswerInput.safeParse({ version: 0, ...given }).success).toBe(false);
  });

  test('may be the ready refusal, by one button', () => {
    expect(AnswerInput.parse({ ready: 'draft', text: '', version: '0' })).toEqual({
      text: "I can't answer for your design; ask a licensed person.",
      send: 'draft',
      version: 0,
    });
  });
});

describe('merging', () => {
  test('lets the answer of one answer the other, whose address leads there', async () => {
    const [first, second] = [
      await ask(shed.viewer, { text: PLAIN }),
      await ask(shed.viewer, { text: PLAIN }),
    ];
    await answer(shed.owner, first);
    await merge(shed.moderator, second, first);
    expect((await open(second)).id).toBe(first);
    expect((await listQuestions(shed.owner, { list: 'answered' })).items.map(({ id }) => id)).toContain(
      second,
    );
    await expect(answer(shed.owner, second)).rejects.toThrow(Invalid);
    await setState(shed.moderator, second, 'waiting');
    expect(await look(second)).toMatchObject({ mergedInto: null, state: 'waiting' });
  });

  test('makes the other one risky', async () => {
    const [plain, risky] = [await ask(shed.viewer, { text: PLAIN }), await ask(shed.viewer, { text: RISKY })];
    await answer(shed.moderator, plain, { send: 'draft' });
    await merge(shed.moderator, risky, plain);
    expect(await look(plain)).toMatchObject({ risky: true, risks: ['load'] });
    await expect(answer(shed.moderator, plain, { version: 1 })).rejects.toThrow(Forbidden);
  });

  test('into an answer that is out is for the owner alone where the question is risky', async () => {
    const [plain, risky] = [await ask(shed.viewer, { text: PLAIN }), await ask(shed.viewer, { text: RISKY })];
    await answer(shed.moderator, plain);
    await expect(merge(shed.moderator, risky, plain)).rejects.toThrow(Forbidden);
    await expect(merge(shed.editor, risky, plain)).rejects.toThrow(Forbidden);
    await merge(shed.owner, risky, plain);
    expect((await open(plain)).answer).not.toBeNull();
    await expect(answer(shed.moderator, plain, { version: 1 })).rejects.toThrow(Forbidden);
  });

  test('ends for one that is marked risky afterwards', async () => {
    const [first, second] = [
      await ask(shed.viewer, { text: PLAIN }),
      await ask(shed.viewer, { text: PLAIN }),
    ];
    await answer(shed.moderator, first);
    await merge(shed.moderator, second, first);
    await markRisky(shed.editor, { question: second, back: 'queue' });
    expect(await look(second)).toMatchObject({ mergedInto: null, risky: true });
    expect((await open(second)).answer).toBeNull();
  });

  test('is refused into itself, a hidden one, one that repeats another, and one of another workshop', async () => {
    const [first, second] = [
      await ask(shed.viewer, { text: PLAIN }),
      await ask(shed.viewer, { text: PLAIN }),
    ];
    const third = await ask(shed.viewer, { text: PLAIN });
    await expect(merge(shed.moderator, first, first)).rejects.toThrow(Invalid);
    await setState(shed.moderator, second, 'hidden');
    await expect(merge(shed.moderator, first, second)).rejects.toThrow(Invalid);
    await setState(shed.moderator, second, 'shown');
    await merge(shed.moderator, second, third);
    await expect(merge(shed.moderator, first, second)).rejects.toThrow(Invalid);
    const other = await aWorkshop(services);
    await aShownBuild(other.owner);
    const foreign = await ask(other.viewer, { text: PLAIN });
    await expect(merge(shed.moderator, first, foreign)).rejects.toThrow(NotFound);
    await merge(shed.moderator, third, first);
    expect((await look(second)).mergedInto?.id).toBe(first);
  });
});

test('a question is given to somebody of the team, and to nobody else', async () => {
  const question = await ask(shed.viewer, { text: PLAIN });
  const to = shed.people.editor.id;
  await assignQuestion(shed.moderator, { question, to, version: 1 });
  expect((await look(question)).assigned?.name).toBe(shed.people.editor.name);
  const viewer = { question, to: shed.people.viewer.id, version: 2 };
  await expect(assignQuestion(shed.moderator, viewer)).rejects.toThrow(Invalid);
  await expect(assignQuestion(shed.moderator, { question, to: null, version: 1 })).rejects.toThrow(Conflict);
});

test('somebody of the team cannot be barred', async () => {
  const question = await ask(shed.editor, { text: PLAIN });
  await expect(barAsker(shed.moderator, { question, barred: true })).rejects.toThrow(Invalid);
});

describe('mail', () => {
  async function askerOf(text: string): Promise<{ person: TestPerson; question: string }> {
    const person = await aPerson(services);
    return { person, question: await ask(await inWorkshop(services, person, shed.slug), { text }) };
  }

  test('tells whoever asked, and whoever asked the same, once each', async () => {
    const one = await askerOf(PLAIN);
    const two = await askerOf(PLAIN);
    await answer(shed.owner, one.question);
    await sendAnswer(services, { questionId: one.question });
    await merge(shed.moderator, two.question, one.question);
    await sendAnswer(services, { questionId: one.question });
    await sendAnswer(services, { questionId: one.question });
    for (const { person, question } of [one, two]) {
      const [message, ...more] = await services.outbox.messages({ to: person.email });
      expect(more).toEqual([]);
      expect(message?.messageId).toMatch(new RegExp(`^<answer\\.${question}\\.\\d+@shed\\.test>$`));
      expect(message?.links).toEqual([`http://shed.test/w/${shed.slug}/press/questions/${one.question}`]);
      expect(message?.subject).toContain('your question is answered');
    }
  });

  test('reaches an address that has no account, and nobody for a comment that was pasted in', async () => {
    const question = await askFrom(shed.anyone, { text: PLAIN, email: 'told@example.com' });
    await openLink(await contextFor(services, null, null), question);
    await answer(shed.owner, question);
    await sendAnswer(services, { questionId: question });
    expect(await services.outbox.messages({ to: 'told@example.com' })).toHaveLength(1);
    const about = { build: BUILD, episode: null, t: null, note: null, parts: [] };
    const pasted = await pasteQuestion(shed.moderator, {
      ...about,
      text: 'Hm?',
      name: 'cat',
      foundAt: 'https://a.example',
    });
    await answer(shed.owner, pasted.id);
    const before = (await services.outbox.messages()).length;
    await sendAnswer(services, { questionId: pasted.id });
    expect(await services.outbox.messages()).toHaveLength(before);
  });

  test('tells nobody of a draft, nor of an answer whose question was hidden since', async () => {
    const { person, question } = await askerOf(RISKY);
    await answer(shed.moderator, question, { send: 'draft' });
    await sendAnswer(services, { questionId: question });
    await answer(shed.owner, question, { version: 1 });
    await setState(shed.moderator, question, 'hidden');
    await sendAnswer(services, { questionId: question });
    expect(await services.outbox.messages({ to: person.email })).toEqual([]);
  });

  test('goes to the owner at once when a question is urgent, and once', async () => {
    const { question } = await askerOf(PLAIN);
    await markUrgent(shed.moderator, { question, back: 'queue' });
    await markUrgent(shed.editor, { question, back: 'queue' });
    expect(await look(question)).toMatchObject({ risky: true });
    await sendUrgent(services, { questionId: question });
    const [message, ...more] = await services.outbox.messages({ to: shed.people.owner.email });
    expect(more).toEqual([]);
    expect(message).toMatchObject({
      messageId: `<question-urgent.${question}.${shed.people.owner.id}@shed.test>`,
      links: [`http://shed.test/bench/${shed.slug}/questions/${question}`],
    });
  });
});

describe('what everyone sees', () => {
  test('stands under its moment on the episode, and on its part once it is answered', async () => {
    const late = await ask(shed.viewer, { text: 'And this?', episode: 1, t: 50, parts: [part('125')] });
    const early = await ask(shed.viewer, { text: 'What is this?', episode: 1, t: 5, parts: [part('125')] });
    for (const question of [late, early]) await setState(shed.moderator, question, 'shown');
    await answer(shed.owner, early);
    const here = (await listPublicQuestions(shed.anyone, { buildId, episodeId })).items.map(({ id }) => id);
    expect(here.filter((id) => id === late || id === early)).toEqual([early, late]);
    const ofPart = await listPublicQuestions(shed.anyone, { buildId, partId: part('125') });
    expect(ofPart.items.map(({ id }) => id)).toEqual([early]);
    expect(JSON.stringify(ofPart.items)).not.toContain(shed.people.viewer.email);
  });

  test('a part is shown with every place it has on film, and not its remark', async () => {
    const { build, part: shown } = await getPublicPart(shed.anyone, { build: BUILD, part: part('117') });
    expect(shown).not.toHaveProperty('remark');
    const { items, topics } = await listPartPlaces(shed.anyone, { build, partId: shown.id });
    expect(items).toMatchObject([{ episode: { number: 1 }, places: [{ at: 1 }, { at: 10 }] }]);
    expect(topics).toEqual([]);
    const adapter = await listPartPlaces(shed.anyone, { build, partId: part('125') });
    expect(adapter.topics).toEqual(['pressure']);
  });

  test('a part of a build that is not on show, or of another, is not there', async () => {
    const other = await aWorkshop(services);
    const theirs = (await aShownBuild(other.owner)).get('117') ?? '';
    for (const id of [theirs, 'x', episodeId])
      await expect(getPublicPart(shed.anyone, { build: BUILD, part: id })).rejects.toThrow(NotFound);
    await expect(getPublicQuestion(shed.anyone, { build: BUILD, question: 'x' })).rejects.toThrow(NotFound);
  });

  test('whoever asked sees what became of it', async () => {
    const person = await aPerson(services);
    const context = await inWorkshop(services, person, shed.slug);
    const [waits, shown, done] = [
      await ask(context, { text: 'One?' }),
      await ask(context, { text: 'Two?' }),
      await ask(context, { text: 'Three?' }),
    ];
    await setState(shed.moderator, shown, 'shown');
    await answer(shed.owner, done);
    const { items } = await listOwnQuestions(await contextFor(services, person, null), undefined);
    expect(items.map(({ id, said }) => [id, said])).toEqual([
      [done, 'answered'],
      [shown, 'shown'],
      [waits, 'waits'],
    ]);
    expect(items[2]?.href).toBeNull();
  });
});

test('Today says what waits for each role, what is urgent first', async () => {
  const own = await aWorkshop(services);
  await aShownBuild(own.owner);
  const risky = await ask(own.viewer, { text: RISKY });
  const drafted = await ask(own.viewer, { text: 'Which fuse?' });
  const urgent = await ask(own.viewer, { text: 'Can I leave the guard off?' });
  const mine = await ask(own.viewer, { text: PLAIN });
  await answer(own.editor, drafted, { send: 'draft' });
  await markUrgent(own.moderator, { question: urgent, back: 'queue' });
  await assignQuestion(own.moderator, { question: mine, to: own.people.editor.id, version: 1 });
  const said = async (context: WorkshopContext) =>
    (await listWaitingQuestions(context, undefined)).map(({ urgency, what }) => `${urgency}: ${what}`);
  const sorting = 'soon: 4 questions wait to be shown or hidden.';
  expect(await said(own.owner)).toEqual([
    `soon: Risky, for you to answer: “${RISKY}”`,
    'soon: A drafted answer waits for you: “Which fuse?”',
    'now: Urgent question: “Can I leave the guard off?”',
    sorting,
  ]);
  expect(await said(own.moderator)).toEqual(['soon: Urgent question: “Can I leave the guard off?”', sorting]);
  expect(await said(own.editor)).toContain(`soon: Yours to answer: “${PLAIN}”`);
  await expect(listWaitingQuestions(own.viewer, undefined)).rejects.toThrow(NotFound);
  await answer(own.owner, risky);
  expect(await said(own.owner)).toContain('soon: 3 questions wait to be shown or hidden.');
});
