import { and, eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { AuthRefusal, callAuth } from '../../../server/auth/call-auth.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { DONE, type SignUp } from '../account.ts';

/**
 * Makes an account that can sign in once its address is confirmed. Answers alike, in the same time, whether the
 * address is known; its holder is told by mail.
 */
export const signUp = verb({ may: 'account.enter', transaction: false }, (context, input: SignUp) =>
  inSteadyTime(async () => {
    // An account that nobody confirmed holds nothing: the newest sign-up, with its password, stands.
    await context.db
      .delete(accounts)
      .where(and(eq(accounts.email, input.email), eq(accounts.emailVerified, false)));
    await callAuth(context, (headers) =>
      context.services.auth.api.signUpEmail({
        body: { name: input.name, email: input.email, password: input.password },
        headers,
        returnHeaders: true,
      }),
    ).catch(async (error: unknown) => {
      const taken = error instanceof AuthRefusal && error.code === 'FAILED_TO_CREATE_USER';
      // Sent twice at once: the other one has made the account and mailed its link.
      if (!taken || (await context.db.$count(accounts, eq(accounts.email, input.email))) === 0) throw error;
    });
    return DONE;
  }),
);
