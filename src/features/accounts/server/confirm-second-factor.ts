import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Turns the second factor on, once the app has shown a right code. */
export const confirmSecondFactor = verb(
  { may: 'account.own', transaction: false },
  async (context, { code }: { code: string }) => {
    await callAuth(context, (headers) =>
      context.services.auth.api.verifyTOTP({ body: { code }, headers, returnHeaders: true }),
    );
    context.setCookies.push(hintCookie(context.services.settings, true));
    return DONE;
  },
);
