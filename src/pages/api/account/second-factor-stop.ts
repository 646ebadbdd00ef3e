import { Done, PasswordInput } from '../../../features/accounts/account.ts';
import { stopSecondFactor } from '../../../features/accounts/server/stop-second-factor.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: stopSecondFactor,
  params: NONE,
  body: PasswordInput,
  answer: Done,
  limit: [{ name: 'second-factor', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: () => paths.account(),
    done: () => paths.account(),
    secrets: ['password'],
  },
});
