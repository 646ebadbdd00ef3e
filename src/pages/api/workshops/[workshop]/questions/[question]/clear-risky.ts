import {
  ClearRiskyInput,
  questionParams,
  SortedAnswer,
} from '../../../../../../features/questions/question.ts';
import { clearRisky } from '../../../../../../features/questions/server/clear-risky.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: clearRisky,
  params: questionParams,
  body: ClearRiskyInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, question }) => paths.benchQuestion(workshop, question),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
