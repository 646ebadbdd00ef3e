import { Done, ResetPasswordInput } from '../../../features/accounts/account.ts';
import { resetPassword } from '../../../features/accounts/server/reset-password.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: resetPassword,
  params: NONE,
  body: ResetPasswordInput,
  answer: Done,
  limit: [{ name: 'reset', by: 'address', tries: 30, seconds: 600 }],
  form: {
    page: (_params, values) => paths.resetPassword(values['token'] ?? ''),
    done: () => paths.signIn(),
    secrets: ['newPassword'],
  },
});
