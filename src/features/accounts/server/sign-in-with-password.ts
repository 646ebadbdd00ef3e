import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { type Context } from '../../../server/context.ts';
import { type SignIn } from '../account.ts';

/**
 * Begins a session for an address and its password.
 * @returns secondStep true when the account has a second factor: no session yet, a code is owed
 * @throws Invalid; with the field `unconfirmed` when the password is right but the address is not confirmed
 */
export async function signInWithPassword(
  context: Context,
  { email, password }: Pick<SignIn, 'email' | 'password'>,
): Promise<{ secondStep: boolean }> {
  const answer = await callAuth(context, (headers) =>
    context.services.auth.api.signInEmail({ body: { email, password }, headers, returnHeaders: true }),
  );
  if ('twoFactorRedirect' in answer) return { secondStep: true };
  context.setCookies.push(hintCookie(context.services.settings, true));
  return { secondStep: false };
}
