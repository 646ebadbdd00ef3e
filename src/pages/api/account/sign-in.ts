import { SignInInput, SignedIn } from '../../../features/accounts/account.ts';
import { signIn } from '../../../features/accounts/server/sign-in.ts';
import { ownPath, paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: signIn,
  params: NONE,
  body: SignInInput,
  answer: SignedIn,
  limit: [
    { name: 'sign-in', by: 'address', tries: 60, seconds: 600 },
    { name: 'sign-in', by: 'email', tries: 10, seconds: 600 },
  ],
  form: {
    page: (_params, values) => paths.signIn(values['next']),
    done: (result, input) => (result.secondStep ? paths.secondStep(input.next) : ownPath(input.next)),
    secrets: ['password'],
  },
});
