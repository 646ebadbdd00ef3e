import { eq } from 'drizzle-orm';
import { answers } from '../../../db/schema/questions.ts';
import { may } from '../../../domain/permissions.ts';
import { Conflict, Forbidden, Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { changeQuestion, keepAnswer } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

type Input = QuestionRef & {
  readonly text: string;
  readonly send: 'draft' | 'answer';
  /** Of the answer that was seen; 0 for none. */
  readonly version: number;
};

/**
 * Writes the answer to a question: a draft, or what goes out at once, to everyone and to whoever asked. What it said
 * before is kept. A waiting question is shown with its answer.
 * @throws Forbidden for anyone's but the owner's answer to a risky question, Conflict with the stored answer
 */
export const answerQuestion = verb({ may: 'question.answer' }, async (context, input: Input) => {
  const { db, workshop, role, actor, now, services } = context;
  const { question, answer } = await lockQuestion(context, { question: input.question });
  const owner = may(role, 'question.answer-risky');
  const isOut = answer?.answeredAt != null;
  if (question.mergedInto !== null)
    throw new Invalid({
      '': 'This question repeats another. Answer that one, or let this one stand by itself first.',
    });
  if (question.risky && !owner && (isOut || input.send === 'answer')) {
    throw new Forbidden(
      isOut
        ? 'This question is marked risky: only the owner changes its answer. Nothing was changed; what you wrote is kept below.'
        : 'This question is marked risky: only the owner answers it. Save what you wrote as a draft for them.',
    );
  }
  if (isOut && input.send === 'draft')
    throw new Invalid({
      '': 'The answer is out already: a change to it counts at once. Send it, or leave it.',
    });
  if (input.send === 'answer' && question.state === 'hidden')
    throw new Invalid({ '': 'This question is hidden. Show it first, then answer it.' });
  if ((answer?.version ?? 0) !== input.version) {
    throw new Conflict(
      answer && { id: answer.id, version: answer.version, text: answer.text },
      'Someone else saved this answer in the meantime. What you wrote is kept below, beside what is stored; look it over and save again.',
    );
  }
  const writtenBy = actor.kind === 'account' ? actor.id : null;
  const sent =
    input.send === 'answer'
      ? { answeredAt: answer?.answeredAt ?? now, byOwner: owner }
      : { answeredAt: null };
  if (answer) {
    await keepAnswer(context, answer);
    await db
      .update(answers)
      .set({ text: input.text, writtenBy, ...sent, version: answer.version + 1, updatedAt: now })
      .where(eq(answers.id, answer.id));
  } else {
    await db.insert(answers).values({
      workshopId: workshop.id,
      questionId: question.id,
      text: input.text,
      writtenBy,
      ...sent,
    });
  }
  const saved = await changeQuestion(context, question, input.send === 'answer' ? { state: 'shown' } : {});
  if (input.send === 'answer' && !isOut) {
    await services.jobs.enqueue(db, 'question-answered', { questionId: question.id });
  }
  return saved;
});
