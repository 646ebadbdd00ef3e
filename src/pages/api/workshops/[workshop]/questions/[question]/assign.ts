import { AssignInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { assignQuestion } from '../../../../../../features/questions/server/assign-question.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: assignQuestion,
  params: questionParams,
  body: AssignInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
