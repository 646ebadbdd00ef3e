import { and, eq, inArray } from 'drizzle-orm';
import { sessions } from '../../../db/schema/accounts.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { useUpCode } from '../../../server/auth/used-codes.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/**
 * Turns the second factor on, once the app has shown a right code. Sessions that began without one end; this one
 * goes on under a new cookie.
 */
export const confirmSecondFactor = verb(
  { may: 'account.own', transaction: false },
  async (context, { code }: { code: string }) => {
    const { db, actor, services } = context;
    const ofActor = eq(sessions.userId, actor.id);
    const before = actor.secondFactor
      ? []
      : await db.select({ id: sessions.id }).from(sessions).where(ofActor);
    await useUpCode(context, actor.id, code);
    await callAuth(context, (headers) =>
      services.auth.api.verifyTOTP({ body: { code }, headers, returnHeaders: true }),
    );
    const ids = before.map(({ id }) => id);
    await db.delete(sessions).where(and(ofActor, inArray(sessions.id, ids)));
    context.setCookies.push(hintCookie(services.settings, true));
    return DONE;
  },
);
