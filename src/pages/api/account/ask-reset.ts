import { AddressInput, Done } from '../../../features/accounts/account.ts';
import { askPasswordReset } from '../../../features/accounts/server/ask-password-reset.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: askPasswordReset,
  params: NONE,
  body: AddressInput,
  answer: Done,
  limit: [
    { name: 'ask-reset', by: 'address', tries: 20, seconds: 3600 },
    { name: 'ask-reset', by: 'email', tries: 3, seconds: 3600 },
  ],
  form: {
    page: () => paths.askReset(),
    done: () => null,
  },
});
