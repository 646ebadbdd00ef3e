import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Signs a viewer in by a mailed link, which is used up. */
export const openSignInLink = verb(
  { may: 'account.enter', transaction: false },
  async (context, { token }: { token: string }) => {
    await callAuth(context, (headers) =>
      context.services.auth.api.magicLinkVerify({ query: { token }, headers, returnHeaders: true }),
    );
    context.setCookies.push(hintCookie(context.services.settings, true));
    return DONE;
  },
);
