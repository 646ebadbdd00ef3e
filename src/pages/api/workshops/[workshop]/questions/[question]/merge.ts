import { MergeInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { mergeQuestion } from '../../../../../../features/questions/server/merge-question.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: mergeQuestion,
  params: questionParams,
  body: MergeInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
