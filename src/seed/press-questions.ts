import { eq } from 'drizzle-orm';
import { questions } from '../db/schema/questions.ts';
import { READY_REFUSAL } from '../domain/questions/risks.ts';
import { listParts } from '../features/parts/server/list-parts.ts';
import { type Ask, CONFIRM_PURPOSE, QUESTION_LISTS } from '../features/questions/question.ts';
import { answerQuestion } from '../features/questions/server/answer-question.ts';
import { askByMail } from '../features/questions/server/ask-by-mail.ts';
import { askQuestion } from '../features/questions/server/ask-question.ts';
import { confirmQuestion } from '../features/questions/server/confirm-question.ts';
import { listQuestions } from '../features/questions/server/list-questions.ts';
import { markUrgent } from '../features/questions/server/mark-urgent.ts';
import { mergeQuestion } from '../features/questions/server/merge-question.ts';
import { pasteQuestion } from '../features/questions/server/paste-question.ts';
import { setQuestionState } from '../features/questions/server/set-state.ts';
import { signToken } from '../server/auth/signed-token.ts';
import { type Context } from '../server/context.ts';

const BUILD = 'orchard-press';

const SEATS = 'Why k6 on the bearing seats, and not a push fit?';
const SEATS_AGAIN = 'What is k6, and why are the seats made to it?';
const ADAPTERS = 'Can I run the hose straight into the cylinder and leave the adapters out?';
const HOUSINGS = 'Would housings from 80 x 20 be strong enough for the drum?';
const RELIEF = 'My relief valve stays shut at 110 bar and the gauge still climbs. What do I do?';
const SLATS = 'Where does the ash for the slats come from, and how dry was it?';
const FIRST = 'Am I the first one here?';
const PEN = 'Which paint pen did you number the blades with?';
const TWENTY = 'Could this one press with 20 tonnes if I put in a bigger pump?';

interface People {
  readonly owner: Context;
  readonly editor: Context;
  readonly moderator: Context;
  readonly viewer: Context;
  readonly builder: Context;
  readonly anyone: Context;
}

/** Questions of the demo in every state, asked, sorted and answered by the verbs that people use. */
export async function seedQuestions(people: People): Promise<void> {
  const { owner, editor, moderator, viewer, builder, anyone } = people;
  const { items: parts } = await listParts(owner, { build: BUILD });
  const about = (text: string, t: number | null, ...numbers: string[]): Ask & { build: string } => ({
    build: BUILD,
    text,
    episode: t === null ? null : 4,
    t,
    note: null,
    parts: parts.filter(({ number }) => numbers.includes(number)).map(({ id }) => id),
    anyway: true,
  });
  await askQuestion(viewer, about(SEATS, 20, '117', '119'));
  await askQuestion(builder, about(SEATS_AGAIN, 20, '117'));
  await askQuestion(builder, about(ADAPTERS, 63, '124', '125'));
  await askQuestion(builder, about(HOUSINGS, 25, '118'));
  await askQuestion(builder, about(RELIEF, 74, '127', '129'));
  await askQuestion(viewer, about(SLATS, null, '108'));
  await askQuestion(viewer, about(FIRST, 1));
  await askByMail(anyone, { ...about(PEN, null, '121'), name: 'Nell', email: 'nell@example.com' });
  const [mailed] = await owner.db.select().from(questions).where(eq(questions.text, PEN));
  if (mailed) {
    const token = signToken(owner.services.settings.AUTH_SECRET, CONFIRM_PURPOSE, mailed.id);
    await confirmQuestion(anyone, { question: mailed.id, token });
  }
  const { id: twenty } = await pasteQuestion(moderator, {
    ...about(TWENTY, 74),
    name: 'tinbarn',
    foundAt: 'https://forum.example/presses/41#12',
  });

  const find = async (text: string) => {
    for (const list of QUESTION_LISTS) {
      const found = (await listQuestions(owner, { list })).items.find((one) => one.text === text);
      if (found) return { question: found.id, version: found.version };
    }
    throw new Error(`The demo has no question “${text}”.`);
  };
  const answer = async (who: Context, text: string, words: string, send: 'answer' | 'draft' = 'answer') =>
    answerQuestion(who, { question: (await find(text)).question, text: words, send, version: 0 });
  await answer(
    editor,
    SEATS,
    'The belt pulls one way while the shaft turns, so a loose inner ring would creep on its seat. **35 k6** holds it; the outer ring may be the looser one.',
  );
  await mergeQuestion(moderator, { ...(await find(SEATS_AGAIN)), into: (await find(SEATS)).question });
  await answer(
    owner,
    ADAPTERS,
    'No. The ports are G 3/8 and the hoses 3/8 NPT: they nearly screw together, and then they let go. Adapter 125 on both lines, and have somebody qualified look over the oil side before you pump it up.',
  );
  await setQuestionState(moderator, { ...(await find(HOUSINGS)), state: 'shown', back: 'queue' });
  await answer(moderator, HOUSINGS, 'I think not: the plan has 100 x 20. Wren, is that right?', 'draft');
  await markUrgent(moderator, { question: (await find(RELIEF)).question, back: 'queue' });
  await setQuestionState(moderator, { ...(await find(SLATS)), state: 'shown', back: 'queue' });
  await setQuestionState(moderator, { ...(await find(FIRST)), state: 'hidden', back: 'queue' });
  await answerQuestion(owner, { question: twenty, text: READY_REFUSAL, send: 'answer', version: 0 });
}
