import { Invalid } from '../../../server/errors.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';
import { requirePassword } from './require-password.ts';

/**
 * Starts a change of address: the old address approves it first, then the new one is confirmed. Nothing changes
 * until both have. Answers alike when the new address belongs to someone else.
 */
export const changeEmail = verb(
  { may: 'account.own', transaction: false },
  async (context, { email, password }: { email: string; password: string }) => {
    await requirePassword(context, password);
    if (email === context.actor.email) throw new Invalid({ email: 'That is your address already.' });
    return inSteadyTime(async () => {
      await callAuth(context, (headers) =>
        context.services.auth.api.changeEmail({ body: { newEmail: email }, headers, returnHeaders: true }),
      );
      return DONE;
    });
  },
);
