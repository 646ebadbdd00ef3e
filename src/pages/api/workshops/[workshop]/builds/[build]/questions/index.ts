import { AskedAnswer, AskInput, buildParams } from '../../../../../../../features/questions/question.ts';
import { askQuestion } from '../../../../../../../features/questions/server/ask-question.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: askQuestion,
  params: buildParams,
  body: AskInput,
  answer: AskedAnswer,
  limit: [
    { name: 'ask-question', by: 'address', tries: 30, seconds: 3600 },
    { name: 'ask-question', by: 'account', tries: 20, seconds: 3600 },
  ],
  form: {
    page: ({ workshop, build }, { episode = '', t = '', note = '' }) =>
      paths.ask(workshop, build, { episode, t, note }),
    done: () => null,
  },
});
