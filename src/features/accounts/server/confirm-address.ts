import { readAddressToken } from '../../../server/auth/address-token.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { signInWithPassword } from './sign-in-with-password.ts';

/**
 * Confirms the address of a new account and signs it in. Takes the password too: whoever holds the mailbox did
 * not necessarily choose it, and confirming for someone else would give them an account in the holder's name.
 * @throws Invalid for a wrong password or a link that no longer works
 */
export const confirmAddress = verb(
  { may: 'account.enter', transaction: false },
  async (context, { token, password }: { token: string; password: string }) => {
    // Checked first: a token of the asker's own making would be a way to try passwords past the limit of signing in.
    const { email } = await readAddressToken(context.services.settings.AUTH_SECRET, token);
    const confirmed = await signInWithPassword(context, { email, password }).catch((error: unknown) => {
      if (error instanceof Invalid && error.fields['unconfirmed'] !== undefined) return null;
      if (error instanceof Invalid) throw new Invalid({ password: 'That is not the password you chose.' });
      throw error;
    });
    if (confirmed) return confirmed;
    await callAuth(context, (headers) =>
      context.services.auth.api.verifyEmail({ query: { token }, headers, returnHeaders: true }),
    );
    return signInWithPassword(context, { email, password });
  },
);
