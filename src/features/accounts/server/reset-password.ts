import { callAuth } from '../../../server/auth/call-auth.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Sets a new password by a mailed link, which is used up, and ends every session. A second factor stays. */
export const resetPassword = verb(
  { may: 'account.enter', transaction: false },
  async (context, { token, newPassword }: { token: string; newPassword: string }) => {
    await callAuth(context, (headers) =>
      context.services.auth.api.resetPassword({ body: { token, newPassword }, headers, returnHeaders: true }),
    );
    return DONE;
  },
);
