import { ChangeEmailInput, Done } from '../../../features/accounts/account.ts';
import { changeEmail } from '../../../features/accounts/server/change-email.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeEmail,
  params: NONE,
  body: ChangeEmailInput,
  answer: Done,
  limit: [{ name: 'change-email', by: 'account', tries: 5, seconds: 3600 }],
  form: {
    page: () => paths.account(),
    done: () => null,
    secrets: ['password'],
  },
});
