import { PasswordInput, SecondFactorStart } from '../../../features/accounts/account.ts';
import { startSecondFactor } from '../../../features/accounts/server/start-second-factor.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: startSecondFactor,
  params: NONE,
  body: PasswordInput,
  answer: SecondFactorStart,
  limit: [{ name: 'second-factor', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: (_params, values) => paths.secondFactor(values['next']),
    done: () => null,
    secrets: ['password'],
  },
});
