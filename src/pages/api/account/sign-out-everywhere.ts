import { Done } from '../../../features/accounts/account.ts';
import { signOutEverywhere } from '../../../features/accounts/server/sign-out-everywhere.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: signOutEverywhere,
  params: NONE,
  body: NONE,
  answer: Done,
  form: {
    page: () => paths.account(),
    done: () => paths.signIn(),
  },
});
