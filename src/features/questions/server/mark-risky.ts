import { verb } from '../../../server/verb.ts';
import { makeRisky } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/**
 * Marks a question risky by hand: only the owner's answer to it goes out from now on, and one that somebody else
 * sent is a draft again. Takes no version: a mark never fails because somebody was quicker.
 */
export const markRisky = verb(
  { may: 'question.sort' },
  async (context, input: QuestionRef & { readonly back: string }) => {
    const { question, answer } = await lockQuestion(context, { question: input.question });
    return { ...(await makeRisky(context, question, answer)), back: input.back };
  },
);
