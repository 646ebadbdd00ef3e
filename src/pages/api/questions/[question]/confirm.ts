import { AskedAnswer, ConfirmInput, confirmParams } from '../../../../features/questions/question.ts';
import { confirmQuestion } from '../../../../features/questions/server/confirm-question.ts';
import { paths } from '../../../../paths.ts';
import { apiRoute } from '../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: confirmQuestion,
  params: confirmParams,
  body: ConfirmInput,
  answer: AskedAnswer,
  limit: [{ name: 'confirm-question', by: 'address', tries: 60, seconds: 3600 }],
  form: {
    page: ({ question }, values) => paths.confirmQuestion(question, values['token'] ?? ''),
    done: () => null,
  },
});
