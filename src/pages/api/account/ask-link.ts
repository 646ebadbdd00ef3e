import { AddressInput, Done } from '../../../features/accounts/account.ts';
import { askSignInLink } from '../../../features/accounts/server/ask-sign-in-link.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: askSignInLink,
  params: NONE,
  body: AddressInput,
  answer: Done,
  limit: [
    { name: 'ask-link', by: 'address', tries: 20, seconds: 3600 },
    { name: 'ask-link', by: 'email', tries: 5, seconds: 3600 },
  ],
  form: {
    page: () => paths.askSignInLink(),
    done: () => null,
  },
});
