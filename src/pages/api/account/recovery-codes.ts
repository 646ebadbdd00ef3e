import { PasswordInput, RecoveryCodes } from '../../../features/accounts/account.ts';
import { renewRecoveryCodes } from '../../../features/accounts/server/renew-recovery-codes.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: renewRecoveryCodes,
  params: NONE,
  body: PasswordInput,
  answer: RecoveryCodes,
  limit: [{ name: 'second-factor', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: () => paths.secondFactor(),
    done: () => null,
    secrets: ['password'],
  },
});
