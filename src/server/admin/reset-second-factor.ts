import { eq } from 'drizzle-orm';
import { type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { accounts, secondFactors, sessions } from '../../db/schema/accounts.ts';

/**
 * Takes the second factor off an account and ends its sessions. Only whoever runs the server can: they have made
 * sure of the person by other means.
 * @returns a sentence saying what was done
 * @throws Error when there is no such account
 */
export async function resetSecondFactor(db: NodePgDatabase, address: string): Promise<string> {
  return db.transaction(async (transaction) => {
    const [account] = await transaction
      .update(accounts)
      .set({ twoFactorEnabled: false })
      .where(eq(accounts.email, address.trim().toLowerCase()))
      .returning({ id: accounts.id, email: accounts.email });
    if (!account) throw new Error(`There is no account with the address ${address}.`);
    await transaction.delete(secondFactors).where(eq(secondFactors.userId, account.id));
    await transaction.delete(sessions).where(eq(sessions.userId, account.id));
    return `The second factor of ${account.email} is off and every session has ended. They sign in with their password and set it up again.`;
  });
}
