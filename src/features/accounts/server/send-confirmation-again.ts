import { callAuth } from '../../../server/auth/call-auth.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Mails the confirmation link again, if there is an account that waits for it; answers alike in any case. */
export const sendConfirmationAgain = verb(
  { may: 'account.enter', transaction: false },
  (context, { email }: { email: string }) =>
    inSteadyTime(async () => {
      await callAuth(context, () =>
        // Without the asker's cookies: a session would make it answer by what is known of the address.
        context.services.auth.api.sendVerificationEmail({
          body: { email },
          headers: new Headers(),
          returnHeaders: true,
        }),
      );
      return DONE;
    }),
);
