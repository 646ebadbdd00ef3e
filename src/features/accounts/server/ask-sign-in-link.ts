import { and, eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { mayUseSignInLink } from '../../../server/auth/sign-in-links.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/**
 * Mails a link that signs a viewer in. Accounts with a team role or a second factor get none: a link asks for
 * no second factor. Answers alike in any case.
 */
export const askSignInLink = verb(
  { may: 'account.enter', transaction: false },
  (context, { email }: { email: string }) =>
    inSteadyTime(async () => {
      const { db, services } = context;
      const [account] = await db
        .select({ id: accounts.id })
        .from(accounts)
        .where(and(eq(accounts.email, email), eq(accounts.emailVerified, true)));
      if (account && (await mayUseSignInLink(db, account.id))) {
        await callAuth(context, (headers) =>
          services.auth.api.signInMagicLink({ body: { email }, headers, returnHeaders: true }),
        );
      }
      return DONE;
    }),
);
