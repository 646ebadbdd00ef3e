import { Done } from '../../../features/accounts/account.ts';
import { signOut } from '../../../features/accounts/server/sign-out.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: signOut,
  params: NONE,
  body: NONE,
  answer: Done,
  form: {
    page: () => paths.bench(),
    done: () => paths.frontDoor(),
  },
});
