import { BarInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { barAsker } from '../../../../../../features/questions/server/bar-asker.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: barAsker,
  params: questionParams,
  body: BarInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
