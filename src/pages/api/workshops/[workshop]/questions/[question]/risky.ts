import { MarkInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { markRisky } from '../../../../../../features/questions/server/mark-risky.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: markRisky,
  params: questionParams,
  body: MarkInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id, back }, { workshop }) =>
      back === 'queue' ? paths.questions(workshop) : paths.benchQuestion(workshop, id),
  },
});
