import {
  questionParams,
  SetStateInput,
  SortedAnswer,
} from '../../../../../../features/questions/question.ts';
import { setQuestionState } from '../../../../../../features/questions/server/set-state.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: setQuestionState,
  params: questionParams,
  body: SetStateInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id, back }, { workshop }) =>
      back === 'queue' ? paths.questions(workshop) : paths.benchQuestion(workshop, id),
  },
});
