import { callAuth } from '../../../server/auth/call-auth.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Mails a link to choose a new password, if the address has an account; answers alike in any case. */
export const askPasswordReset = verb(
  { may: 'account.enter', transaction: false },
  (context, { email }: { email: string }) =>
    inSteadyTime(async () => {
      await callAuth(context, (headers) =>
        context.services.auth.api.requestPasswordReset({ body: { email }, headers, returnHeaders: true }),
      );
      return DONE;
    }),
);
