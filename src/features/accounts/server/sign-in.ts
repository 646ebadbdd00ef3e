import { verb } from '../../../server/verb.ts';
import { type SignIn } from '../account.ts';
import { signInWithPassword } from './sign-in-with-password.ts';

/** Signs in by password; an account with a second factor still owes its code. */
export const signIn = verb({ may: 'account.enter', transaction: false }, (context, input: SignIn) =>
  signInWithPassword(context, input),
);
