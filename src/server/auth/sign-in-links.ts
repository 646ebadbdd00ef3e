import { and, eq, isNull } from 'drizzle-orm';
import { type Database } from '../../db/client.ts';
import { accounts } from '../../db/schema/accounts.ts';
import { memberships } from '../../db/schema/workshops.ts';

/**
 * Whether a mailed link may sign an account in: only viewers without a team role and without a second factor.
 * @param accountId the account's id
 */
export async function mayUseSignInLink(db: Database, accountId: string): Promise<boolean> {
  const rows = await db
    .select({ id: accounts.id })
    .from(accounts)
    .leftJoin(memberships, eq(memberships.accountId, accounts.id))
    .where(and(eq(accounts.id, accountId), eq(accounts.twoFactorEnabled, false), isNull(memberships.id)));
  return rows.length > 0;
}
