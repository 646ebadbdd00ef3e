import { AnswerInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { answerQuestion } from '../../../../../../features/questions/server/answer-question.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: answerQuestion,
  params: questionParams,
  body: AnswerInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
