import { ChangePasswordInput, Done } from '../../../features/accounts/account.ts';
import { changePassword } from '../../../features/accounts/server/change-password.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changePassword,
  params: NONE,
  body: ChangePasswordInput,
  answer: Done,
  limit: [{ name: 'change-password', by: 'account', tries: 10, seconds: 3600 }],
  form: {
    page: () => paths.account(),
    done: () => null,
    secrets: ['password', 'newPassword'],
  },
});
