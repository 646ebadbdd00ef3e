import { and, eq } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { callAuth } from '../../../server/auth/call-auth.ts';
import { Forbidden } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Turns the second factor off. An owner keeps it for as long as they own a workshop. */
export const stopSecondFactor = verb(
  { may: 'account.own', transaction: false },
  async (context, { password }: { password: string }) => {
    const [owned] = await context.db
      .select({ id: memberships.id })
      .from(memberships)
      .where(and(eq(memberships.accountId, context.actor.id), eq(memberships.role, 'owner')))
      .limit(1);
    if (owned) throw new Forbidden('You own a workshop, and owners keep a second factor. It stays on.');
    await callAuth(context, (headers) =>
      context.services.auth.api.disableTwoFactor({ body: { password }, headers, returnHeaders: true }),
    );
    return DONE;
  },
);
