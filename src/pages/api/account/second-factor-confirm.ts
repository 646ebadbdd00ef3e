import { AppCodeInput, Done } from '../../../features/accounts/account.ts';
import { confirmSecondFactor } from '../../../features/accounts/server/confirm-second-factor.ts';
import { ownPath, paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: confirmSecondFactor,
  params: NONE,
  body: AppCodeInput,
  answer: Done,
  limit: [{ name: 'second-factor', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: (_params, values) => paths.secondFactor(values['next']),
    done: (_result, input) => (input.next === undefined ? paths.account() : ownPath(input.next)),
    secrets: ['code'],
  },
});
