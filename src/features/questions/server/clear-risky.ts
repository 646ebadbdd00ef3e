import { verb } from '../../../server/verb.ts';
import { changeQuestion } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/** Takes the risky mark off a question, the urgent one with it: the owner's alone. @throws Conflict */
export const clearRisky = verb(
  { may: 'question.clear-risky' },
  async (context, input: QuestionRef & { readonly version: number }) => {
    const { question } = await lockQuestion(context, input);
    return changeQuestion(context, question, { risky: false, urgentAt: null });
  },
);
