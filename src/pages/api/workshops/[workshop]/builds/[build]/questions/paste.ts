import { buildParams, PasteInput, SortedAnswer } from '../../../../../../../features/questions/question.ts';
import { pasteQuestion } from '../../../../../../../features/questions/server/paste-question.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: pasteQuestion,
  params: buildParams,
  body: PasteInput,
  answer: SortedAnswer,
  form: {
    page: ({ workshop, build }) => paths.pasteQuestion(workshop, build),
    done: ({ id }, { workshop }) => paths.benchQuestion(workshop, id),
  },
});
