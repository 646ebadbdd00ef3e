import { Done, SignUpInput } from '../../../features/accounts/account.ts';
import { signUp } from '../../../features/accounts/server/sign-up.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: signUp,
  params: NONE,
  body: SignUpInput,
  answer: Done,
  limit: [
    { name: 'sign-up', by: 'address', tries: 20, seconds: 3600 },
    { name: 'sign-up', by: 'email', tries: 5, seconds: 3600 },
  ],
  form: {
    page: () => paths.signUp(),
    done: () => paths.checkMail(),
    secrets: ['password'],
  },
});
