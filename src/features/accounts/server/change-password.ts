import { callAuth } from '../../../server/auth/call-auth.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Changes the password and ends every other session. */
export const changePassword = verb(
  { may: 'account.own', transaction: false },
  async (context, { password, newPassword }: { password: string; newPassword: string }) => {
    await callAuth(context, (headers) =>
      context.services.auth.api.changePassword({
        body: { currentPassword: password, newPassword, revokeOtherSessions: true },
        headers,
        returnHeaders: true,
      }),
    );
    return DONE;
  },
);
