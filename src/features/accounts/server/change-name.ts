import { eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Changes the name that a team and answers show. */
export const changeName = verb({ may: 'account.own' }, async (context, { name }: { name: string }) => {
  await context.db
    .update(accounts)
    .set({ name, updatedAt: context.now })
    .where(eq(accounts.id, context.actor.id));
  return DONE;
});
