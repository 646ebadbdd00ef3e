import { verb } from '../../../server/verb.ts';
import { makeRisky } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/** Marks a question risky and urgent, and mails the owner at once; a second time nobody is mailed again. */
export const markUrgent = verb(
  { may: 'question.sort' },
  async (context, input: QuestionRef & { readonly back: string }) => {
    const { db, now, services } = context;
    const { question, answer } = await lockQuestion(context, { question: input.question });
    const saved = await makeRisky(context, question, answer, { urgentAt: question.urgentAt ?? now });
    if (question.urgentAt === null) {
      await services.jobs.enqueue(db, 'question-urgent', { questionId: question.id });
    }
    return { ...saved, back: input.back };
  },
);
