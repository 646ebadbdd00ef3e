import { type QuestionState } from '../../../domain/questions/question-states.ts';
import { verb } from '../../../server/verb.ts';
import { changeQuestion } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/** Shows or hides a question, or lets it wait again; one that was merged stands by itself again. @throws Conflict */
export const setQuestionState = verb(
  { may: 'question.sort' },
  async (
    context,
    input: QuestionRef & { readonly state: QuestionState; readonly version: number; readonly back: string },
  ) => {
    const { question } = await lockQuestion(context, input);
    const saved = await changeQuestion(context, question, { state: input.state, mergedInto: null });
    return { ...saved, back: input.back };
  },
);
