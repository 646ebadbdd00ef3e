import { eq } from 'drizzle-orm';
import { answers, questions } from '../../../db/schema/questions.ts';
import { may } from '../../../domain/permissions.ts';
import { Forbidden, Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { changeQuestion, makeRisky } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/**
 * Says that a question repeats another: the other's answer answers it, and its asker is told of that answer. A risky
 * question makes the other one risky; that an answer which is out already answers a risky question is for the owner
 * alone to say.
 * @throws Invalid at `into`, Forbidden, Conflict
 */
export const mergeQuestion = verb(
  { may: 'question.sort' },
  async (context, input: QuestionRef & { readonly into: string; readonly version: number }) => {
    const { db, role, services } = context;
    if (input.into === input.question)
      throw new Invalid({ into: 'A question cannot repeat itself. Choose another.' });
    // Always the older one first, so that two merges never wait for each other.
    if (input.into < input.question) await lockQuestion(context, { question: input.into });
    const { question, answer } = await lockQuestion(context, input);
    const into = await lockQuestion(context, { question: input.into });
    if (into.question.buildId !== question.buildId)
      throw new Invalid({ into: 'That question is about another build. Choose one of this build.' });
    if (into.question.mergedInto !== null || into.question.state === 'hidden')
      throw new Invalid({
        into: 'That question is hidden, or repeats another itself. Choose one that is shown.',
      });
    if (answer?.answeredAt != null)
      throw new Invalid({ into: 'This question is answered already. Merge the other one into it instead.' });
    const isOut = into.answer?.answeredAt != null;
    const owner = may(role, 'question.answer-risky');
    if (question.risky && isOut && !owner) {
      throw new Forbidden(
        'This question is marked risky: only the owner says that an answer which is out already answers it. Nothing was changed.',
      );
    }
    if (question.risky && isOut)
      await db.update(answers).set({ byOwner: true }).where(eq(answers.questionId, input.into));
    if (question.risky && !into.question.risky) {
      const standing = isOut ? { ...into.answer, byOwner: true } : into.answer;
      await makeRisky(context, into.question, standing as typeof into.answer, {
        risks: [...new Set([...into.question.risks, ...question.risks])],
      });
    }
    // What was merged into this one goes along: an answer is never two steps away.
    await db.update(questions).set({ mergedInto: input.into }).where(eq(questions.mergedInto, question.id));
    const saved = await changeQuestion(context, question, { mergedInto: input.into, state: 'shown' });
    if (isOut) await services.jobs.enqueue(db, 'question-answered', { questionId: input.into });
    return saved;
  },
);
