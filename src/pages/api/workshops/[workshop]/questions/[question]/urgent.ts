import { MarkInput, questionParams, SortedAnswer } from '../../../../../../features/questions/question.ts';
import { markUrgent } from '../../../../../../features/questions/server/mark-urgent.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: markUrgent,
  params: questionParams,
  body: MarkInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id, back }, { workshop }) =>
      back === 'queue' ? paths.questions(workshop) : paths.benchQuestion(workshop, id),
  },
});
