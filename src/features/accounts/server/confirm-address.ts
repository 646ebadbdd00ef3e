import { Invalid } from '../../../server/errors.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
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
    const email = addressIn(token);
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

/** The address in a confirmation token; nothing is believed of it before better-auth has checked the signature. */
function addressIn(token: string): string {
  try {
    const payload: unknown = JSON.parse(Buffer.from(token.split('.')[1] ?? '', 'base64url').toString('utf8'));
    if (
      typeof payload === 'object' &&
      payload !== null &&
      'email' in payload &&
      typeof payload.email === 'string'
    ) {
      return payload.email;
    }
  } catch {
    // Said below.
  }
  throw new Invalid({ '': 'The link is not whole. Open it from the mail again.' });
}
