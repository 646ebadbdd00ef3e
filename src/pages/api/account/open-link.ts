import { Done, TokenInput } from '../../../features/accounts/account.ts';
import { openSignInLink } from '../../../features/accounts/server/open-sign-in-link.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: openSignInLink,
  params: NONE,
  body: TokenInput,
  answer: Done,
  limit: [{ name: 'open-link', by: 'address', tries: 30, seconds: 600 }],
  form: {
    page: (_params, values) => paths.signInLink(values['token'] ?? ''),
    done: () => paths.bench(),
  },
});
