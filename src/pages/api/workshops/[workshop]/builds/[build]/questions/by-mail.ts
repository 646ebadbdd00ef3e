import {
  AskByMailInput,
  AskedAnswer,
  buildParams,
} from '../../../../../../../features/questions/question.ts';
import { askByMail } from '../../../../../../../features/questions/server/ask-by-mail.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: askByMail,
  params: buildParams,
  body: AskByMailInput,
  answer: AskedAnswer,
  limit: [
    { name: 'ask-question', by: 'address', tries: 30, seconds: 3600 },
    { name: 'ask-question', by: 'email', tries: 5, seconds: 3600 },
  ],
  form: {
    page: ({ workshop, build }, { episode = '', t = '', note = '' }) =>
      paths.ask(workshop, build, { episode, t, note }),
    done: () => null,
  },
});
