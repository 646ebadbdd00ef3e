import { endSessions } from '../../../server/auth/session.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Ends every session of the account, this one included. */
export const signOutEverywhere = verb({ may: 'account.own', transaction: false }, async (context) => {
  await endSessions(context.db, context.actor.id);
  await callAuth(context, (headers) => context.services.auth.api.signOut({ headers, returnHeaders: true }));
  context.setCookies.push(hintCookie(context.services.settings, false));
  return DONE;
});
