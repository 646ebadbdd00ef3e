import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Ends this session. Signing out twice is no error. */
export const signOut = verb({ may: 'account.enter', transaction: false }, async (context) => {
  await callAuth(context, (headers) => context.services.auth.api.signOut({ headers, returnHeaders: true }));
  context.setCookies.push(hintCookie(context.services.settings, false));
  return DONE;
});
